import path from 'node:path';
import { startChild } from './childProcess.mjs';
import { projectRoot } from './projectRoot.mjs';

/**
 * @typedef {{ name: string, args: string[] }} StaticCheck
 * @typedef {{ name: string, passed: boolean, seconds: number, output: string }} CheckResult
 */

/** What can be said of the code without running it. Each counts as one test in `npm test`. */
export const staticChecks = [
  { name: 'types', args: [binary('tsc'), '-p', '.'] },
  {
    name: 'types of shared (no Node, no browser)',
    args: [binary('tsc'), '-p', 'shared', '--noEmit'],
  },
  { name: 'types of the set-up', args: [binary('tsc'), '-p', 'server/setup', '--noEmit'] },
  { name: 'lint', args: [binary('oxlint')] },
  { name: 'format', args: [binary('prettier'), '--check', '--log-level', 'warn', '.'] },
];

/**
 * Runs checks side by side; all of them, whatever one says.
 * @param {StaticCheck[]} checks
 * @param {(result: CheckResult) => void} onResult as each one ends
 * @returns {Promise<CheckResult[]>}
 */
export function runStaticChecks(checks, onResult) {
  return Promise.all(
    checks.map(async ({ name, args }) => {
      const startedAt = Date.now();
      /** @type {string[]} */
      const lines = [];
      const child = startChild(process.execPath, args, { onLine: (line) => lines.push(line) });
      const { code } = await child.finished;
      const seconds = (Date.now() - startedAt) / 1000;
      const result = { name, passed: code === 0, seconds, output: lines.join('\n') };
      onResult(result);
      return result;
    }),
  );
}

/** @param {string} name of a program among the node modules */
export function binary(name) {
  return path.join(projectRoot, 'node_modules/.bin', name);
}
