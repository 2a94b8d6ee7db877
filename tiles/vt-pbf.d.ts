declare module 'vt-pbf' {
  import type { LegacyTile } from 'geojson-vt';

  /** Layers by name, encoded as a Mapbox vector tile (not compressed). */
  export function fromGeojsonVt(
    layers: Record<string, LegacyTile>,
    options?: { version?: number; extent?: number },
  ): Uint8Array;
}
