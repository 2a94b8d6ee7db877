import {
  addressOf,
  collectAddresses,
  type AddressTable,
  type FoundAddress,
} from './collectAddresses.ts';
import type { CollectedOsm } from './osm/collectOsm.ts';
import { E7 } from './osm/NodeStore.ts';
import type { OsmTags } from './osm/osmTypes.ts';
import { ringCentre } from './ringCentre.ts';

/** Addresses of tagged nodes and of buildings (at their centre). */
export function extractAddresses(osm: CollectedOsm): {
  table: AddressTable;
  withoutStreet: number;
} {
  const found: FoundAddress[] = [];
  let withoutStreet = 0;
  const take = (tags: OsmTags, latE7: number, lonE7: number) => {
    const address = addressOf(tags, latE7, lonE7);
    if (address) found.push(address);
    else withoutStreet += 1;
  };
  for (const { tags, lat, lon } of osm.taggedNodes) {
    if (tags!['addr:housenumber']) take(tags!, Math.round(lat * E7), Math.round(lon * E7));
  }
  for (const { tags, refs } of osm.ways.values()) {
    if (!tags?.['addr:housenumber']) continue;
    const ring = refs.flatMap((ref) => {
      const index = osm.nodes.indexOf(ref);
      return index < 0 ? [] : [[osm.nodes.lonE7(index), osm.nodes.latE7(index)]];
    });
    if (ring.length === 0) continue;
    const [lonE7, latE7] = ringCentre(ring) as [number, number];
    take(tags, Math.round(latE7), Math.round(lonE7));
  }
  return { table: collectAddresses(found), withoutStreet };
}
