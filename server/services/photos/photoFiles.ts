import { mkdir, open, readdir, readFile, rename, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { env } from '#server/env.ts';

/** Folder of one business's photos. Ids only: nothing a person typed becomes part of a path. */
export function photoFolder(businessId?: string): string {
  const folder = join(env.dataFolder, 'photos');
  return businessId ? join(folder, businessId) : folder;
}

/** Temp → fsync → rename: under its name a file is whole, also after a power cut. */
export async function writePhoto(businessId: string, name: string, data: Buffer): Promise<void> {
  const folder = photoFolder(businessId);
  await mkdir(folder, { recursive: true, mode: 0o700 });
  const temporary = join(folder, `${name}.part`);
  const file = await open(temporary, 'wx', 0o600);
  try {
    await file.writeFile(data);
    await file.sync();
  } finally {
    await file.close();
  }
  await rename(temporary, join(folder, name));
  const entry = await open(folder, 'r');
  await entry.sync().finally(() => entry.close());
}

/** null when the file is gone. */
export async function readPhotoFile(businessId: string, name: string): Promise<Buffer | null> {
  try {
    return await readFile(join(photoFolder(businessId), name));
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
    throw error;
  }
}

export async function dropPhotoFile(businessId: string, name: string): Promise<void> {
  await rm(join(photoFolder(businessId), name), { force: true });
}

/** Business folders and the names in them not touched since `before`. */
export async function oldPhotoFiles(before: Date): Promise<Map<string, string[]>> {
  const found = new Map<string, string[]>();
  for (const businessId of await namesIn(photoFolder())) {
    const old: string[] = [];
    for (const name of await namesIn(photoFolder(businessId))) {
      const facts = await stat(join(photoFolder(businessId), name)).catch(() => null);
      if (facts?.isFile() && facts.mtime < before) old.push(name);
    }
    if (old.length > 0) found.set(businessId, old);
  }
  return found;
}

async function namesIn(folder: string): Promise<string[]> {
  try {
    return await readdir(folder);
  } catch (error) {
    if (['ENOENT', 'ENOTDIR'].includes((error as NodeJS.ErrnoException).code ?? '')) return [];
    throw error;
  }
}
