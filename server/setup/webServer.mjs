import { startChild } from './childProcess.mjs';
import { freePort } from './freePort.mjs';
import { readyUrl } from './readyUrl.mjs';
import { rememberedPorts, rememberPorts } from './rememberedPorts.mjs';
import { say, step } from './say.mjs';
import { SetupError } from './setupError.mjs';

const USUAL_PORT = 4173;

/**
 * Starts Furlong's server and waits for its line `furlong ready <url>`.
 * @param {string[]} nodeArgs what node is to run
 * @param {NodeJS.ProcessEnv} env
 * @param {number | undefined} askedPort undefined: the last start's, else the usual, else any free
 * @returns {Promise<{ url: string, port: number, finished: import('./childProcess.mjs').Child['finished'] }>}
 */
export async function startWebServer(nodeArgs, env, askedPort) {
  const port = askedPort ?? (await freePort(rememberedPorts().web ?? USUAL_PORT));
  return step('Starting the server', async () => {
    /** @type {(url: string) => void} */
    let tellReady = () => {};
    /** @type {Promise<string>} */
    const ready = new Promise((resolve) => (tellReady = resolve));
    const child = startChild(process.execPath, nodeArgs, {
      env: { ...env, PORT: String(port) },
      onLine: (line) => {
        const url = readyUrl(line);
        if (url) tellReady(url);
        else say(line);
      },
    });
    const url = await Promise.race([ready, child.finished.then(() => undefined)]);
    if (!url) throw new SetupError('The server ended before it was ready; see its words above.');
    if (askedPort === undefined) rememberPorts({ web: port });
    // The address may be a public one, behind something else; only PORT=0 makes it tell the port.
    return { url, port: port || Number(new URL(url).port), finished: child.finished };
  });
}
