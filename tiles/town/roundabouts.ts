import type { JoinedRoad, Spot } from './joinRoads.ts';
import { blend, gap, type Point } from './plane.ts';

const RADIUS = 30;

/** Opens the crossings of the named pairs of roads into roundabouts, driven counter-clockwise. */
export function openRoundabouts(
  roads: readonly JoinedRoad[],
  pairs: readonly (readonly [string, string])[],
): JoinedRoad[] {
  let out = [...roads];
  let nextId = 1 + Math.max(...roads.flatMap(({ spots }) => spots.map(({ id }) => id)));
  for (const pair of pairs) {
    const [a, b] = pair.map((name) => out.filter((road) => road.name === name));
    const ids = new Set(b!.flatMap(({ spots }) => spots.map(({ id }) => id)));
    const centre = a!.flatMap(({ spots }) => spots).find(({ id }) => ids.has(id));
    if (!centre) throw new Error(`${pair.join(' and ')} do not cross`);
    const entries: Spot[] = [];
    out = out.flatMap((road) => partAround(road, centre, entries, () => nextId++));
    out.push(ringOf(centre.at, entries, a![0]!, () => nextId++));
  }
  return out;
}

function partAround(
  road: JoinedRoad,
  centre: Spot,
  entries: Spot[],
  newId: () => number,
): JoinedRoad[] {
  const at = road.spots.findIndex(({ id }) => id === centre.id);
  if (at < 0) return [road];
  const outward = [road.spots.slice(0, at + 1).reverse(), road.spots.slice(at)];
  const [before, after] = outward.map((arm) => shortened(arm, centre.at, newId));
  if (before) entries.push(before[0]!);
  if (after) entries.push(after[0]!);
  return [before?.toReversed(), after].flatMap((spots) => (spots ? [{ ...road, spots }] : []));
}

/** The arm from where it leaves the circle on; undefined when it never does. */
function shortened(arm: Spot[], centre: Point, newId: () => number): Spot[] | undefined {
  const outside = arm.findIndex(({ at }) => gap(at, centre) > RADIUS);
  if (outside < 1) return undefined;
  const inner = arm[outside - 1]!.at;
  const outer = arm[outside]!.at;
  let low = 0;
  let high = 1;
  for (let i = 0; i < 30; i++) {
    const middle = (low + high) / 2;
    if (gap(blend(inner, outer, middle), centre) > RADIUS) high = middle;
    else low = middle;
  }
  return [{ id: newId(), at: blend(inner, outer, high) }, ...arm.slice(outside)];
}

function ringOf(centre: Point, entries: Spot[], like: JoinedRoad, newId: () => number): JoinedRoad {
  const angle = ({ at }: Spot) => Math.atan2(at[1] - centre[1], at[0] - centre[0]);
  const between = Array.from({ length: 16 }, (_, i) => {
    const turn = ((i + 0.5) / 16) * 2 * Math.PI - Math.PI;
    const at = [centre[0] + RADIUS * Math.cos(turn), centre[1] + RADIUS * Math.sin(turn)] as const;
    return { id: newId(), at };
  }).filter((spot) => entries.every((entry) => gap(entry.at, spot.at) > 5));
  const spots = [...entries, ...between].sort((a, b) => angle(a) - angle(b));
  return {
    ...like,
    name: '',
    townKmh: 50,
    openKmh: 50,
    roundabout: true,
    spots: [...spots, spots[0]!],
  };
}
