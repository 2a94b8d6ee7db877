import fs from 'node:fs';
import path from 'node:path';
import { nodeFits } from './nodeFits.mjs';
import { projectRoot } from './projectRoot.mjs';
import { SetupError } from './setupError.mjs';

/** Throws a SetupError unless this Node is one that package.json's "engines" allow. */
export function ensureNode() {
  const { engines } = JSON.parse(fs.readFileSync(path.join(projectRoot, 'package.json'), 'utf8'));
  if (!nodeFits(process.versions.node, engines.node)) {
    throw new SetupError(
      `Furlong needs Node ${engines.node}; this is ${process.versions.node} (${process.execPath}).`,
    );
  }
}
