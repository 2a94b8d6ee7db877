// `npm start`: everything from a bare checkout to a running Furlong. Plain Node, because it runs
// before any package is installed.
import { lockCheckout } from './checkoutLock.mjs';
import { isClosing } from './childProcess.mjs';
import { ensureModules } from './ensureModules.mjs';
import { ensureNode } from './ensureNode.mjs';
import { ensureMariadb } from './mariadb.mjs';
import { prepare, tsx } from './prepare.mjs';
import { atEnd, runSetup } from './runSetup.mjs';
import { say } from './say.mjs';
import { sayWelcome } from './sayWelcome.mjs';
import { startMode } from './startMode.mjs';
import { startWebServer } from './webServer.mjs';

const CRASHES_FORGIVEN = 3;
const CRASH_MEMORY_MS = 60_000;

// Ctrl-C is how a start is meant to end: no failure.
await runSetup(start, { stoppedCode: 0 });

async function start() {
  ensureNode();
  const mode = startMode(process.env);
  const lock = await lockCheckout('npm start');
  atEnd(lock.release);
  await Promise.all([ensureModules(), mode.databaseUrl ? undefined : ensureMariadb()]);
  const { env, signIns, database } = await prepare(mode, { client: true });

  const serve = async (/** @type {number | undefined} */ port) => {
    const server = await startWebServer(tsx('server/main.ts'), env, port);
    lock.tell(server.url);
    return server;
  };
  let server = await serve(mode.port);
  sayWelcome(server.url, mode, signIns);

  const databaseEnded = database ? database.finished.then(() => 'database') : new Promise(() => {});
  /** @type {number[]} */
  let crashes = [];
  for (;;) {
    const ended = await Promise.race([databaseEnded, server.finished.then(() => 'server')]);
    if (isClosing()) return 0;
    if (ended === 'database') {
      say(
        'The database has ended, so Furlong stops too. `npm start` brings both back, nothing is lost.',
      );
      return 1;
    }
    const now = Date.now();
    crashes = [...crashes.filter((at) => now - at < CRASH_MEMORY_MS), now];
    if (crashes.length > CRASHES_FORGIVEN) {
      say(`The server has ended ${crashes.length} times within a minute: giving up.`);
      return 1;
    }
    say('The server has ended unexpectedly; starting it again.');
    server = await serve(server.port);
    say(`Furlong is back: ${server.url}`);
  }
}
