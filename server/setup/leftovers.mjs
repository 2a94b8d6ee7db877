import fs from 'node:fs';
import { setTimeout as sleep } from 'node:timers/promises';
import { dataFolder } from './projectRoot.mjs';

const MARK = 'FURLONG_STARTED_FOR';

/**
 * Marks everything this process starts from now on as belonging to this checkout's start. The mark
 * names the data folder by device and inode as well as path, so that a checkout at the same path
 * inside a chroot is another one. Our own /proc entry keeps the environment we were born with.
 */
export function markChildren() {
  process.env[MARK] = markOf();
}

/**
 * Ends processes an earlier start of this checkout left behind (its parent was killed with -9, so
 * nobody ended them). Reading /proc/<pid>/environ for our own mark cannot hit a stranger that was
 * given an old process id, as a pid file could.
 * @returns {Promise<number>} how many were found
 */
export async function endLeftovers() {
  const found = findLeftovers();
  for (const pid of found) signal(pid, 'SIGTERM');
  for (let waited = 0; waited < 30_000 && findLeftovers().length > 0; waited += 100) {
    await sleep(100);
  }
  for (const pid of findLeftovers()) signal(pid, 'SIGKILL');
  return found.length;
}

/** Process ids carrying this checkout's mark. @returns {number[]} */
export function findLeftovers() {
  const mark = `${MARK}=${markOf()}`;
  return fs
    .readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name) && Number(name) !== process.pid)
    .filter((pid) => environmentOf(pid).includes(mark))
    .map(Number);
}

function markOf() {
  const { dev, ino } = fs.statSync(dataFolder);
  return `${dev}:${ino}:${dataFolder}`;
}

/** @param {string} pid @returns {string[]} */
function environmentOf(pid) {
  try {
    return fs.readFileSync(`/proc/${pid}/environ`, 'utf8').split('\0');
  } catch {
    return []; // Gone meanwhile, or another person's.
  }
}

/** @param {number} pid @param {NodeJS.Signals} name */
function signal(pid, name) {
  try {
    process.kill(pid, name);
  } catch {
    // Gone meanwhile.
  }
}
