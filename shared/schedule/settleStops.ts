import type { ReadyDay, ReadyStop } from './compileDay.ts';
import { finishRun, type RunEnd } from './finishRun.ts';
import { stepRun } from './stepRun.ts';
import type { RefillPlace } from './types.ts';
import { cloneWalk, type WalkState } from './walkState.ts';

/** A settled run: its stops after the started ones, what they cost and how many hard rules they break. */
export interface Settled {
  stops: ReadyStop[];
  cost: number;
  hard: number;
  /** Hard rules broken that a meal or refill could mend. */
  mendable: number;
}

/** Steps a single run may take before the best found so far is kept; a bound, not a time. */
const mostSteps = 20_000;

/** Nothing worse than this is of interest: the search's way to stop early. */
export interface SettleBound {
  hard: number;
  cost: number;
}

/**
 * Puts a meal and refills between `fixed` stops at least cost: fewest hard rules broken, then
 * cost, then the earlier place in the run, then place order by id. Nothing is put where nothing is
 * needed. `from` is the walk after the started stops. With a `bound`, null when nothing beats it.
 * Deterministic.
 */
export function settleStops(day: ReadyDay, from: WalkState, fixed: ReadyStop[]): Settled;
export function settleStops(
  day: ReadyDay,
  from: WalkState,
  fixed: ReadyStop[],
  bound: SettleBound,
): Settled | null;
export function settleStops(
  day: ReadyDay,
  from: WalkState,
  fixed: ReadyStop[],
  bound?: SettleBound,
): Settled | null {
  const bare = walkAll(day, from, fixed);
  if (bare.mendable === 0) return bound && !beats(bare, bound) ? null : bare;
  const mayEat = from.van.meal !== null && from.mealStopId === null && !hasMeal(fixed);
  const places = usefulPlaces(day, from);
  const need = places.length > 0 ? fewestRefills(day, from, fixed) : 0;
  const limit = bound ?? { hard: bare.hard, cost: bare.cost };
  for (let refills = need; refills <= need + 2; refills += 1) {
    const found = search(day, from, fixed, mayEat, places, refills, limit);
    if (found && (found.hard === 0 || refills === need + 2)) return found;
    if (places.length === 0) return found ?? (bound ? null : bare);
  }
  return bound ? null : bare;
}

function beats(one: SettleBound, other: SettleBound): boolean {
  return one.hard < other.hard || (one.hard === other.hard && one.cost < other.cost);
}

/** Walks stops as they stand. */
export function walkAll(day: ReadyDay, from: WalkState, stops: ReadyStop[]): Settled {
  const state = cloneWalk(from);
  for (let i = 0; i < stops.length; i += 1) stepRun(day, state, stops[i]!, stops[i + 1] ?? null);
  const end: RunEnd = { finishSeconds: 0, overtimeSeconds: 0, cost: 0 };
  finishRun(day, state, end);
  return { stops, cost: end.cost, hard: state.hard, mendable: state.mendable };
}

/** A meal for a van; its id is one per van, because a run has one. */
export function readyMeal(from: WalkState): ReadyStop {
  return {
    id: `meal:${from.van.vanId}`,
    kind: 'meal',
    point: -1,
    lengthSeconds: from.van.meal?.lengthSeconds ?? 0,
    visit: null,
    place: null,
    pinned: false,
    fact: null,
  };
}

function readyRefill(place: RefillPlace): ReadyStop {
  return {
    id: `refill:${place.id}`,
    kind: 'refill',
    point: place.point,
    lengthSeconds: place.lengthSeconds,
    visit: null,
    place,
    pinned: false,
    fact: null,
  };
}

