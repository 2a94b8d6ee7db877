// `npm run dev`: as `npm start`, but the server restarts and the client reloads at each change.
import path from 'node:path';
import { lockCheckout } from './checkoutLock.mjs';
import { isClosing, startChild } from './childProcess.mjs';
import { ensureModules } from './ensureModules.mjs';
import { ensureNode } from './ensureNode.mjs';
import { freePort } from './freePort.mjs';
import { ensureMariadb } from './mariadb.mjs';
import { prepare } from './prepare.mjs';
import { projectRoot } from './projectRoot.mjs';
import { atEnd, runSetup } from './runSetup.mjs';
import { say } from './say.mjs';
import { sayWelcome } from './sayWelcome.mjs';
import { startMode } from './startMode.mjs';
import { startWebServer } from './webServer.mjs';

const VITE_PORT = 5173;
const modulesFile = (/** @type {string} */ file) => path.join(projectRoot, 'node_modules', file);

await runSetup(dev, { stoppedCode: 0 });

async function dev() {
  ensureNode();
  const mode = startMode(process.env);
  const lock = await lockCheckout('npm run dev');
  atEnd(lock.release);
  await Promise.all([ensureModules(), mode.databaseUrl ? undefined : ensureMariadb()]);
  const { env, signIns, database } = await prepare(mode, { client: false });

  const vitePort = await freePort(VITE_PORT);
  const url = `http://127.0.0.1:${vitePort}`;
  const watched = [
    modulesFile('tsx/dist/cli.mjs'),
    'watch',
    '--clear-screen=false',
    'server/main.ts',
  ];
  // Links in texts and letters then open the client that reloads.
  const server = await startWebServer(watched, { PUBLIC_URL: url, ...env }, mode.port);
  const host = mode.host.includes(':') ? `[${mode.host}]` : mode.host;
  const vite = startChild(
    process.execPath,
    [
      modulesFile('vite/bin/vite.js'),
      '--port',
      String(vitePort),
      '--strictPort',
      '--clearScreen',
      'false',
    ],
    { env: { FURLONG_DEV_SERVER: `http://${host}:${server.port}` } },
  );
  lock.tell(url);
  sayWelcome(url, mode, signIns);

  const ends = [server.finished, vite.finished, ...(database ? [database.finished] : [])];
  await Promise.race(ends);
  if (!isClosing()) say('A part of it has ended, so the rest stops too.');
  return 1;
}
