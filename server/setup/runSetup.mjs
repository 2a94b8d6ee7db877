import { stopEveryChild } from './childProcess.mjs';
import { say } from './say.mjs';
import { SetupError } from './setupError.mjs';

/** @type {(() => void | Promise<void>)[]} */
const endings = [];

/**
 * Runs one of the set-up's commands: ends everything it started when it is done, has failed or is
 * told to stop (Ctrl-C, TERM, the terminal's closing), then exits. A second Ctrl-C changes nothing:
 * impatience must not cost the database its clean shutdown.
 * @param {() => Promise<number>} main resolves to the exit code
 * @param {{ stoppedCode: number }} options exit code when told to stop
 */
export async function runSetup(main, { stoppedCode }) {
  let code = 1;
  // A terminal that was closed takes no more words; that must not stop the stopping.
  for (const stream of [process.stdout, process.stderr]) stream.on('error', () => {});
  try {
    code = await Promise.race([main(), stopSignal().then(() => stoppedCode)]);
  } catch (error) {
    const known = error instanceof SetupError;
    console.error(`\n${known ? error.message : error instanceof Error ? error.stack : error}`);
  }
  await stopEveryChild();
  for (const end of endings.reverse()) await end();
  // Not left to the event loop: what main had still been waiting for does not matter any more.
  process.exit(code);
}

/** Runs something at the very end, whatever happens. @param {() => void | Promise<void>} end */
export function atEnd(end) {
  endings.push(end);
}

/** @returns {Promise<void>} */
function stopSignal() {
  return new Promise((resolve) => {
    let stopping = false;
    const stop = () => {
      if (stopping) return;
      stopping = true;
      say('\nStopping …');
      resolve();
    };
    for (const name of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(name, stop);
    // Who ends only npm (a service manager, a script) ends the shell between npm and us with it,
    // and that shell tells us nothing: its going is the sign.
    const parent = process.ppid;
    if (process.env.npm_lifecycle_event) {
      setInterval(() => process.ppid !== parent && stop(), 500).unref();
    }
  });
}
