import type { ReadyDay, ReadyStop } from './compileDay.ts';
import { finishRun, isMealDue, isMealPast, type RunEnd } from './finishRun.ts';
import { stepRun } from './stepRun.ts';
import type { RefillPlace, TankKind } from './types.ts';
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
    const search: Search = {
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
    explore(search, 1, 0, from, null, false, 0);
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

/** One search for the best places; functions below share it, because closures would be made anew each time. */
interface Search {
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
function explore(
  search: Search,
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
    explore(search, depth, at, state, search.meal, true, refills);
    chosen.pop();
  }
  if (refills < search.mostRefills)
    for (let i = 0; i < places.length; i += 1) {
      const place = places[i]!;
      if (!isUseful(state, place)) continue;
      const next = take(search, depth, state, held, place, fixed[at] ?? null);
      if (!mayWin(search, next, eaten, at)) continue;
      chosen.push(place);
      explore(search, depth + 1, at, next, null, eaten, refills + 1);
      chosen.pop();
    }
  if (at < fixed.length) {
    const stop = fixed[at]!;
    // A fixed meal is held too, so that what is put after it is seen.
    const next = take(search, depth, state, held, stop, fixed[at + 1] ?? null);
    if (!mayWin(search, next, eaten, at)) return;
    chosen.push(stop);
    explore(search, depth + 1, at + 1, next, stop.kind === 'meal' ? stop : null, eaten, refills);
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

function walkAt(depth: number, from: WalkState): WalkState {
  while (pool.length <= depth) pool.push(startWalk(from.van, from.vanIndex));
  const state = pool[depth]!;
  copyWalk(from, state);
  return state;
}

function take(
  search: Search,
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

function mayWin(search: Search, next: WalkState, eaten: boolean, at: number): boolean {
  const tooLate = search.mustEat && !eaten && next.freeSeconds > search.latestMeal;
  const hard = next.hard + (tooLate ? 1 : 0);
  if (hard !== search.hard) return hard < search.hard;
  return costSoFar(search.day, next) + search.toHome[at]! < search.cost;
}

/**
 * What is still to come at least once `fixed[i]` is reached: every leg after it, cut short where a
 * refill place makes a shorter way, and the overtime of the run without meal and refills.
 */
function leastToHome(
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

function isUseful(state: WalkState, place: ReadyStop): boolean {
  const tanks = state.van.tanks;
  for (let i = 0; i < tanks.length; i += 1)
    if (state.tanks[i]! > 0 && place.place!.kinds.includes(tanks[i]!.kind)) return true;
  return false;
}

function hasMeal(stops: ReadyStop[]): boolean {
  return stops.some((stop) => stop.kind === 'meal');
}
