import fs from 'node:fs';
import path from 'node:path';
import { runToEnd } from './childProcess.mjs';
import { contentHash } from './contentHash.mjs';
import { projectRoot } from './projectRoot.mjs';
import { step } from './say.mjs';

const sources = [
  'src',
  'shared',
  'tiles/layers.ts',
  'index.html',
  'vite.config.ts',
  'tailwind.config.ts',
  'tsconfig.json',
  'package.json',
  'package-lock.json',
];
const dist = path.join(projectRoot, 'dist');
const stampFile = path.join(dist, '.stamp');

/** Builds the client into `dist` unless what is there was built from these very sources. */
export async function ensureClient() {
  const stamp = contentHash(projectRoot, sources, (file) => !/\.test\.tsx?$/.test(file));
  if (fs.existsSync(stampFile) && fs.readFileSync(stampFile, 'utf8') === stamp) return;
  await step('Building the client', async (progress) => {
    // Built aside, then swapped in: a running server never serves half a client, and a build that
    // is cut short leaves the last good one.
    const fresh = `${dist}.new.${process.pid}`;
    const old = `${dist}.old.${process.pid}`;
    try {
      const vite = path.join(projectRoot, 'node_modules/vite/bin/vite.js');
      const args = [vite, 'build', '--outDir', fresh, '--emptyOutDir', '--logLevel', 'warn'];
      await runToEnd('vite build', process.execPath, args, {
        onLine: progress,
        env: { NO_COLOR: '1' },
      });
      fs.writeFileSync(path.join(fresh, '.stamp'), stamp);
      if (fs.existsSync(dist)) fs.renameSync(dist, old);
      fs.renameSync(fresh, dist);
    } finally {
      fs.rmSync(fresh, { recursive: true, force: true });
      fs.rmSync(old, { recursive: true, force: true });
    }
  });
}
