/**
 * Names and zooms of the vector tiles: what the import writes and the map paints. Plain data, so that
 * both sides agree without sharing code. A tile of data zoom z is shown at display zoom z + 1 (512 px
 * tiles); the deepest data zoom is stretched for every display zoom above it.
 */
export const TILE_ZOOMS = { least: 8, most: 14 } as const;

/** Written into tile addresses and area files; raise it when layers or encoding change. */
export const TILE_FORMAT = 1;

export type LayerName =
  'ground' | 'water' | 'stream' | 'building' | 'road' | 'roadname' | 'label' | 'housenumber';

/** Kinds per layer with the data zoom each first appears at. */
export const LAYER_ZOOMS = {
  /** Polygons: what grows or stands on the land. */
  ground: {
    built: 8,
    wood: 8,
    farm: 9,
    park: 9,
    sand: 9,
    grass: 11,
    yard: 11,
    pitch: 12,
    pier: 11,
  },
  /** Polygons. */
  water: { water: 8 },
  /** Lines. */
  stream: { river: 8, canal: 10, stream: 12 },
  /** Polygons. */
  building: { building: 14 },
  /** Lines, each with `bridge`, `tunnel` and `oneway` as 1 or absent. */
  road: {
    motorway: 8,
    trunk: 8,
    primary: 8,
    secondary: 9,
    tertiary: 10,
    street: 11,
    service: 13,
    path: 13,
    rail: 10,
    ferry: 10,
  },
  /** Lines of one name joined end to end, for lettering. */
  roadname: { motorway: 11, trunk: 11, primary: 11, secondary: 11, tertiary: 12, street: 13 },
  /** Points with `name`. */
  label: {
    city: 8,
    town: 8,
    village: 9,
    suburb: 10,
    hamlet: 11,
    sea: 8,
    water: 12,
    park: 12,
    wood: 12,
    place: 12,
    bridge: 13,
    school: 14,
    clinic: 14,
    vet: 13,
  },
  /** Points with `number`. */
  housenumber: { house: 14 },
} as const satisfies Record<LayerName, Record<string, number>>;

/** The address the map asks for tiles at; `{z}`, `{x}` and `{y}` stay in it. */
export function tileAddress(areaName: string, version: string): string {
  return `/tiles/${encodeURIComponent(areaName)}/${encodeURIComponent(version)}/{z}/{x}/{y}.mvt`;
}
