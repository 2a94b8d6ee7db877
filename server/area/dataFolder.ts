import { resolve } from 'node:path';
import { fileURLToPath } from 'node:url';

/**
 * Where areas are kept: `FURLONG_DATA` (a relative path counts from the project), or `.data`. Read
 * here and not through `server/env.ts`, because the area commands need no other setting.
 */
export function dataFolder(env: NodeJS.ProcessEnv = process.env): string {
  const root = fileURLToPath(new URL('../..', import.meta.url));
  return resolve(root, env.FURLONG_DATA || '.data');
}
