import type { Bounds } from './Bounds.ts';
import type { RoadCounts } from './roads/buildRoadGraph.ts';

/** What an imported area says about itself; `area.json` beside its data. */
export interface AreaMeta {
  format: number;
  name: string;
  /** Twelve hex digits of what went in; part of every tile address. */
  version: string;
  /** Box around its roads and addresses. */
  bounds: Bounds;
  /** Shown on every map, plain text. */
  attribution: string;
  /** Which generator or file it came from, as the importer was told. */
  source: string;
  counts: AreaCounts;
}

/** The report of an import. */
export interface AreaCounts extends RoadCounts {
  nodes: number;
  ways: number;
  relations: number;
  addresses: number;
  streets: number;
  tiles: number;
  tileBytes: number;
  /** House numbers without a street to search them by. */
  addressesWithoutStreet: number;
  /** Multipolygons whose rings the extract's border cut. */
  brokenShapes: number;
  /** Coastlines are open lines and are not closed into sea: their sea stays paper-coloured. */
  coastlines: number;
}

/** Raise when the files' shape changes; areas of another format are imported again. */
export const AREA_FORMAT = 1;

/** Files of one version of an area, inside `<area>/<version>/`. */
export const AREA_FILES = {
  meta: 'area.json',
  roads: 'roads.bin',
  addresses: 'addresses.json',
  tiles: 'tiles.bin',
  tileIndex: 'tiles.json',
} as const;

/** Names the version in use; replaced by a rename, which is all or nothing. */
export const CURRENT_FILE = 'current.json';

export interface CurrentVersion {
  version: string;
}
