import type { JoinedRoad } from './joinRoads.ts';
import { isForbidden } from './growStreets.ts';
import type { OsmDraft } from './OsmDraft.ts';
import { gap, type Point } from './plane.ts';
import type { Random } from './seededRandom.ts';
import { settlementAt } from './settlements.ts';

/** Lone houses down private drives off the country roads: a van must reach them, never cut through. */
export function placeFarms(draft: OsmDraft, roads: readonly JoinedRoad[], random: Random): void {
  for (const road of roads) {
    if (road.settlement || road.roundabout || road.highway === 'trunk') continue;
    let since = 0;
    let number = 201;
    for (let i = 1; i + 1 < road.spots.length; i++) {
      const before = road.spots[i - 1]!.at;
      const spot = road.spots[i]!;
      since += gap(before, spot.at);
      const { settlement, radii } = settlementAt(spot.at);
      if (since < 420 || radii < 1.15 || random.chance(0.25)) continue;
      since = 0;
      const along = Math.atan2(spot.at[1] - before[1], spot.at[0] - before[0]);
      const side = random.chance(0.5) ? 1 : -1;
      const length = random.between(60, 240);
      const at = (share: number, bend: number): Point => {
        const heading = along + side * (Math.PI / 2 + bend);
        const reach = length * share;
        return [spot.at[0] + reach * Math.cos(heading), spot.at[1] + reach * Math.sin(heading)];
      };
      const end = at(1, random.between(-0.3, 0.3));
      if (isForbidden(end) || isForbidden(at(0.5, 0))) continue;
      const address = {
        'addr:housenumber': String(number),
        'addr:street': road.name,
        'addr:city': settlement.city,
        'addr:postcode': settlement.postcode,
      };
      number += 2;
      const door = draft.node(end, address);
      draft.way([draft.spot(spot.id, spot.at), draft.node(at(0.55, 0.1)), door], {
        highway: 'service',
        service: 'driveway',
        access: 'private',
      });
      const square = (dx: number, dy: number): Point => [end[0] + dx, end[1] + dy];
      draft.ring([square(3, 3), square(19, 3), square(19, 13), square(3, 13)], {
        building: 'farm',
      });
      draft.ring([square(-20, -8), square(-4, -8), square(-4, 20), square(-20, 20)], {
        building: 'barn',
      });
    }
  }
}
