import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { AREA_FILES, AREA_FORMAT, CURRENT_FILE, type AreaMeta } from '#tiles/AreaMeta.ts';
import type { AddressTable } from '#tiles/collectAddresses.ts';
import { readRoadGraph } from '#tiles/roads/roadGraphFile.ts';
import { openTiles } from '#tiles/tileFile.ts';
import { AddressBook } from './AddressBook.ts';
import type { Area } from './Area.ts';
import { drives } from './drives.ts';
import { snapIndex } from './snapIndex.ts';

export type { Area } from './Area.ts';

/**
 * Opens the version in use of an imported area (`<data>/areas/<name>`). Throws when the folder holds
 * no finished import or one of another format.
 */
export function openArea(dir: string): Area {
  const meta = readAreaMeta(dir);
  if (!meta) throw new Error(`${dir} holds no imported area.`);
  if (meta.format !== AREA_FORMAT)
    throw new Error(`${dir} was imported by another version of Furlong. Import it again.`);
  const path = (part: keyof typeof AREA_FILES) => join(dir, meta.version, AREA_FILES[part]);
  const graph = readRoadGraph(path('roads'));
  const addresses = new AddressBook(
    JSON.parse(readFileSync(path('addresses'), 'utf8')) as AddressTable,
  );
  const tiles = openTiles(path('tiles'), path('tileIndex'));
  const snap = snapIndex(graph);
  const { table, route } = drives(graph, snap);
  return {
    name: meta.name,
    version: meta.version,
    bounds: meta.bounds,
    attribution: meta.attribution,
    addressCount: addresses.count,
    snap,
    table,
    route,
    findAddresses: (text, near, limit = 10) => addresses.find(text, near, limit),
    nearestAddress: (lat, lon) => addresses.nearest(lat, lon),
    addressAt: (index) => addresses.at(index),
    tile(z, x, y) {
      const data = tiles.read(z, x, y);
      return data && { data, etag: `"${meta.version}-${z}-${x}-${y}"` };
    },
    close: () => tiles.close(),
  };
}

/** What the area's folder says is in use; null when nothing was ever imported there. */
export function readAreaMeta(dir: string): AreaMeta | null {
  try {
    const { version } = readJson<{ version: string }>(join(dir, CURRENT_FILE));
    return readJson<AreaMeta>(join(dir, version, AREA_FILES.meta));
  } catch (failure) {
    if ((failure as NodeJS.ErrnoException).code === 'ENOENT') return null;
    throw failure;
  }
}

function readJson<T>(file: string): T {
  return JSON.parse(readFileSync(file, 'utf8')) as T;
}
