import type { ReadyDay, ReadyStop } from './compileDay.ts';
import {
  exploreFills,
  type FillSearch,
  leastToHome,
  type Settled,
  walkAt,
} from './exploreFills.ts';
import { finishRun, isMealDue, isMealPast, type RunEnd } from './finishRun.ts';
import { stepRun } from './stepRun.ts';
import type { RefillPlace, TankKind } from './types.ts';
import type { WalkState } from './walkState.ts';

/** Steps one run may take before the best found so far is kept: a bound on work, the same everywhere. */
const mostSteps = 20_000;
/** Fewer for the search, which asks for a bound and asks often. */
const mostBoundedSteps = 2_000;

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
  // What neither meal nor refill mends only grows when they are put in.
  if (bound && bare.hard - bare.mendable > bound.hard) return null;
  const mayEat =
    from.van.meal !== null && from.mealStopId === null && !isMealPast(from) && !hasMeal(fixed);
  // Refills only lengthen a run: a meal due without them is due with them.
  const mustEat = mayEat && isMealDue(from.van, bare.finishSeconds);
  const places = usefulPlaces(day, from);
  const need = places.length > 0 ? fewestRefills(from, fixed) : 0;
  if (bound && bound.hard === 0 && isTooLong(day, from, bare, mustEat, places, need)) return null;
  const limit = bound ?? { hard: bare.hard, cost: bare.cost };
  const toHome = leastToHome(day, from, fixed, places, bare.finishSeconds);
  for (let refills = need; refills <= need + 2; refills += 1) {
    const search: FillSearch = {
      day,
      fixed,
      meal: readyMeal(from),
      mayEat,
      mustEat,
      latestMeal: from.van.meal?.latestStartSeconds ?? 0,
      places,
      toHome,
      mostRefills: refills,
      steps: bound ? mostBoundedSteps : mostSteps,
      hard: limit.hard,
      cost: limit.cost,
      chosen: [],
      found: null,
      end: { finishSeconds: 0, overtimeSeconds: 0, cost: 0 },
    };
    exploreFills(search, 1, 0, from, null, false, 0);
    const found = search.found;
    if (found && (found.hard === 0 || refills === need + 2)) return found;
    if (places.length === 0) return found ?? (bound ? null : bare);
  }
  return bound ? null : bare;
}

function beats(one: SettleBound, other: SettleBound): boolean {
  return one.hard < other.hard || (one.hard === other.hard && one.cost < other.cost);
}

/** True when even with all waiting used for meal and refills the van would be home too late. */
function isTooLong(
  day: ReadyDay,
  from: WalkState,
  bare: Settled,
  mustEat: boolean,
  places: ReadyStop[],
  need: number,
): boolean {
  // With traffic by the hour a later leg may be shorter: then nothing is known beforehand.
  if (day.bands.length > 1) return false;
  const { van } = from;
  let shortest = Infinity;
  for (const place of places) shortest = Math.min(shortest, place.lengthSeconds);
  const pauses = (mustEat ? van.meal!.lengthSeconds : 0) + (need > 0 ? need * shortest : 0);
  const home = bare.finishSeconds + pauses - bare.waitSeconds;
  return home > van.endSeconds + van.mostOvertimeSeconds;
}

/** Walks stops as they stand. */
export function walkAll(day: ReadyDay, from: WalkState, stops: ReadyStop[]): Settled {
  const state = walkAt(0, from);
  for (let i = 0; i < stops.length; i += 1) stepRun(day, state, stops[i]!, stops[i + 1] ?? null);
  const end: RunEnd = { finishSeconds: 0, overtimeSeconds: 0, cost: 0 };
  finishRun(day, state, end);
  return {
    stops,
    cost: end.cost,
    hard: state.hard,
    mendable: state.mendable,
    finishSeconds: end.finishSeconds,
    waitSeconds: state.waitSeconds,
  };
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

/** The fewest refills that keep every tank in bounds when time does not matter. */
function fewestRefills(from: WalkState, fixed: ReadyStop[]): number {
  const tanks = from.van.tanks;
  const used = [...from.tanks];
  let count = 0;
  for (let s = 0; s < fixed.length; s += 1) {
    const stop = fixed[s]!;
    let over = false;
    for (let i = 0; i < tanks.length; i += 1) {
      const tank = tanks[i]!;
      if (stop.place?.kinds.includes(tank.kind)) used[i] = 0;
      const ml = usedBy(stop, tank.kind);
      if (ml > 0 && used[i]! > 0 && used[i]! + ml > tank.capacityMl) over = true;
    }
    if (over) {
      // One call fills and empties everything at best; the caller tries one or two more.
      count += 1;
      used.fill(0);
    }
    for (let i = 0; i < tanks.length; i += 1) used[i] = used[i]! + usedBy(stop, tanks[i]!.kind);
  }
  return count;
}

function usedBy(stop: ReadyStop, kind: TankKind): number {
  const uses = stop.visit?.fact.tankUse;
  let ml = 0;
  if (uses) for (let u = 0; u < uses.length; u += 1) if (uses[u]!.kind === kind) ml += uses[u]!.ml;
  return ml;
}

function usefulPlaces(day: ReadyDay, from: WalkState): ReadyStop[] {
  return day.problem.refills
    .filter((place) => from.van.tanks.some((tank) => place.kinds.includes(tank.kind)))
    .sort((a, b) => (a.id < b.id ? -1 : 1))
    .map(readyRefill);
}

function hasMeal(stops: ReadyStop[]): boolean {
  return stops.some((stop) => stop.kind === 'meal');
}
