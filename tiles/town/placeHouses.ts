import { isForbidden } from './growStreets.ts';
import type { JoinedRoad } from './joinRoads.ts';
import { gap, nearestOnSegment, type Point, SegmentGrid } from './plane.ts';
import type { Random } from './seededRandom.ts';
import { type Settlement, settlementAt } from './settlements.ts';

/** A house with its address. */
export interface House {
  at: Point;
  /** Direction of its street, radians. */
  heading: number;
  width: number;
  depth: number;
  street: string;
  number: string;
  settlement: Settlement;
}

interface Plot {
  at: Point;
  heading: number;
  number: number;
}

/** Rows of houses along streets: odd numbers on the left, even on the right, none on a crossing. */
export function placeHouses(roads: readonly JoinedRoad[], random: Random): House[] {
  const streets = new SegmentGrid<readonly [Point, Point]>(80);
  for (const { spots } of roads) {
    for (let i = 1; i < spots.length; i++) {
      const piece = [spots[i - 1]!.at, spots[i]!.at] as const;
      streets.add(piece[0], piece[1], piece);
    }
  }
  const taken = new SegmentGrid<House>(40);
  const houses: House[] = [];
  for (const road of roads) {
    if (road.roundabout || road.highway === 'trunk' || road.name === '') continue;
    for (const { at, heading, number } of plotsAlong(road)) {
      const { settlement, radii } = settlementAt(at);
      if (radii > 1.04 || isForbidden(at) || random.chance(0.07)) continue;
      const width = Math.min(17, settlement.plot * random.between(0.52, 0.72));
      const depth = random.between(9, settlement.plot < 25 ? 11 : 13);
      const clear = depth / 2 + 4;
      const crowded = [...streets.near(at, at, clear)].some(
        ([a, b]) => gap(nearestOnSegment(at, a, b).at, at) < clear,
      );
      const room = settlement.plot * 0.62;
      if (crowded || [...taken.near(at, at, room)].some((other) => gap(other.at, at) < room))
        continue;
      const letter = random.chance(0.02) ? 'a' : '';
      const house: House = {
        at,
        heading,
        width,
        depth,
        street: road.name,
        number: `${number}${letter}`,
        settlement,
      };
      taken.add(at, at, house);
      houses.push(house);
    }
  }
  return houses;
}

function plotsAlong({ spots, settlement }: JoinedRoad): Plot[] {
  const plots: Plot[] = [];
  let walked = 0;
  let next = 0;
  let index = 0;
  for (let i = 1; i < spots.length; i++) {
    const a = spots[i - 1]!.at;
    const b = spots[i]!.at;
    const length = gap(a, b);
    const local = settlement ?? settlementAt(a).settlement;
    if (next === 0) next = local.plot * 0.7;
    const heading = Math.atan2(b[1] - a[1], b[0] - a[0]);
    for (; next < walked + length; next += local.plot) {
      const along = next - walked;
      const back = local.plot < 25 ? 12 : 18;
      for (const side of [1, -1]) {
        const at: Point = [
          a[0] + along * Math.cos(heading) - side * back * Math.sin(heading),
          a[1] + along * Math.sin(heading) + side * back * Math.cos(heading),
        ];
        plots.push({ at, heading, number: 2 * index + (side === 1 ? 1 : 2) });
      }
      index += 1;
    }
    walked += length;
  }
  return plots;
}
