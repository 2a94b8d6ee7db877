import type { ReadyStop } from '#shared/schedule/compileDay.ts';
import { missesAnew } from './insertion.ts';
import { bareCost, fixedStops, isMovable, rebuildRun, type SearchRun } from './searchRun.ts';
import { replaceRun, type SearchState } from './searchState.ts';

/**
 * One thrown change of the runs as they are: tails of two runs swapped, a piece turned round or
 * moved, two visits or two whole runs exchanged. False when it would break a hard rule, bring the day
 * to `below` or more, or there is nothing to change; then nothing has.
 */
export function localMove(state: SearchState, below: number): boolean {
  const { dice, near, vanOf } = state;
  const one = dice.below(near.length);
  const van = vanOf[one]!;
  if (van < 0) return false;
  const close = near[one]!;
  const other = close[dice.below(Math.min(close.length, 12))]!;
  const otherVan = vanOf[other]!;
  const thrown = dice.below(10);
  if (thrown === 0) return swapWholes(state, below, van, dice.below(state.runs.length));
  if (otherVan < 0 || one === other) return false;
  if (van === otherVan)
    return thrown < 6
      ? reverse(state, below, van, one, other)
      : movePiece(state, below, one, other);
  if (thrown < 4) return swapTails(state, below, one, other);
  return thrown < 7 ? movePiece(state, below, one, other) : swapVisits(state, below, one, other);
}

function reverse(
  state: SearchState,
  below: number,
  van: number,
  one: number,
  other: number,
): boolean {
  const stops = fixedStops(state.runs[van]!);
  const [from, to] = [placeOf(stops, one), placeOf(stops, other)].sort((a, b) => a - b);
  const piece = stops.slice(from!, to! + 1);
  if (!piece.every(isMovable)) return false;
  return accept(state, below, [[van, stops.toSpliced(from!, piece.length, ...piece.reverse())]]);
}

function swapTails(state: SearchState, below: number, one: number, other: number): boolean {
  const van = state.vanOf[one]!;
  const otherVan = state.vanOf[other]!;
  const stops = fixedStops(state.runs[van]!);
  const others = fixedStops(state.runs[otherVan]!);
  // After the swap `other` follows `one`, its neighbour.
  const cut = placeOf(stops, one) + 1;
  const otherCut = placeOf(others, other);
  const tail = stops.slice(cut);
  const otherTail = others.slice(otherCut);
  if (!tail.every(isMovable) || !otherTail.every(isMovable)) return false;
  return accept(state, below, [
    [van, [...stops.slice(0, cut), ...otherTail]],
    [otherVan, [...others.slice(0, otherCut), ...tail]],
  ]);
}

/** One to three visits from `one` on go to before or after `other`, turned round now and then. */
function movePiece(state: SearchState, below: number, one: number, other: number): boolean {
  const { dice } = state;
  const van = state.vanOf[one]!;
  const otherVan = state.vanOf[other]!;
  const stops = fixedStops(state.runs[van]!);
  const from = placeOf(stops, one);
  const piece = stops.slice(from, from + 1 + dice.below(3));
  if (!piece.every(isMovable) || piece.some((stop) => stop.visit!.index === other)) return false;
  const rest = stops.toSpliced(from, piece.length);
  const target = van === otherVan ? rest : fixedStops(state.runs[otherVan]!);
  const at = placeOf(target, other) + dice.below(2);
  if (dice.chance(0.3)) piece.reverse();
  const filled = target.toSpliced(at, 0, ...piece);
  return accept(
    state,
    below,
    van === otherVan
      ? [[van, filled]]
      : [
          [van, rest],
          [otherVan, filled],
        ],
  );
}

function swapVisits(state: SearchState, below: number, one: number, other: number): boolean {
  const van = state.vanOf[one]!;
  const otherVan = state.vanOf[other]!;
  const put = (stops: ReadyStop[], old: number, now: number) =>
    stops.map((stop) => (stop.visit?.index === old ? state.stopOf[now]! : stop));
  return accept(state, below, [
    [van, put(fixedStops(state.runs[van]!), one, other)],
    [otherVan, put(fixedStops(state.runs[otherVan]!), other, one)],
  ]);
}

function swapWholes(state: SearchState, below: number, van: number, otherVan: number): boolean {
  if (van === otherVan) return false;
  const stops = fixedStops(state.runs[van]!);
  const others = fixedStops(state.runs[otherVan]!);
  if (!stops.every(isMovable) || !others.every(isMovable)) return false;
  return accept(state, below, [
    [van, others],
    [otherVan, stops],
  ]);
}

function accept(state: SearchState, below: number, changes: [number, ReadyStop[]][]): boolean {
  const { day } = state.trial;
  let before = 0;
  let floor = 0;
  const floors: number[] = [];
  for (const [van, stops] of changes) {
    if (stops.some((stop) => stop.visit && stop.visit.staticBroken[van]! > 0 && !stop.pinned))
      return false;
    before += state.runs[van]!.cost;
    const bare = bareCost(day, state.runs[van]!, stops);
    floors.push(bare);
    floor += bare;
  }
  // Meal and refills are settled only where the move could win without them.
  let room = below - (state.cost - before);
  if (floor >= room) return false;
  const rebuilt: SearchRun[] = [];
  for (const [i, [van, stops]] of changes.entries()) {
    floor -= floors[i]!;
    const run = rebuildRun(day, state.runs[van]!, stops, room - floor);
    if (!run || missesAnew(state.trial, run, run.stops)) return false;
    room -= run.cost;
    rebuilt.push(run);
  }
  for (const run of rebuilt) replaceRun(state, run);
  return true;
}

function placeOf(stops: ReadyStop[], visit: number): number {
  return stops.findIndex((stop) => stop.visit?.index === visit);
}
