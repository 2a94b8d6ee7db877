import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { startChild, stopChild } from './childProcess.mjs';
import { say } from './say.mjs';
import { binary } from './staticChecks.mjs';
import { testCounts } from './testCounts.mjs';

const LONGEST_MS = 15 * 60_000;

/**
 * Runs one of vitest's projects (unit, api, e2e), its progress on our terminal.
 * @param {string} project
 * @param {string[]} filters parts of file names; none means all
 * @param {NodeJS.ProcessEnv} [env]
 * @returns {Promise<import('./testCounts.mjs').TestCounts>}
 */
export async function runVitestProject(project, filters, env = {}) {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'furlong-report-'));
  const file = path.join(folder, 'report.json');
  const args = ['run', '--project', project, '--passWithNoTests'];
  const reports = ['--reporter=default', '--reporter=json', `--outputFile.json=${file}`];
  try {
    const child = startChild(
      process.execPath,
      [binary('vitest'), ...args, ...reports, ...filters],
      {
        env,
      },
    );
    // A hung browser must not hang the run: what is left counts as failed.
    const timer = setTimeout(() => {
      say(`The ${project} tests ran longer than ${LONGEST_MS / 60_000} min and were ended.`);
      void stopChild(child);
    }, LONGEST_MS);
    const { code } = await child.finished;
    clearTimeout(timer);
    const report = fs.existsSync(file) ? JSON.parse(fs.readFileSync(file, 'utf8')) : undefined;
    return testCounts(report, code);
  } finally {
    fs.rmSync(folder, { recursive: true, force: true });
  }
}
