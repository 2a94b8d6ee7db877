import { readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { CURRENT_FILE } from '#tiles/AreaMeta.ts';
import type { Area } from './Area.ts';
import { dataFolder } from './dataFolder.ts';
import { openArea } from './openArea.ts';

const open = new Map<string, { area: Area; stamp: string }>();

/**
 * The area of that name, opened on first use and again after a re-import; null when there is none.
 * Callers ask each time rather than keep the answer, so that they never mix two versions.
 */
export function areaFor(name: string, dataDir: string = dataFolder()): Area | null {
  if (!/^[a-z0-9][a-z0-9-]*$/.test(name)) return null;
  const dir = join(dataDir, 'areas', name);
  const stamp = stampOf(join(dir, CURRENT_FILE));
  if (stamp === null) return null;
  const known = open.get(dir);
  if (known?.stamp === stamp) return known.area;
  const area = openArea(dir);
  open.set(dir, { area, stamp });
  known?.area.close();
  return area;
}

/** Every imported area of this server, opened, by name. */
export function listAreas(dataDir: string = dataFolder()): Area[] {
  const folder = join(dataDir, 'areas');
  if (!statSync(folder, { throwIfNoEntry: false })) return [];
  return readdirSync(folder)
    .sort()
    .flatMap((name) => areaFor(name, dataDir) ?? []);
}

function stampOf(file: string): string | null {
  const stats = statSync(file, { throwIfNoEntry: false });
  return stats ? `${stats.ino}/${stats.mtimeMs}` : null;
}
