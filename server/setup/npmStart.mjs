import { startChild } from './childProcess.mjs';
import { say } from './say.mjs';

/**
 * Runs `npm start` as a person would and waits until it says where Furlong is.
 * @param {number} withinSeconds
 * @returns {Promise<{ pid: number, url: string, seconds: number, lines: string[], finished: Promise<unknown> }>}
 */
export async function npmStart(withinSeconds) {
  const startedAt = Date.now();
  /** @type {string[]} */
  const lines = [];
  /** @type {(url: string | undefined) => void} */
  let tell = () => {};
  /** @type {Promise<string | undefined>} */
  const ready = new Promise((resolve) => (tell = resolve));
  const child = startChild('npm', ['start'], {
    onLine: (line) => {
      say(line);
      lines.push(line);
      const url = /^Furlong is ready: (\S+)/.exec(line)?.[1];
      if (url) tell(url);
    },
  });
  const timer = setTimeout(() => tell(undefined), withinSeconds * 1000);
  void child.finished.then(() => tell(undefined));
  const url = await ready;
  clearTimeout(timer);
  const seconds = Math.round((Date.now() - startedAt) / 100) / 10;
  if (!url)
    throw new Error(`npm start was not ready after ${seconds} s: ${lines.slice(-5).join(' | ')}`);
  // The words after the address (sign-ins) come at once, but in lines of their own.
  await new Promise((resolve) => setTimeout(resolve, 300));
  return { pid: child.pid, url, seconds, lines, finished: child.finished };
}
