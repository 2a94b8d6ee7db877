// `npm test`: everything that tells whether Furlong works, ending in one line `N passed, N failed`.
// `npm test -- api households` runs only that project (and files whose path holds that word).
import { ensureClient } from './clientBuild.mjs';
import { ensurePrograms } from './debianPackages.mjs';
import { ensureModules } from './ensureModules.mjs';
import { ensureNode } from './ensureNode.mjs';
import { ensureMariadb } from './mariadb.mjs';
import { atEnd, runSetup } from './runSetup.mjs';
import { say } from './say.mjs';
import { sayCheck } from './sayCheck.mjs';
import { runStaticChecks, staticChecks } from './staticChecks.mjs';
import { summaryLine } from './testCounts.mjs';
import { startThrowawayDatabase } from './throwawayDatabase.mjs';
import { runVitestProject } from './vitestProject.mjs';

const allProjects = ['unit', 'api', 'e2e'];

/** @type {{ passed: number, failed: number }[]} */
const parts = [];
let complete = false;
// Printed last of all, whatever happens: whoever reads only the end of the output reads this line.
// A run that broke off adds one failure, so that it can never look green.
atEnd(() => {
  if (!complete) count(false);
  say(summaryLine(parts));
});
await runSetup(test, { stoppedCode: 130 });

async function test() {
  const [only, ...filters] = process.argv.slice(2);
  const projects = only ? [only] : allProjects;
  await ensureEverything(projects);
  if (!only) {
    say('Types, lint and format:');
    await runStaticChecks(staticChecks, (result) => {
      sayCheck(result);
      count(result.passed);
    });
  }
  const env = projects.some(needsDatabase) ? await testEnvironment() : {};
  for (const project of projects) {
    say(`\n${project} tests:`);
    const counts = await runVitestProject(project, filters, env);
    for (const file of counts.broken) say(`Could not be loaded: ${file}`);
    if (counts.skipped > 0) say(`Skipped, and counted as neither: ${counts.skipped}`);
    parts.push(counts);
  }
  complete = true;
  return parts.some(({ failed }) => failed > 0) ? 1 : 0;
}

/** @param {boolean} passed */
function count(passed) {
  parts.push({ passed: Number(passed), failed: Number(!passed) });
}

/** @param {string[]} projects */
async function ensureEverything(projects) {
  ensureNode();
  await ensureModules();
  if (projects.some(needsDatabase)) await ensureMariadb();
  if (projects.includes('e2e')) {
    // Drives the browser tests. Debian's own build: nothing is downloaded from anywhere else.
    await ensurePrograms('the browser tests', ['chromium'], ['chromium']);
  }
}

/** @param {string} project */
function needsDatabase(project) {
  return project !== 'unit';
}

/** A database server of the tests' own, and the client as a browser gets it. */
async function testEnvironment() {
  const [database] = await Promise.all([startThrowawayDatabase(), ensureClient()]);
  atEnd(database.stop);
  return { TEST_DATABASE_URL: database.url };
}
