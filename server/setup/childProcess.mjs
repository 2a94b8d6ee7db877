import { spawn } from 'node:child_process';
import readline from 'node:readline';
import { findProgram } from './findProgram.mjs';
import { projectRoot } from './projectRoot.mjs';
import { SetupError } from './setupError.mjs';

/**
 * @typedef {object} Child
 * @property {number} pid
 * @property {Promise<{ code: number, tail: string }>} finished code 128 when ended by a signal
 * @property {number} patienceMs
 *
 * @typedef {object} ChildOptions
 * @property {NodeJS.ProcessEnv} [env] added to our own environment
 * @property {string} [cwd]
 * @property {(line: string) => void} [onLine] each line of stdout and stderr; without it the
 *   child writes straight to our terminal
 * @property {number} [patienceMs] how long it may take to end when asked, before it is killed
 */

/** @type {Set<Child>} in the order they were started */
const running = new Set();
let closing = false;

/**
 * Starts a program in a process group of its own. A terminal's Ctrl-C then reaches only us, and
 * we end the children in the right order: the server before the database it is writing to.
 * Should we be killed with -9, the kernel ends them for us (setpriv's parent-death signal).
 * @param {string} command
 * @param {string[]} args
 * @param {ChildOptions} [options]
 * @returns {Child}
 */
export function startChild(
  command,
  args,
  { env = {}, cwd = projectRoot, onLine, patienceMs = 10_000 } = {},
) {
  // What is still half-way through a step must not start anything behind our back.
  if (closing) throw new SetupError('Stopped.');
  const output = onLine ? 'pipe' : 'inherit';
  const setpriv = findProgram('setpriv');
  const tied = setpriv ? [setpriv, '--pdeathsig', 'TERM', command, ...args] : [command, ...args];
  const [program = command, ...rest] = tied;
  const child = spawn(program, rest, {
    cwd,
    env: { ...process.env, ...env },
    stdio: ['ignore', output, output],
    detached: true,
  });
  /** @type {string[]} */
  const tail = [];
  for (const stream of [child.stdout, child.stderr]) {
    if (!stream) continue;
    readline.createInterface({ input: stream }).on('line', (line) => {
      tail.push(line);
      if (tail.length > 60) tail.shift();
      onLine?.(line);
    });
  }
  /** @type {Child['finished']} */
  const finished = new Promise((resolve) => {
    const end = (/** @type {number} */ code) => {
      running.delete(entry);
      resolve({ code, tail: tail.join('\n') });
    };
    child.once('error', (error) => {
      tail.push(`${command}: ${error.message}`);
      end(127);
    });
    child.once('close', (code, signal) => end(code ?? (signal ? 128 : 1)));
  });
  /** @type {Child} */
  const entry = { pid: child.pid ?? -1, finished, patienceMs };
  running.add(entry);
  return entry;
}

/**
 * Runs a program to its end. Throws a SetupError with the end of its output when it fails.
 * @param {string} what for the message, e.g. 'npm ci'
 * @param {string} command
 * @param {string[]} args
 * @param {ChildOptions} [options]
 */
export async function runToEnd(what, command, args, options = {}) {
  const { code, tail } = await startChild(command, args, { onLine: () => {}, ...options }).finished;
  if (code !== 0) throw new SetupError(`${what} failed (exit ${code}).\n${tail}`);
}

/**
 * Ends a child and whatever it started: asks first, insists when its patience is over.
 * @param {Child} child
 */
export async function stopChild(child) {
  if (!running.has(child) || child.pid < 0) return;
  signalGroup(child.pid, 'SIGTERM');
  const insist = setTimeout(() => signalGroup(child.pid, 'SIGKILL'), child.patienceMs);
  await child.finished;
  clearTimeout(insist);
  // The leader is gone; anything it left in its group has no owner any more.
  signalGroup(child.pid, 'SIGKILL');
}

/** Ends every child still running, the latest started first, and lets no new one start. */
export async function stopEveryChild() {
  closing = true;
  for (const child of [...running].reverse()) await stopChild(child);
}

/** Whether we are ending everything: then a child's end is no surprise. */
export function isClosing() {
  return closing;
}

/** @param {number} pid @param {NodeJS.Signals} signal */
function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
  } catch {
    // Already gone.
  }
}
