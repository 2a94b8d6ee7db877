import { gzipSync } from 'node:zlib';
import type { Feature } from 'geojson';
import GeoJSONVT from 'geojson-vt';
import { fromGeojsonVt } from 'vt-pbf';
import type { Bounds } from './Bounds.ts';
import { type LayerName, TILE_ZOOMS } from './layers.ts';
import type { FeatureKind } from './featureKind.ts';
import { tileNumbers } from './tileNumbers.ts';

/** Something to paint. `tags` go into the tile as they are, next to `kind`. */
export interface MapFeature extends FeatureKind {
  geometry: Feature['geometry'];
  tags: Record<string, string | number>;
}

export interface CutTile {
  z: number;
  x: number;
  y: number;
  /** Gzipped vector tile. */
  data: Buffer;
}

/** Keeps lettering and line ends whole across tile edges, in units of 4096 to a tile. */
const BUFFER = 96;

/** Every tile of the zooms we serve that touches the bounds and is not blank, one after another. */
export function* cutTiles(features: readonly MapFeature[], bounds: Bounds): Generator<CutTile> {
  const indexes = new Map<LayerName, GeoJSONVT>();
  const layers = new Map<LayerName, MapFeature[]>();
  for (const feature of features) {
    const members = layers.get(feature.layer);
    if (members) members.push(feature);
    else layers.set(feature.layer, [feature]);
  }
  for (const [layer, members] of layers) indexes.set(layer, indexOf(members));
  for (let z = TILE_ZOOMS.least; z <= TILE_ZOOMS.most; z++) {
    const northWest = tileNumbers(bounds.north, bounds.west, z);
    const southEast = tileNumbers(bounds.south, bounds.east, z);
    for (let x = northWest.x; x <= southEast.x; x++) {
      for (let y = northWest.y; y <= southEast.y; y++) {
        const data = encodeTile(indexes, z, x, y);
        if (data) yield { z, x, y, data };
      }
    }
  }
}

interface Carried {
  least: number;
  tags: Record<string, string | number>;
}

function indexOf(features: readonly MapFeature[]): GeoJSONVT {
  return new GeoJSONVT(
    {
      type: 'FeatureCollection',
      features: features.map(({ geometry, kind, least, tags }) => ({
        type: 'Feature',
        geometry,
        properties: { least, tags: { kind, ...tags } } satisfies Carried,
      })),
    },
    // −1 keeps cutting when simplification leaves a tile without points.
    { maxZoom: TILE_ZOOMS.most, indexMaxZoom: TILE_ZOOMS.most, indexMaxPoints: -1, buffer: BUFFER },
  );
}

function encodeTile(indexes: Map<LayerName, GeoJSONVT>, z: number, x: number, y: number) {
  const layers: Parameters<typeof fromGeojsonVt>[0] = {};
  for (const [layer, index] of indexes) {
    const shown = (index.getTile(z, x, y)?.features ?? []).flatMap((feature) => {
      const { least, tags } = feature.tags as unknown as Carried;
      return least <= z ? [{ ...feature, tags }] : [];
    });
    if (shown.length > 0) layers[layer] = { features: shown };
  }
  if (Object.keys(layers).length === 0) return null;
  return gzipSync(fromGeojsonVt(layers, { version: 2 }), { level: 9 });
}
