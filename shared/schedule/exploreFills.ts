import type { ReadyDay, ReadyStop } from './compileDay.ts';
import { finishRun, type RunEnd } from './finishRun.ts';
import { stepRun } from './stepRun.ts';
import { copyWalk, startWalk, type WalkState } from './walkState.ts';

/** A settled run: its stops after the started ones, what they cost and how many hard rules they break. */
export interface Settled {
  stops: ReadyStop[];
  cost: number;
  hard: number;
  /** Hard rules broken that a meal or refill could mend. */
  mendable: number;
  finishSeconds: number;
  waitSeconds: number;
}

/** One search for the best places; functions below share it, because closures would be made anew each time. */
export interface FillSearch {
  day: ReadyDay;
  fixed: ReadyStop[];
  meal: ReadyStop;
  mayEat: boolean;
  mustEat: boolean;
  latestMeal: number;
  places: ReadyStop[];
  /** By index in `fixed`: the least that driving home from there, and overtime, still cost. */
  toHome: Float64Array;
  mostRefills: number;
  steps: number;
  /** To be beaten. */
  hard: number;
  cost: number;
  chosen: ReadyStop[];
  found: Settled | null;
  end: RunEnd;
}

/**
 * Depth-first over every gap: a meal, a refill, or on to the next stop; cut where it cannot win.
 * `held` is a meal chosen but not walked: where it is eaten depends on what comes after it.
 */
export function exploreFills(
  search: FillSearch,
  depth: number,
  at: number,
  state: WalkState,
  held: ReadyStop | null,
  eaten: boolean,
  refills: number,
): void {
  if (search.steps <= 0) return;
  const { fixed, chosen, places } = search;
  if (search.mayEat && !eaten && held === null && state.freeSeconds <= search.latestMeal) {
    chosen.push(search.meal);
    exploreFills(search, depth, at, state, search.meal, true, refills);
    chosen.pop();
  }
  if (refills < search.mostRefills)
    for (let i = 0; i < places.length; i += 1) {
      const place = places[i]!;
      if (!isUseful(state, place)) continue;
      const next = take(search, depth, state, held, place, fixed[at] ?? null);
      if (!mayWin(search, next, eaten, at)) continue;
      chosen.push(place);
      exploreFills(search, depth + 1, at, next, null, eaten, refills + 1);
      chosen.pop();
    }
  if (at < fixed.length) {
    const stop = fixed[at]!;
    // A fixed meal is held too, so that what is put after it is seen.
    const next = take(search, depth, state, held, stop, fixed[at + 1] ?? null);
    if (!mayWin(search, next, eaten, at)) return;
    chosen.push(stop);
    exploreFills(
      search,
      depth + 1,
      at + 1,
      next,
      stop.kind === 'meal' ? stop : null,
      eaten,
      refills,
    );
    chosen.pop();
    return;
  }
  const last = take(search, depth, state, held, null, null);
  finishRun(search.day, last, search.end);
  const { cost, finishSeconds } = search.end;
  if (last.hard > search.hard || (last.hard === search.hard && cost >= search.cost)) return;
  search.hard = last.hard;
  search.cost = cost;
  search.found = {
    stops: [...chosen],
    cost,
    hard: last.hard,
    mendable: last.mendable,
    finishSeconds,
    waitSeconds: last.waitSeconds,
  };
}

/** States by depth, used again and again: settling is most of the search's work. */
const pool: WalkState[] = [];

/** A pooled state made like `from`. Depth 0 is for whole walks, 1 and on for `exploreFills`. */
export function walkAt(depth: number, from: WalkState): WalkState {
  while (pool.length <= depth) pool.push(startWalk(from.van, from.vanIndex));
  const state = pool[depth]!;
  copyWalk(from, state);
  return state;
}

function take(
  search: FillSearch,
  depth: number,
  state: WalkState,
  held: ReadyStop | null,
  stop: ReadyStop | null,
  after: ReadyStop | null,
): WalkState {
  const next = walkAt(depth, state);
  search.steps -= 1;
  if (held) stepRun(search.day, next, held, stop);
  if (stop && stop.kind !== 'meal') stepRun(search.day, next, stop, after);
  return next;
}

function mayWin(search: FillSearch, next: WalkState, eaten: boolean, at: number): boolean {
  const tooLate = search.mustEat && !eaten && next.freeSeconds > search.latestMeal;
  const hard = next.hard + (tooLate ? 1 : 0);
  if (hard !== search.hard) return hard < search.hard;
  return costSoFar(search.day, next) + search.toHome[at]! < search.cost;
}

/**
 * What is still to come at least once `fixed[i]` is reached: every leg after it, cut short where a
 * refill place makes a shorter way, and the overtime of the run without meal and refills.
 */
export function leastToHome(
  day: ReadyDay,
  from: WalkState,
  fixed: ReadyStop[],
  places: ReadyStop[],
  bareFinish: number,
): Float64Array {
  const n = fixed.length;
  const overtime = bareFinish - from.van.endSeconds;
  const least = new Float64Array(n + 1);
  least[n] = overtime > 0 ? overtime * day.problem.weights.overtimeFactor : 0;
  let point = from.van.endPoint;
  let site: string | null = null;
  for (let i = n - 1; i >= 0; i -= 1) {
    const stop = fixed[i]!;
    const ownSite = stop.visit?.fact.siteId ?? null;
    let leg = 0;
    if (stop.point >= 0) {
      if (ownSite === null || ownSite !== site) {
        leg = day.base[stop.point * day.pointCount + point]!;
        for (let p = 0; p < places.length; p += 1) {
          const place = places[p]!.point;
          const way =
            day.base[stop.point * day.pointCount + place]! +
            day.base[place * day.pointCount + point]!;
          if (way < leg) leg = way;
        }
      }
      point = stop.point;
      site = ownSite;
    }
    least[i] = least[i + 1]! + Math.floor((leg * day.leastPermille) / 1000);
  }
  return least;
}

function costSoFar(day: ReadyDay, state: WalkState): number {
  const weights = day.problem.weights;
  return (
    state.driveSeconds +
    weights.lateFactor * state.lateSeconds +
    Math.floor((weights.waitFactorPermille * state.waitSeconds + 500) / 1000) +
    weights.otherGroomerSeconds * state.otherGroomers +
    weights.disturbSeconds * state.disturbed
  );
}

function isUseful(state: WalkState, place: ReadyStop): boolean {
  const tanks = state.van.tanks;
  for (let i = 0; i < tanks.length; i += 1)
    if (state.tanks[i]! > 0 && place.place!.kinds.includes(tanks[i]!.kind)) return true;
  return false;
}
