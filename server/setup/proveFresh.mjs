// `npm run prove:fresh`: from a bare Debian with Node to a passing `npm test`, by one command each.
// A machine that already has the packages would hide a missing step; this one has none.
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { insideBareSystem, makeBareSystem } from './bareSystem.mjs';
import { runToEnd, startChild } from './childProcess.mjs';
import { ensurePrograms } from './debianPackages.mjs';
import { hostAccess } from './hostAccess.mjs';
import { projectRoot } from './projectRoot.mjs';
import { atEnd, runSetup } from './runSetup.mjs';
import { say } from './say.mjs';
import { SetupError } from './setupError.mjs';
import { binary } from './staticChecks.mjs';

const resultFile = path.join(projectRoot, 'tests/proofs/fresh.json');

await runSetup(proveFresh, { stoppedCode: 130 });

async function proveFresh() {
  if (process.getuid?.() !== 0) throw new SetupError('prove:fresh makes a chroot: run it as root.');
  await ensurePrograms('a bare system', ['debootstrap'], ['debootstrap']);
  const where = process.env.FURLONG_PROVE_DIR || os.tmpdir();
  fs.mkdirSync(where, { recursive: true });
  const folder = fs.mkdtempSync(path.join(where, 'furlong-fresh-'));
  if (!process.env.FURLONG_PROVE_KEEP) {
    atEnd(() => fs.rmSync(folder, { recursive: true, force: true }));
  }
  const env = await makeBareSystem(folder, hostAccess());
  const commit = await copyHead(path.join(folder, 'root/furlong'));

  const script = ['node', '/root/furlong/server/setup/proveFreshInside.mjs', '/root/result.json'];
  // Through env -i: nothing of this machine's settings may help.
  const clean = ['env', '-i', ...Object.entries(env).map(([name, value]) => `${name}=${value}`)];
  const [program = '', ...args] = insideBareSystem(folder, [...clean, ...script]);
  const { code } = await startChild(program, args).finished;

  const inside = path.join(folder, 'root/result.json');
  const result = fs.existsSync(inside)
    ? JSON.parse(fs.readFileSync(inside, 'utf8'))
    : { passed: false, problems: [`it ended with exit ${code} and no result`] };
  fs.mkdirSync(path.dirname(resultFile), { recursive: true });
  const { passed, ...rest } = result;
  const proof = { proof: 'fresh', passed, commit, at: new Date().toISOString(), ...rest };
  fs.writeFileSync(resultFile, `${JSON.stringify(proof, null, 2)}\n`);
  // It is committed, so it must stand the format check (prettier joins short lists).
  const prettier = binary('prettier');
  if (fs.existsSync(prettier)) {
    await runToEnd('prettier', process.execPath, [prettier, '--write', resultFile]);
  }
  say(`\n${passed ? 'Proved' : 'NOT proved'} at ${commit}; see tests/proofs/fresh.json`);
  for (const problem of result.problems) say(`  ${problem}`);
  return passed ? 0 : 1;
}

/**
 * What is committed, not what lies about in this checkout.
 * @param {string} target
 * @returns {Promise<string>} the commit
 */
async function copyHead(target) {
  fs.mkdirSync(target, { recursive: true });
  let commit = '';
  await runToEnd('git', 'git', ['rev-parse', 'HEAD'], { onLine: (line) => (commit = line) });
  const archive = path.join(target, '../head.tar');
  await runToEnd('git archive', 'git', ['archive', '--output', archive, commit]);
  await runToEnd('tar', 'tar', ['-xf', archive, '-C', target]);
  fs.rmSync(archive);
  return commit;
}
