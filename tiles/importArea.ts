import { createHash } from 'node:crypto';
import { createReadStream, writeFileSync } from 'node:fs';
import { mkdir, rm } from 'node:fs/promises';
import { basename, join } from 'node:path';
import { AreaImportError } from './AreaImportError.ts';
import { AREA_FILES, AREA_FORMAT, type AreaMeta } from './AreaMeta.ts';
import { type Bounds, growBounds } from './Bounds.ts';
import type { AddressTable } from './collectAddresses.ts';
import { cutTiles } from './cutTiles.ts';
import { extractAddresses } from './extractAddresses.ts';
import { TILE_FORMAT } from './layers.ts';
import { mapFeatures } from './mapFeatures.ts';
import { collectOsm } from './osm/collectOsm.ts';
import { E7 } from './osm/NodeStore.ts';
import { putInPlace, startTemporary } from './replaceArea.ts';
import { buildRoadGraph } from './roads/buildRoadGraph.ts';
import { CAR_PROFILE, CAR_PROFILE_VERSION } from './roads/carProfile.ts';
import type { RoadGraph } from './roads/RoadGraph.ts';
import { encodeRoadGraph } from './roads/roadGraphFile.ts';
import { writeTiles } from './tileFile.ts';

export interface ImportProgress {
  step: 'reading' | 'roads' | 'addresses' | 'tiles' | 'done';
  /** 0–1000 of the whole import, a guess. */
  permille: number;
}

export interface ImportOrder {
  /** `.osm.pbf` or `.osm`; told apart by content. */
  file: string;
  /** The area's own folder, e.g. `.data/areas/pellan-bay`. */
  outDir: string;
  /** Lower-case letters, digits and dashes: it stands in addresses. */
  name: string;
  /** Shown on every map. Data from OpenStreetMap must credit its contributors (ODbL). */
  attribution?: string;
  /** Remembered in the area, to tell later what it was made from. Default: the file's name. */
  source?: string;
  onProgress?: (progress: ImportProgress) => void;
}

/**
 * Turns one OpenStreetMap extract into all Furlong knows about the ground: road graph, addresses,
 * map tiles. All or nothing: until the very end an older import of the same folder stays in use.
 * Throws AreaImportError for files that are missing, damaged, cut short, empty or without roads.
 */
export async function importArea(order: ImportOrder): Promise<AreaMeta> {
  const { file, outDir, name, onProgress } = order;
  if (!/^[a-z0-9][a-z0-9-]{0,59}$/.test(name))
    throw new AreaImportError(
      'bad-name',
      `name "${name}" may have lower-case letters, digits and dashes only, 60 at most.`,
    );
  const report = (step: ImportProgress['step'], permille: number) =>
    onProgress?.({ step, permille: Math.round(permille) });

  report('reading', 0);
  const osm = await collectOsm(file, CAR_PROFILE, (read, total) =>
    report('reading', (300 * read) / total),
  );
  if (osm.nodes.size === 0) throw new AreaImportError('empty', `${file} holds no places at all.`);

  report('roads', 300);
  const roads = buildRoadGraph(osm.roads, osm.nodes, osm.blockedNodes, CAR_PROFILE);
  if (!roads)
    throw new AreaImportError('roadless', `${file} has no roads a van could drive there and back.`);

  report('addresses', 400);
  const { table, withoutStreet } = extractAddresses(osm);
  const bounds = boundsOf(roads.graph, table);

  report('tiles', 450);
  const { features, brokenShapes } = mapFeatures(osm);
  const version = await versionOf(file);
  await mkdir(outDir, { recursive: true });
  const temporary = await startTemporary(outDir);
  try {
    const write = (part: keyof typeof AREA_FILES, data: string | Buffer) =>
      writeFileSync(join(temporary, AREA_FILES[part]), data, { flush: true });
    const tiles = writeTiles(
      join(temporary, AREA_FILES.tiles),
      join(temporary, AREA_FILES.tileIndex),
      cutTiles(features, growBounds(bounds, MAP_MARGIN_METRES)),
    );
    report('tiles', 950);
    write('roads', encodeRoadGraph(roads.graph));
    write('addresses', JSON.stringify(table));
    const meta: AreaMeta = {
      format: AREA_FORMAT,
      name,
      version,
      bounds,
      attribution: order.attribution ?? '© OpenStreetMap contributors',
      source: order.source ?? basename(file),
      counts: {
        nodes: osm.nodes.size,
        ways: osm.ways.size,
        relations: osm.relationCount,
        ...roads.counts,
        addresses: table.house.length,
        streets: table.streets.length,
        tiles: tiles.count,
        tileBytes: tiles.bytes,
        addressesWithoutStreet: withoutStreet,
        brokenShapes,
        coastlines: countCoastlines(osm.ways.values()),
      },
    };
    write('meta', JSON.stringify(meta, null, 2));
    await putInPlace(outDir, temporary, version);
    report('done', 1000);
    return meta;
  } catch (failure) {
    await rm(temporary, { recursive: true, force: true });
    throw failure;
  }
}

/** The map goes this far past the last road, so that a wide screen does not end in nothing. */
const MAP_MARGIN_METRES = 6000;

async function versionOf(file: string): Promise<string> {
  const hash = createHash('sha256').update(
    `${AREA_FORMAT} ${TILE_FORMAT} ${CAR_PROFILE_VERSION}\n`,
  );
  for await (const chunk of createReadStream(file)) hash.update(chunk as Buffer);
  return hash.digest('hex').slice(0, 12);
}

function boundsOf(graph: RoadGraph, { latE7, lonE7 }: AddressTable): Bounds {
  const bounds = { west: 180, south: 90, east: -180, north: -90 };
  const include = (lats: ArrayLike<number>, lons: ArrayLike<number>) => {
    for (let i = 0; i < lats.length; i++) {
      bounds.south = Math.min(bounds.south, lats[i]! / E7);
      bounds.north = Math.max(bounds.north, lats[i]! / E7);
      bounds.west = Math.min(bounds.west, lons[i]! / E7);
      bounds.east = Math.max(bounds.east, lons[i]! / E7);
    }
  };
  include(graph.shapeLatE7, graph.shapeLonE7);
  include(latE7, lonE7);
  return bounds;
}

function countCoastlines(ways: Iterable<{ tags?: Record<string, string> }>): number {
  let count = 0;
  for (const { tags } of ways) if (tags?.natural === 'coastline') count += 1;
  return count;
}
