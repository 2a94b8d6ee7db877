import { openShapes, waterRings } from './landscape.ts';
import { crossing, gap, isInside, lengthOf, type Line, type Point, SegmentGrid } from './plane.ts';
import type { Random } from './seededRandom.ts';
import { type Settlement, settlementAt } from './settlements.ts';
import { streetField } from './streetField.ts';

/** A street as grown, not yet named. `across` tells the two families of a settlement's grid apart. */
export interface GrownStreet {
  line: Point[];
  settlement: Settlement;
  across: boolean;
}

interface Seed {
  at: Point;
  heading: number;
  across: boolean;
}

interface Piece {
  a: Point;
  b: Point;
  heading: number;
  main: boolean;
}

const STEP = 14;
const MOST_STREETS = 4000;

/**
 * Evenly spaced streamlines through the street field (after Jobard & Lefer 1997): each street starts
 * across another, follows the field, and ends at a main road, at water or a park, at the town's edge,
 * or where it would run too close beside a street of its own direction.
 */
export function growStreets(mainRoads: readonly Line[], random: Random): GrownStreet[] {
  const field = streetField(mainRoads);
  const pieces = new SegmentGrid<Piece>(120);
  const streets: GrownStreet[] = [];
  const queue: Seed[] = [];
  for (const line of mainRoads) remember(pieces, line, true);
  for (const line of mainRoads) queue.push(...seedsAlong(line, true));

  for (let next = 0; next < queue.length && streets.length < MOST_STREETS; next++) {
    const seed = queue[next]!;
    const { settlement, radii } = settlementAt(seed.at);
    if (radii > 1) continue;
    const most = settlement.spacing * random.between(6, 13);
    const line = trace(seed, settlement, field, pieces, most);
    if (lengthOf(line) < settlement.spacing * 0.75) continue;
    streets.push({ line, settlement, across: seed.across });
    remember(pieces, line, false);
    queue.push(...seedsAlong(line, !seed.across));
  }
  return streets;
}

/** Streets stand denser across than along, so blocks come out long. */
function spacingOf(settlement: Settlement, across: boolean): number {
  return settlement.spacing * (across ? 1.75 : 1);
}

function seedsAlong(line: Line, across: boolean): Seed[] {
  const seeds: Seed[] = [];
  let since = 0;
  for (let i = 1; i < line.length; i++) {
    const a = line[i - 1]!;
    const b = line[i]!;
    since += gap(a, b);
    if (since < spacingOf(settlementAt(b).settlement, across)) continue;
    since = 0;
    const along = Math.atan2(b[1] - a[1], b[0] - a[0]);
    for (const side of [1, -1])
      seeds.push({ at: b, heading: along + (side * Math.PI) / 2, across });
  }
  return seeds;
}

function trace(
  seed: Seed,
  settlement: Settlement,
  field: (at: Point, heading: number) => number,
  pieces: SegmentGrid<Piece>,
  most: number,
): Point[] {
  const line: Point[] = [seed.at];
  const clear = spacingOf(settlement, seed.across) * 0.62;
  let { at, heading } = seed;
  for (let walked = 0; walked < most; walked += STEP) {
    const turned = field(at, heading);
    heading = walked === 0 ? seed.heading : heading + 0.5 * (turned - heading);
    const next: Point = [at[0] + STEP * Math.cos(heading), at[1] + STEP * Math.sin(heading)];
    if (isForbidden(next) || settlementAt(next).radii > 1.03) break;
    const main = firstMainRoad(pieces, at, next);
    if (main && walked > 0) {
      line.push(main);
      break;
    }
    if (runsBeside(pieces, next, heading, clear)) break;
    line.push(next);
    at = next;
  }
  return line;
}

const SHORE = 26;
const parks = openShapes.map(({ ring }) => boxed(ring));
const waters = waterRings.map(boxed);

/** Water with a strip of shore, and open ground: no streets and no houses there. */
export function isForbidden(at: Point): boolean {
  if (parks.some((park) => park.near(at, 0) && isInside(at, park.ring))) return true;
  return waters.some(
    (water) =>
      water.near(at, SHORE) &&
      [-SHORE, SHORE].some((dx) =>
        [-SHORE, SHORE].some((dy) => isInside([at[0] + dx, at[1] + dy], water.ring)),
      ),
  );
}

/** A ring with its box, so that most questions are answered by four comparisons. */
function boxed(ring: Line) {
  const xs = ring.map(([x]) => x);
  const ys = ring.map(([, y]) => y);
  const [west, east] = [Math.min(...xs), Math.max(...xs)];
  const [south, north] = [Math.min(...ys), Math.max(...ys)];
  const near = ([x, y]: Point, by: number) =>
    x > west - by && x < east + by && y > south - by && y < north + by;
  return { ring, near };
}

function firstMainRoad(pieces: SegmentGrid<Piece>, from: Point, to: Point): Point | null {
  for (const { a, b, main } of pieces.near(from, to, 0)) {
    const hit = main ? crossing(from, to, a, b) : null;
    if (hit) return [a[0] + (b[0] - a[0]) * hit.u, a[1] + (b[1] - a[1]) * hit.u];
  }
  return null;
}

function runsBeside(pieces: SegmentGrid<Piece>, at: Point, heading: number, clear: number) {
  for (const piece of pieces.near(at, at, clear)) {
    if (Math.abs(Math.sin(piece.heading - heading)) > 0.64) continue;
    const middle: Point = [(piece.a[0] + piece.b[0]) / 2, (piece.a[1] + piece.b[1]) / 2];
    if (gap(middle, at) < clear) return true;
  }
  return false;
}

function remember(pieces: SegmentGrid<Piece>, line: Line, main: boolean) {
  for (let i = 1; i < line.length; i++) {
    const a = line[i - 1]!;
    const b = line[i]!;
    pieces.add(a, b, { a, b, heading: Math.atan2(b[1] - a[1], b[0] - a[0]), main });
  }
}
