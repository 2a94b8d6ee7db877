import { existsSync } from 'node:fs';
import { mkdir, open, readdir, rename, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { AREA_FILES, CURRENT_FILE, type CurrentVersion } from './AreaMeta.ts';

const TEMPORARY = /^importing-(\d+)(-\d+)?$/;
let started = 0;

/** A folder to write into, beside the versions in use. */
export async function startTemporary(areaDir: string): Promise<string> {
  const temporary = join(areaDir, `importing-${process.pid}-${started++}`);
  await rm(temporary, { recursive: true, force: true });
  await mkdir(temporary);
  return temporary;
}

/**
 * Makes a finished folder the version in use. The pointer file is what counts: it is replaced by one
 * rename, so a crash at any moment leaves either the old area or the new one. Then sweeps old
 * versions and what killed imports left behind; open readers keep their files.
 */
export async function putInPlace(areaDir: string, temporary: string, version: string) {
  const target = join(areaDir, version);
  if (existsSync(target)) {
    // Same content imported again: only what it says about itself (its credit) may differ.
    await rename(join(temporary, AREA_FILES.meta), join(target, AREA_FILES.meta));
    await rm(temporary, { recursive: true });
  } else await rename(temporary, target);
  await syncFolder(areaDir);

  const pointer = join(areaDir, CURRENT_FILE);
  const draft = `${pointer}.${process.pid}`;
  const handle = await open(draft, 'w');
  try {
    await handle.writeFile(JSON.stringify({ version } satisfies CurrentVersion));
    await handle.sync();
  } finally {
    await handle.close();
  }
  await rename(draft, pointer);
  await syncFolder(areaDir);
  await sweep(areaDir, version);
}

async function syncFolder(folder: string) {
  const handle = await open(folder);
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

async function sweep(areaDir: string, version: string) {
  for (const entry of await readdir(areaDir)) {
    const owner = entry.match(TEMPORARY)?.[1];
    const stale = owner ? !isRunning(Number(owner)) : /^[0-9a-f]{12}$/.test(entry);
    if (stale && entry !== version)
      await rm(join(areaDir, entry), { recursive: true, force: true });
  }
}

function isRunning(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch {
    return false;
  }
}
