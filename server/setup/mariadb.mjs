import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { runToEnd, startChild, stopChild } from './childProcess.mjs';
import { ensurePrograms } from './debianPackages.mjs';
import { findProgram } from './findProgram.mjs';
import { freePort } from './freePort.mjs';
import { installDbArguments, mariadbArguments } from './mariadbArguments.mjs';
import { speaksMariadb } from './mariadbGreeting.mjs';
import { step } from './say.mjs';
import { SetupError } from './setupError.mjs';

const asRoot = process.getuid?.() === 0;
// InnoDB may have a long log to replay after a kill -9; it says so in its own log file.
const READY_WITHIN_MS = 180_000;
const PORT_TRIES = 5;

/**
 * @typedef {object} Mariadb
 * @property {number} port on 127.0.0.1
 * @property {Promise<{ code: number, tail: string }>} finished settles when the server has ended
 * @property {() => Promise<void>} stop shuts down cleanly
 */

/** Finds MariaDB's programs or installs Debian's packages of them. */
export function ensureMariadb() {
  return ensurePrograms(
    'its database',
    // my_print_defaults is client-core's, and mariadb-install-db cannot do without it.
    ['mariadbd', 'mariadb-install-db', 'my_print_defaults'],
    ['mariadb-server-core', 'mariadb-client-core'],
  );
}

/**
 * Starts a MariaDB of our own in a folder, making its data there when there is none, and waits
 * until it answers. An InnoDB that was killed recovers here by itself.
 * @param {object} options
 * @param {string} options.folder absolute, ours alone
 * @param {string[]} options.initSql one statement each, run before anyone may connect
 * @param {number} [options.preferredPort]
 * @param {boolean} [options.throwaway]
 * @returns {Promise<Mariadb>}
 */
export async function startMariadb({ folder, initSql, preferredPort, throwaway = false }) {
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  const dataDir = path.join(folder, 'mariadb');
  if (!fs.existsSync(dataDir)) await step('Making a new database', () => install(dataDir));
  const initFile = path.join(folder, 'mariadb-init.sql');
  const logFile = path.join(folder, 'mariadb.log');
  // It holds the password: readable by us only, and gone once it was read.
  fs.rmSync(initFile, { force: true });
  fs.writeFileSync(initFile, `${initSql.join(';\n')};\n`, { mode: 0o600 });
  try {
    return await step('Starting the database', async () => {
      for (let tries = 0; tries < PORT_TRIES; tries++) {
        const port = await freePort(tries === 0 ? preferredPort : 0);
        const place = { dataDir, port, initFile, logFile, asRoot, throwaway };
        const server = await tryStart(place);
        if (server) return server;
      }
      throw new SetupError(
        `The database did not start. Its log, ${logFile}, ends:\n${tailOf(logFile)}`,
      );
    });
  } finally {
    fs.rmSync(initFile, { force: true });
  }
}

/** @param {string} dataDir */
async function install(dataDir) {
  // A half-made folder from an earlier try is worthless; ours is renamed into place when complete.
  const making = `${dataDir}.new`;
  fs.rmSync(making, { recursive: true, force: true });
  fs.mkdirSync(making, { mode: 0o700 });
  const systemUser = os.userInfo().username;
  const args = installDbArguments({ dataDir: making, asRoot, systemUser });
  await runToEnd('mariadb-install-db', program('mariadb-install-db'), args);
  fs.renameSync(making, dataDir);
}

/**
 * @param {import('./mariadbArguments.mjs').MariadbPlace} place
 * @returns {Promise<Mariadb | undefined>} undefined when the port was taken from under us
 */
async function tryStart(place) {
  const logFrom = fs.existsSync(place.logFile) ? fs.statSync(place.logFile).size : 0;
  const child = startChild(program('mariadbd'), mariadbArguments(place), {
    onLine: () => {},
    // It writes out what is still in memory.
    patienceMs: 60_000,
  });
  const pidFile = path.join(place.dataDir, 'furlong.pid');
  let ended = false;
  child.finished.then(() => (ended = true));
  for (const giveUpAt = Date.now() + READY_WITHIN_MS; Date.now() < giveUpAt; await sleep(50)) {
    if (ended) {
      const log = fs.existsSync(place.logFile)
        ? fs.readFileSync(place.logFile).subarray(logFrom)
        : '';
      if (/Address already in use/.test(String(log))) return undefined;
      throw new SetupError(
        `The database ended at once. Its log, ${place.logFile}, ends:\n${tailOf(place.logFile)}`,
      );
    }
    // The pid file proves that it is ours that answers, not a stranger on the same port.
    if (readPid(pidFile) === child.pid && (await speaksMariadb(place.port))) {
      return { port: place.port, finished: child.finished, stop: () => stopChild(child) };
    }
  }
  await stopChild(child);
  throw new SetupError(
    `The database did not answer in ${READY_WITHIN_MS / 1000} s; see ${place.logFile}.`,
  );
}

/** @param {string} name */
function program(name) {
  return findProgram(name) ?? name;
}

/** @param {string} file */
function readPid(file) {
  try {
    return Number(fs.readFileSync(file, 'utf8'));
  } catch {
    return undefined;
  }
}

/** @param {string} file */
function tailOf(file) {
  if (!fs.existsSync(file)) return '(no log was written)';
  return fs.readFileSync(file, 'utf8').trimEnd().split('\n').slice(-15).join('\n');
}
