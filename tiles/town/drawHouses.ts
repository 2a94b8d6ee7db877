import type { OsmTags } from '../osm/osmTypes.ts';
import type { OsmDraft } from './OsmDraft.ts';
import type { House } from './placeHouses.ts';
import type { Point } from './plane.ts';
import type { Random } from './seededRandom.ts';

/** Not every house is surveyed, as in real extracts; search then answers with the nearest number. */
const SURVEYED = 0.45;

/** Buildings with their addresses: on the building itself, or on a node at the door, as mappers do both. */
export function drawHouses(draft: OsmDraft, houses: readonly House[], random: Random): void {
  for (const house of houses) {
    const address = addressTags(house);
    const surveyed = random.chance(SURVEYED);
    const onBuilding = random.chance(0.6);
    draft.ring(footprint(house), { building: 'house', ...(surveyed && onBuilding && address) });
    if (surveyed && !onBuilding) draft.node(house.at, address);
  }
}

function addressTags({ street, number, settlement }: House): OsmTags {
  return {
    'addr:housenumber': number,
    'addr:street': street,
    'addr:city': settlement.city,
    'addr:postcode': settlement.postcode,
  };
}

function footprint({ at, heading, width, depth }: House): Point[] {
  const c = Math.cos(heading);
  const s = Math.sin(heading);
  const corner = (u: number, v: number): Point => [at[0] + u * c - v * s, at[1] + u * s + v * c];
  const w = width / 2;
  const d = depth / 2;
  return [corner(-w, -d), corner(w, -d), corner(w, d), corner(-w, d)];
}
