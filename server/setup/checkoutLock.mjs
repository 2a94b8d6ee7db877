import fs from 'node:fs';
import path from 'node:path';
import { endLeftovers, markChildren } from './leftovers.mjs';
import { dataFolder } from './projectRoot.mjs';
import { say } from './say.mjs';
import { SetupError } from './setupError.mjs';

const lockFile = path.join(dataFolder, 'running.json');

/**
 * Makes this process the one that runs the checkout, or throws a SetupError saying which one does
 * and where. Also ends what a killed predecessor left running. Other checkouts are not touched.
 * @param {string} command how it was started, e.g. 'npm start'
 * @returns {Promise<{ tell: (url: string) => void, release: () => void }>} `tell` records the
 *   address for whoever tries a second start
 */
export async function lockCheckout(command) {
  fs.mkdirSync(dataFolder, { recursive: true, mode: 0o700 });
  const me = { pid: process.pid, startTicks: startTicksOf(process.pid), command, url: '' };
  while (!tryCreate(me)) {
    const holder = readHolder();
    if (holder && startTicksOf(holder.pid) === holder.startTicks) {
      throw new SetupError(
        `Furlong already runs in this checkout: ${holder.url || 'still starting'} ` +
          `(${holder.command}, process ${holder.pid}).\n` +
          `End that one with Ctrl-C in its terminal, or with: kill ${holder.pid}`,
      );
    }
    clearStale(holder);
  }
  const found = await endLeftovers();
  if (found > 0) say(`Ended ${found} processes an earlier start had left running.`);
  markChildren();
  return {
    tell: (url) => fs.writeFileSync(lockFile, JSON.stringify({ ...me, url })),
    release: () => fs.rmSync(lockFile, { force: true }),
  };
}

/** @typedef {{ pid: number, startTicks: string, command: string, url: string }} Holder */

/** @param {Holder} me */
function tryCreate(me) {
  // Written aside and linked into place: nobody can read a lock that is only half written.
  const aside = `${lockFile}.${process.pid}`;
  fs.writeFileSync(aside, JSON.stringify(me));
  try {
    fs.linkSync(aside, lockFile);
    return true;
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code === 'EEXIST') return false;
    throw error;
  } finally {
    fs.rmSync(aside, { force: true });
  }
}

/**
 * Removes a dead start's lock, unless another start was faster and the file is its own by now:
 * moved aside first, then looked at.
 * @param {Holder | undefined} stale
 */
function clearStale(stale) {
  const aside = `${lockFile}.stale.${process.pid}`;
  try {
    fs.renameSync(lockFile, aside);
  } catch {
    return; // The other one removed it.
  }
  const moved = readHolder(aside);
  if (moved && moved.startTicks !== stale?.startTicks) fs.linkSync(aside, lockFile);
  fs.rmSync(aside, { force: true });
}

/** @param {string} [file] @returns {Holder | undefined} */
function readHolder(file = lockFile) {
  try {
    return JSON.parse(fs.readFileSync(file, 'utf8'));
  } catch {
    return undefined; // Gone meanwhile, or torn by a power cut: nobody holds it.
  }
}

/**
 * When a process began, in clock ticks since boot. With the pid it names one process: pids are
 * given out again, this pair is not. Empty for a process that has ended.
 * @param {number} pid
 */
function startTicksOf(pid) {
  try {
    const stat = fs.readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The program's name stands in brackets and may hold spaces; after it come the state (field 3)
    // and, as field 22, the start time.
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    // A zombie is dead. In a container whose first process reaps nobody, it stays for ever.
    return fields[0] === 'Z' ? '' : (fields[19] ?? '');
  } catch {
    return '';
  }
}