/** Depth-first over every gap: a meal, a refill, or on to the next stop; cut where it cannot win. */
function search(
  day: ReadyDay,
  from: WalkState,
  fixed: ReadyStop[],
  mayEat: boolean,
  places: ReadyStop[],
  mostRefills: number,
  limit: SettleBound,
): Settled | null {
  let best = limit;
  let found: Settled | null = null;
  let steps = 0;
  const end: RunEnd = { finishSeconds: 0, overtimeSeconds: 0, cost: 0 };
  const meal = readyMeal(from);
  const chosen: ReadyStop[] = [];
  const weights = day.problem.weights;

  const costSoFar = (state: WalkState) =>
    state.driveSeconds +
    weights.lateFactor * state.lateSeconds +
    Math.floor((weights.waitFactorPermille * state.waitSeconds + 500) / 1000) +
    weights.otherGroomerSeconds * state.otherGroomers +
    weights.disturbSeconds * state.disturbed;

  /** `held` is a meal chosen but not walked: where it is eaten depends on what comes after it. */
  const visit = (
    at: number,
    state: WalkState,
    held: ReadyStop | null,
    eaten: boolean,
    refills: number,
  ) => {
    if (steps >= mostSteps) return;
    const take = (stop: ReadyStop | null): WalkState => {
      const next = cloneWalk(state);
      steps += 1;
      if (held) stepRun(day, next, held, stop);
      if (stop && stop.kind !== 'meal') stepRun(day, next, stop, fixed[at + 1] ?? null);
      return next;
    };
    const wins = (next: WalkState) =>
      next.hard < best.hard || (next.hard === best.hard && costSoFar(next) < best.cost);
    if (mayEat && !eaten && held === null) {
      chosen.push(meal);
      visit(at, state, meal, true, refills);
      chosen.pop();
    }
    if (refills < mostRefills)
      for (const place of places) {
        if (!isUseful(state, place)) continue;
        const next = take(place);
        if (!wins(next)) continue;
        chosen.push(place);
        visit(at, next, null, eaten, refills + 1);
        chosen.pop();
      }
    if (at < fixed.length) {
      const stop = fixed[at]!;
      // A fixed meal is held too, so that what is put after it is seen.
      const next = take(stop);
      if (!wins(next)) return;
      chosen.push(stop);
      visit(at + 1, next, stop.kind === 'meal' ? stop : null, eaten, refills);
      chosen.pop();
      return;
    }
    const last = take(null);
    finishRun(day, last, end);
    if (last.hard < best.hard || (last.hard === best.hard && end.cost < best.cost)) {
      found = { stops: [...chosen], cost: end.cost, hard: last.hard, mendable: last.mendable };
      best = found;
    }
  };
  visit(0, from, null, false, 0);
  return found;
}

/** The fewest refills that keep every tank in bounds when time does not matter. */
function fewestRefills(day: ReadyDay, from: WalkState, fixed: ReadyStop[]): number {
  const tanks = from.van.tanks;
  const used = [...from.tanks];
  let count = 0;
  for (const stop of fixed) {
    if (stop.place)
      tanks.forEach((tank, i) => {
        if (stop.place!.kinds.includes(tank.kind)) used[i] = 0;
      });
    const uses = stop.visit?.fact.tankUse ?? [];
    const over = tanks.some((tank, i) => {
      const ml = uses.reduce((sum, use) => sum + (use.kind === tank.kind ? use.ml : 0), 0);
      return ml > 0 && used[i]! + ml > tank.capacityMl && used[i]! > 0;
    });
    if (over) {
      count += 1;
      // One call at a place is counted even if two are needed; the search tries one more.
      used.fill(0);
    }
    for (const use of uses)
      tanks.forEach((tank, i) => {
        if (tank.kind === use.kind) used[i] = used[i]! + use.ml;
      });
  }
  return Math.min(count, day.problem.refills.length * fixed.length);
}

function usefulPlaces(day: ReadyDay, from: WalkState): ReadyStop[] {
  return day.problem.refills
    .filter((place) => from.van.tanks.some((tank) => place.kinds.includes(tank.kind)))
    .sort((a, b) => (a.id < b.id ? -1 : 1))
    .map(readyRefill);
}

function isUseful(state: WalkState, place: ReadyStop): boolean {
  const tanks = state.van.tanks;
  for (let i = 0; i < tanks.length; i += 1)
    if (state.tanks[i]! > 0 && place.place!.kinds.includes(tanks[i]!.kind)) return true;
  return false;
}

function hasMeal(stops: ReadyStop[]): boolean {
  return stops.some((stop) => stop.kind === 'meal');
}
