import { spawnSync } from 'node:child_process';
import { aptCommands, aptCommandToPaste } from './aptCommands.mjs';
import { runToEnd } from './childProcess.mjs';
import { findProgram } from './findProgram.mjs';
import { say, step } from './say.mjs';
import { SetupError } from './setupError.mjs';

/**
 * Makes sure programs are there, installing their Debian packages when not (as root, or through
 * sudo when that asks no password). Otherwise throws a SetupError with the exact command to run.
 * @param {string} why what the programs are for, e.g. 'the database'
 * @param {string[]} programs
 * @param {string[]} packages
 */
export async function ensurePrograms(why, programs, packages) {
  const missing = programs.filter((name) => !findProgram(name));
  if (missing.length === 0) return;
  const needs = `Furlong needs ${missing.join(', ')} for ${why}`;
  const command = aptCommandToPaste(packages);
  if (!findProgram('apt-get')) {
    throw new SetupError(
      `${needs}. This is no Debian (no apt-get): install what these packages hold, then start ` +
        `again: ${packages.join(' ')}`,
    );
  }
  const asRoot = rootPrefix();
  if (!asRoot) {
    throw new SetupError(
      `${needs}, and may not install it here. Run this, then start again:\n\n  ${command}`,
    );
  }
  say(`${needs}: installing Debian's ${packages.join(', ')} (nothing that is only recommended).`);
  await step(`Installing ${packages.join(', ')}`, async (progress) => {
    for (const args of aptCommands(packages)) {
      const [program = '', ...rest] = [...asRoot, ...args];
      await runToEnd(`Installing packages (${command})`, program, rest, { onLine: progress });
    }
  });
  const still = programs.filter((name) => !findProgram(name));
  if (still.length > 0) {
    throw new SetupError(`The packages went in, but ${still.join(', ')} cannot be found on PATH.`);
  }
}

/** What to put before a command to run it as root; undefined when we have no rights. */
function rootPrefix() {
  if (process.getuid?.() === 0) return [];
  const sudo = findProgram('sudo');
  // -n: never ask. A password prompt hidden in the middle of a start would look like a hang.
  if (sudo && spawnSync(sudo, ['-n', 'true']).status === 0) return [sudo, '-n'];
  return undefined;
}
