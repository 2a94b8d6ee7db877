import {
  blend,
  crossing,
  gap,
  type Line,
  nearestOnSegment,
  type Point,
  SegmentGrid,
} from './plane.ts';
import type { Road } from './Road.ts';

/** A place on the map with a number of its own; roads meet where they share one. */
export interface Spot {
  id: number;
  at: Point;
}

/** A road whose line has become numbered spots, shared with the roads it meets. */
export interface JoinedRoad extends Omit<Road, 'line'> {
  spots: Spot[];
}

/** Spots nearer than this are one. */
const MERGE = 7;
/** Line detail below this is dropped. */
const TOLERANCE = 1.2;

interface Piece {
  road: number;
  index: number;
  a: Point;
  b: Point;
}

/**
 * Makes one network of loose lines: every crossing becomes a spot both roads share, ends that nearly
 * reach another road are led to it, and stubs past the last crossing are cut off. Crossings with
 * `banks` become spots too, so that a bridge can begin and end at the water.
 */
export function joinRoads(
  roads: readonly Road[],
  reachOf: (road: Road) => number,
  banks: readonly Line[],
): JoinedRoad[] {
  const lines = roads.map((road) => road.line);
  const led = lines.map((line, i) => leadEnds(line, i, lines, reachOf(roads[i]!)));
  const cuts = findCuts([...led, ...banks.map((ring) => [...ring, ring[0]!])]);
  const spots = new SpotBook();
  const joined = led.map((line, i) => {
    const here = (cuts[i] ?? []).sort((a, b) => a.along - b.along);
    for (const cut of here) spots.meet(cut.at);
    return { line, here };
  });
  return roads.flatMap((road, i) => {
    const { line, here } = joined[i]!;
    const { line: _, ...rest } = road;
    const chain = chainOf(line, here, spots);
    return chain.length > 1 ? [{ ...rest, spots: chain }] : [];
  });
}

interface Cut {
  along: number;
  at: Point;
}

function leadEnds(line: Line, self: number, lines: readonly Line[], reach: number): Point[] {
  const out = [...line];
  const head = nearestRoad(out[0]!, self, lines, reach);
  if (head) out.unshift(head);
  const tail = nearestRoad(out.at(-1)!, self, lines, reach);
  if (tail) out.push(tail);
  return out;
}

/** A point just past the nearest other road, so that the led line truly crosses it. */
function nearestRoad(end: Point, self: number, lines: readonly Line[], reach: number) {
  let best: Point | null = null;
  let distance = reach;
  for (const [i, other] of lines.entries()) {
    if (i === self) continue;
    if (gap(other[0]!, end) > reach + 16_000) continue;
    for (let k = 1; k < other.length; k++) {
      const { at } = nearestOnSegment(end, other[k - 1]!, other[k]!);
      const d = gap(at, end);
      if (d < distance) {
        distance = d;
        best = d < 0.5 ? null : blend(end, at, 1 + 2 / d);
        if (d < 0.5) return null;
      }
    }
  }
  return best;
}

function findCuts(lines: readonly Line[]): Cut[][] {
  const grid = new SegmentGrid<Piece>(80);
  const cuts: Cut[][] = lines.map(() => []);
  lines.forEach((line, road) => {
    for (let index = 1; index < line.length; index++) {
      const a = line[index - 1]!;
      const b = line[index]!;
      for (const other of grid.near(a, b, 0)) {
        if (other.road === road) continue;
        const hit = crossing(a, b, other.a, other.b);
        if (!hit) continue;
        const at = blend(a, b, hit.t);
        cuts[road]!.push({ along: index - 1 + hit.t, at });
        cuts[other.road]!.push({ along: other.index - 1 + hit.u, at });
      }
      grid.add(a, b, { road, index, a, b });
    }
  });
  return cuts;
}

/** Gives out spots; crossings close together get one and the same. */
class SpotBook {
  #grid = new SegmentGrid<Spot>(20);
  #count = 0;

  meet(at: Point): Spot {
    for (const spot of this.#grid.near(at, at, MERGE)) if (gap(spot.at, at) < MERGE) return spot;
    const spot = this.alone(at);
    this.#grid.add(at, at, spot);
    return spot;
  }

  alone(at: Point): Spot {
    return { id: this.#count++, at };
  }
}

/** A stub shorter than this past the last crossing is a drawing slip, not a dead end. */
const SHORTEST_STUB = 45;

function chainOf(line: Line, cuts: readonly Cut[], book: SpotBook): Spot[] {
  const marks: { along: number; at: Point; spot?: Spot }[] = line.map((at, along) => ({
    along,
    at,
  }));
  for (const { along, at } of cuts) marks.push({ along, at, spot: book.meet(at) });
  marks.sort((a, b) => a.along - b.along);
  const first = marks.findIndex(({ spot }) => spot);
  const last = marks.findLastIndex(({ spot }) => spot);
  if (first < 0) return [];
  const lengthBetween = (from: number, to: number) => {
    let sum = 0;
    for (let i = from + 1; i <= to; i++) sum += gap(marks[i - 1]!.at, marks[i]!.at);
    return sum;
  };
  const start = lengthBetween(0, first) < SHORTEST_STUB ? first : 0;
  const end = lengthBetween(last, marks.length - 1) < SHORTEST_STUB ? last : marks.length - 1;
  const chain: Spot[] = [];
  let run: Point[] = [];
  const flush = (spot: Spot) => {
    const from = chain.at(-1);
    if (from?.id === spot.id) {
      run = [];
      return;
    }
    const shape = from ? simplify([from.at, ...run, spot.at]).slice(1, -1) : run;
    chain.push(...shape.map((at) => book.alone(at)), spot);
    run = [];
  };
  for (const { at, spot } of marks.slice(start, end + 1)) {
    if (spot) flush(spot);
    else run.push(at);
  }
  if (run.length > 0) flush(book.alone(run.pop()!));
  return chain;
}

/** Douglas–Peucker. */
function simplify(line: Point[]): Point[] {
  if (line.length < 3) return line;
  let worst = 0;
  let split = 0;
  for (let i = 1; i + 1 < line.length; i++) {
    const d = gap(nearestOnSegment(line[i]!, line[0]!, line.at(-1)!).at, line[i]!);
    if (d > worst) {
      worst = d;
      split = i;
    }
  }
  if (worst <= TOLERANCE) return [line[0]!, line.at(-1)!];
  return [...simplify(line.slice(0, split + 1)), ...simplify(line.slice(split)).slice(1)];
}
