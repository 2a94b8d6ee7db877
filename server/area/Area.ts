import type { LatLon } from '#shared/travel/distanceMetres.ts';
import type { Bounds } from '#tiles/Bounds.ts';

/** Where a point meets the road. */
export interface Snap {
  section: number;
  /** 0–1 along the section. */
  share: number;
  lat: number;
  lon: number;
  /** From the point to the road, metres. */
  metres: number;
}

/** Drives between every two points, row by row: entry `from * points.length + to`. Whole numbers. */
export interface DriveTable {
  seconds: number[];
  metres: number[];
  /** True where the drive is a straight-line guess because no road answer exists. */
  rough: boolean[];
}

export interface DriveRoute {
  seconds: number;
  metres: number;
  /** The road's shape, [lat, lon]; a straight line when rough. */
  line: [number, number][];
  rough: boolean;
}

export interface Address {
  /** Stable within one version of the area. */
  id: string;
  label: string;
  street: string;
  houseNumber: string;
  city: string;
  postcode: string;
  lat: number;
  lon: number;
}

export interface FoundAddress extends Address {
  /** False when the asked-for house number is unknown and the nearest number answers instead. */
  exact: boolean;
}

export interface Tile {
  /** Gzipped Mapbox vector tile. */
  data: Buffer;
  etag: string;
}

/** The imported ground of one region, open for questions. All answers are synchronous. */
export interface Area {
  readonly name: string;
  readonly version: string;
  /** Box around its roads and addresses. */
  readonly bounds: Bounds;
  /** Plain text; must be shown on every map of the area. */
  readonly attribution: string;
  readonly addressCount: number;

  /** The nearest road a van can stop on, or null when none is within 2 km. */
  snap(lat: number, lon: number): Snap | null;
  table(points: readonly LatLon[]): DriveTable;
  route(from: LatLon, to: LatLon): DriveRoute;

  /** Best first. `near` prefers what is close to a place. */
  findAddresses(text: string, near?: LatLon, limit?: number): FoundAddress[];
  nearestAddress(lat: number, lon: number): (Address & { metres: number }) | null;
  /** The i-th address, 0 ≤ i < addressCount. */
  addressAt(index: number): Address;

  /** Null where the map is blank. */
  tile(z: number, x: number, y: number): Tile | null;
  close(): void;
}
