import type { OsmTags } from './osm/osmTypes.ts';

/** Addresses in columns: streets once, houses as parallel arrays that point at them. */
export interface AddressTable {
  streets: { street: string; city: string; postcode: string }[];
  /** Index into `streets` per house. */
  house: number[];
  number: string[];
  latE7: number[];
  lonE7: number[];
}

/** One address as found, before it is put into columns. */
export interface FoundAddress {
  street: string;
  city: string;
  postcode: string;
  number: string;
  latE7: number;
  lonE7: number;
}

/** The address in a thing's tags; null without a house number or a street to search it by. */
export function addressOf(tags: OsmTags, latE7: number, lonE7: number): FoundAddress | null {
  const number = tags['addr:housenumber']?.trim();
  const street = (tags['addr:street'] ?? tags['addr:place'])?.trim();
  if (!number || !street) return null;
  return {
    street,
    number,
    city: (tags['addr:city'] ?? tags['addr:suburb'] ?? '').trim(),
    postcode: (tags['addr:postcode'] ?? '').trim(),
    latE7,
    lonE7,
  };
}

/** Columns without doubles: a house is often both a building and a node at its door. */
export function collectAddresses(found: readonly FoundAddress[]): AddressTable {
  const table: AddressTable = { streets: [], house: [], number: [], latE7: [], lonE7: [] };
  const streetIds = new Map<string, number>();
  const seen = new Set<string>();
  for (const { street, city, postcode, number, latE7, lonE7 } of found) {
    const streetKey = `${street}\n${city}\n${postcode}`;
    let id = streetIds.get(streetKey);
    if (id === undefined) {
      id = table.streets.push({ street, city, postcode }) - 1;
      streetIds.set(streetKey, id);
    }
    // Villages without addr:city may share street names, so only a near namesake is a double.
    const cell = `${Math.round(latE7 / NEAR_E7)},${Math.round(lonE7 / NEAR_E7)}`;
    const houseKey = `${id}\n${number.toLowerCase()}\n${cell}`;
    if (seen.has(houseKey)) continue;
    seen.add(houseKey);
    table.house.push(id);
    table.number.push(number);
    table.latE7.push(latE7);
    table.lonE7.push(lonE7);
  }
  return table;
}

/** About a kilometre. */
const NEAR_E7 = 100_000;
