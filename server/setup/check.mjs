// `npm run check`: all that can be told in under a minute, without a database or a browser.
import { ensureModules } from './ensureModules.mjs';
import { ensureNode } from './ensureNode.mjs';
import { runSetup } from './runSetup.mjs';
import { say } from './say.mjs';
import { sayCheck } from './sayCheck.mjs';
import { runStaticChecks, staticChecks } from './staticChecks.mjs';
import { runVitestProject } from './vitestProject.mjs';

await runSetup(check, { stoppedCode: 130 });

async function check() {
  ensureNode();
  await ensureModules();
  const startedAt = Date.now();
  const results = await runStaticChecks(staticChecks, sayCheck);
  const unit = await runVitestProject('unit', []);
  const red = results.filter((result) => !result.passed).map((result) => result.name);
  if (unit.failed > 0) red.push(`${unit.failed} of ${unit.passed + unit.failed} unit tests`);
  const seconds = ((Date.now() - startedAt) / 1000).toFixed(1);
  say(red.length > 0 ? `Failed: ${red.join(', ')} (${seconds} s)` : `All good (${seconds} s)`);
  return red.length > 0 ? 1 : 0;
}
