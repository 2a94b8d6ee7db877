import fs from 'node:fs';
import path from 'node:path';
import { runToEnd } from './childProcess.mjs';
import { moduleDifference } from './moduleDifference.mjs';
import { projectRoot } from './projectRoot.mjs';
import { say, step } from './say.mjs';

/** Installs the node modules package-lock.json names, when they are missing or stale. */
export async function ensureModules() {
  const wanted = readJson('package-lock.json');
  const installed = readJson('node_modules/.package-lock.json');
  const machine = { os: process.platform, cpu: process.arch };
  const difference = moduleDifference(wanted ?? {}, installed, machine);
  if (!difference) return;
  say(`Node modules: ${difference}.`);
  await step('Installing node modules (npm ci)', async (progress) => {
    // Under `npm start` npm tells where it is; it need not be on PATH.
    const npm = process.env.npm_execpath;
    const command = npm?.endsWith('.js') ? [process.execPath, npm] : ['npm'];
    const [program = 'npm', ...before] = command;
    // Development packages too, even under NODE_ENV=production: one state for start and test.
    const args = [...before, 'ci', '--include=dev', '--no-audit', '--no-fund'];
    await runToEnd('npm ci', program, args, { onLine: progress });
  });
}

/** @param {string} file */
function readJson(file) {
  try {
    return JSON.parse(fs.readFileSync(path.join(projectRoot, file), 'utf8'));
  } catch {
    return undefined;
  }
}
