// Runs inside the bare system of `npm run prove:fresh`, as its process number 1.
import fs from 'node:fs';
import { setTimeout as sleep } from 'node:timers/promises';
import { startChild } from './childProcess.mjs';
import { findPeers } from './findPeers.mjs';
import { findProgram } from './findProgram.mjs';
import { npmStart } from './npmStart.mjs';
import { say } from './say.mjs';

const [resultFile = 'result.json'] = process.argv.slice(2);
const SECOND_START_S = 10;
const TEST_S = 12 * 60;

/** @type {string[]} */
const problems = [];
/** @type {Record<string, unknown>} */
const result = {};

try {
  await firstStart();
  await secondStart();
  await startAfterKill();
  await wholeTest();
} catch (error) {
  problems.push(error instanceof Error ? error.message : String(error));
}
fs.writeFileSync(
  resultFile,
  JSON.stringify({ passed: problems.length === 0, problems, ...result }),
);
process.exit(problems.length === 0 ? 0 : 1);

async function firstStart() {
  say('\n== npm start on a bare system');
  result.alreadyThere = ['mariadbd', 'chromium', 'sudo', 'git'].filter((name) => findProgram(name));
  const run = await npmStart(20 * 60);
  result.firstStartSeconds = run.seconds;
  result.demoSignIns = run.lines.filter((line) => /^ {2}\S+ +\S+@\S+ +\S+$/.test(line)).length;
  if (result.demoSignIns === 0) problems.push('npm start printed no demo sign-ins');
  await look(run.url);
  await endByCtrlC(run);
}

async function secondStart() {
  say('\n== npm start again');
  const run = await npmStart(60);
  result.secondStartSeconds = run.seconds;
  if (run.seconds >= SECOND_START_S) problems.push(`the second start took ${run.seconds} s`);
  await look(run.url);
  await endByCtrlC(run);
}

/** A power cut, as near as a process can come to one. */
async function startAfterKill() {
  say('\n== npm start after kill -9 of everything');
  const run = await npmStart(60);
  for (const { pid } of findPeers()) process.kill(pid, 'SIGKILL');
  await run.finished;
  const again = await npmStart(120);
  result.startAfterKillSeconds = again.seconds;
  await look(again.url);
  await endByCtrlC(again);
}

async function wholeTest() {
  say('\n== npm test');
  const startedAt = Date.now();
  let last = '';
  const child = startChild('npm', ['test'], {
    onLine: (line) => {
      say(line);
      if (line.trim()) last = line.trim();
    },
  });
  const { code } = await child.finished;
  const seconds = Math.round((Date.now() - startedAt) / 1000);
  Object.assign(result, { testSeconds: seconds, testExitCode: code, testSummary: last });
  if (code !== 0) problems.push(`npm test ended with exit ${code}`);
  if (!/^\d+ passed, 0 failed$/.test(last)) problems.push(`npm test's last line is "${last}"`);
  if (seconds > TEST_S) problems.push(`npm test took ${seconds} s`);
}

/** The page and the health answer, as a browser on this machine would get them. @param {string} url */
async function look(url) {
  for (const path of ['/', '/api/health']) {
    const response = await fetch(new URL(path, url));
    const text = await response.text();
    if (response.status !== 200) problems.push(`GET ${path} answered ${response.status}`);
    if (path === '/' && !text.includes('<html')) problems.push('GET / is no page');
  }
}

/** @param {Awaited<ReturnType<typeof npmStart>>} run */
async function endByCtrlC(run) {
  const startedAt = Date.now();
  // A terminal's Ctrl-C goes to the whole group in front: npm, its shell and ours.
  process.kill(-run.pid, 'SIGINT');
  await run.finished;
  // npm may be gone a moment before the set-up it started.
  while (findPeers().length > 0 && Date.now() - startedAt < 60_000) await sleep(50);
  result.stopSeconds = Math.round((Date.now() - startedAt) / 100) / 10;
  const left = findPeers().map(({ command }) => command);
  if (left.length > 0) problems.push(`left running after Ctrl-C: ${left.join(' | ')}`);
}
