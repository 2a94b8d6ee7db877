import type { ReadyDay, ReadyStop } from '#shared/schedule/compileDay.ts';
import { settleStops, walkAll } from '#shared/schedule/settleStops.ts';
import { stepRun } from '#shared/schedule/stepRun.ts';
import { cloneWalk, type WalkState } from '#shared/schedule/walkState.ts';

/** A van's run in the search: never changed, only replaced, so that going back costs nothing. */
export interface SearchRun {
  vanIndex: number;
  /** The walk after the started stops. */
  from: WalkState;
  /** Hard rules no order can mend (pinned stops, errands): the run may break this many. */
  floorHard: number;
  /** Stops ahead, settled meals and refills included. */
  stops: readonly ReadyStop[];
  cost: number;
  /** Unlike any other run's. */
  version: number;
  frames: Frames | null;
}

/** Forward states and backward slack of a run, made when an insertion is first tried. */
export interface Frames {
  /** `states[i]` is the walk before `stops[i]`; the last one is before driving home. */
  states: WalkState[];
  /** Where the van goes after place i: the next stop with a point of its own, or home. */
  nextPoint: Int32Array;
  /** Arrival at `stops[i]` (home at the end) and how much later it may be without breaking a rule. */
  arrive: Float64Array;
  slack: Float64Array;
}

let versions = 0;

/** A run of stops whose cost is known. */
export function makeRun(
  like: Pick<SearchRun, 'vanIndex' | 'from' | 'floorHard'>,
  stops: readonly ReadyStop[],
  cost: number,
): SearchRun {
  versions += 1;
  return {
    vanIndex: like.vanIndex,
    from: like.from,
    floorHard: like.floorHard,
    stops,
    cost,
    version: versions,
    frames: null,
  };
}

/**
 * The run with other visits in it: meals and refills settled. Null when it breaks a hard rule or
 * costs `below` or more.
 */
export function rebuildRun(
  day: ReadyDay,
  like: SearchRun,
  fixed: ReadyStop[],
  below = Infinity,
): SearchRun | null {
  const settled = settleStops(day, like.from, fixed, { hard: like.floorHard, cost: below });
  return settled && makeRun(like, settled.stops, settled.cost);
}

/** The run without some visits, meals and refills left where they are; settled anew if that breaks a rule. */
export function thinRun(
  day: ReadyDay,
  run: SearchRun,
  keeps: (stop: ReadyStop) => boolean,
): SearchRun | null {
  const stops = run.stops.filter(keeps);
  if (!stops.some((stop) => !isLoose(stop))) return rebuildRun(day, run, []);
  const walked = walkAll(day, run.from, stops);
  if (walked.hard <= run.floorHard) return makeRun(run, stops, walked.cost);
  return rebuildRun(
    day,
    run,
    stops.filter((stop) => !isLoose(stop)),
  );
}

/** What the run would cost at least: without meal and refills. Infinite when a rule breaks that they cannot mend. */
export function bareCost(day: ReadyDay, like: SearchRun, fixed: ReadyStop[]): number {
  const bare = walkAll(day, like.from, fixed);
  return bare.hard - bare.mendable > like.floorHard ? Infinity : bare.cost;
}

/** The same visits with meals and refills put back at least cost; the run itself when it is best. */
export function resettle(day: ReadyDay, run: SearchRun): SearchRun {
  if (!run.stops.some(isLoose)) return run;
  const settled = settleStops(day, run.from, fixedStops(run), {
    hard: run.floorHard,
    cost: run.cost,
  });
  return settled ? makeRun(run, settled.stops, settled.cost) : run;
}

/** The stops that settling leaves alone. */
export function fixedStops(run: SearchRun): ReadyStop[] {
  return run.stops.filter((stop) => !isLoose(stop));
}

/** A meal or refill that settling put in. */
export function isLoose(stop: ReadyStop): boolean {
  return !stop.pinned && (stop.kind === 'meal' || stop.kind === 'refill');
}

/** A visit the search may move. */
export function isMovable(stop: ReadyStop): boolean {
  return stop.kind === 'visit' && !stop.pinned;
}

/** The least hard rules a van's run breaks with only what cannot be moved. */
export function hardOf(day: ReadyDay, from: WalkState, stops: ReadyStop[]): number {
  return walkAll(day, from, stops).hard;
}

/** The run's forward states and backward slack. */
export function framesOf(day: ReadyDay, run: SearchRun): Frames {
  if (run.frames) return run.frames;
  const { stops, from } = run;
  const n = stops.length;
  const van = from.van;
  const states: WalkState[] = [from];
  const arrive = new Float64Array(n + 1);
  const waits = new Float64Array(n + 1);
  const give = new Float64Array(n + 1);
  for (let i = 0; i < n; i += 1) {
    const stop = stops[i]!;
    const before = states[i]!;
    const state = cloneWalk(before);
    stepRun(day, state, stop, stops[i + 1] ?? null);
    arrive[i] = state.leg.departSeconds + state.leg.driveSeconds;
    waits[i] = state.waitSeconds - before.waitSeconds;
    give[i] = mayGive(state, stop, arrive[i]! + waits[i]!);
    states.push(state);
  }
  const nextPoint = new Int32Array(n + 1);
  nextPoint[n] = van.endPoint;
  for (let i = n - 1; i >= 0; i -= 1) {
    const point = stops[i]!.point;
    nextPoint[i] = point >= 0 ? point : nextPoint[i + 1]!;
  }
  const slack = new Float64Array(n + 1);
  const last = states[n]!;
  const home = day.base[last.point * day.pointCount + van.endPoint]!;
  arrive[n] = last.freeSeconds + home;
  // With traffic by the hour a later start may drive faster, so nothing is ruled out beforehand.
  const exact = day.bands.length === 1 && day.bands[0]!.permille === 1000;
  slack[n] = exact
    ? van.endSeconds + van.mostOvertimeSeconds - arrive[n]! - van.washDownSeconds
    : Infinity;
  if (run.floorHard > 0 || slack[n]! < 0) slack[n] = Infinity;
  for (let i = n - 1; i >= 0; i -= 1) slack[i] = waits[i]! + Math.min(give[i]!, slack[i + 1]!);
  run.frames = { states, nextPoint, arrive, slack };
  return run.frames;
}

/** How much later than `begin` a stop may begin. */
function mayGive(state: WalkState, stop: ReadyStop, begin: number): number {
  if (stop.visit) {
    let latest = stop.visit.windows.length === 0 ? Infinity : -Infinity;
    const stay = state.freeSeconds - begin;
    for (const window of stop.visit.windows) {
      const end = window.binds === 'stay' ? window.endSeconds - stay : window.endSeconds;
      if (end > latest) latest = end;
    }
    return latest < begin ? Infinity : latest - begin;
  }
  if (stop.place) return Math.max(0, stop.place.closesSeconds - state.freeSeconds);
  return Infinity;
}
