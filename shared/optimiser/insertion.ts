import type { ReadyDay, ReadyStop, ReadyVisit } from '#shared/schedule/compileDay.ts';
import { finishRun, type RunEnd } from '#shared/schedule/finishRun.ts';
import { settleStops } from '#shared/schedule/settleStops.ts';
import { stepRun } from '#shared/schedule/stepRun.ts';
import { copyWalk, type WalkState } from '#shared/schedule/walkState.ts';
import { fixedStops, type Frames, framesOf, isLoose, type SearchRun } from './searchRun.ts';

/** The cheapest place for a visit in a run, and the next cheapest for a blink. */
export interface Insertion {
  delta: number;
  at: number;
  /** Stops when meal or refills had to be settled anew; null: just put it in. */
  stops: ReadyStop[] | null;
  secondDelta: number;
  secondAt: number;
  /** Places that want a meal or refill settled first, by the floor under what they add. */
  mend: MendPlace[];
  /** Settling at those places is known to find nothing below this. */
  mendTriedBelow: number;
}

interface MendPlace {
  at: number;
  floor: number;
}

/** What trying insertions needs besides the run. */
export interface Trial {
  day: ReadyDay;
  scratch: WalkState;
  end: RunEnd;
  /** Smallest permille of the bands: a floor under driving. */
  leastPermille: number;
  /** Van by visit in the plan the search was given, for windows the facts have already missed. */
  homeVan: Int32Array;
}

const mendTries = 2;
/** Where a trial stopped: at a rule only a meal or refill could mend. */
const onlyMendable = -1;

/**
 * The cheapest feasible place of `stop` in the run, costs exact. Places are ruled out in O(1) by
 * driving alone and by backward slack; what is left is walked from the place on, and no further than
 * it can still win.
 */
export function bestInsertion(trial: Trial, run: SearchRun, stop: ReadyStop): Insertion | null {
  const visit = stop.visit!;
  if (visit.staticBroken[run.vanIndex]! > 0) return null;
  const { day } = trial;
  const frames = framesOf(day, run);
  const flat = flatCost(day, run, visit);
  const found = nothingFound();
  const waitTotal = frames.states[run.stops.length]!.waitSeconds;
  for (let at = 0; at <= run.stops.length; at += 1) {
    const floor = flat + leastAdded(trial, run, frames, stop, at, waitTotal);
    if (floor >= found.secondDelta) continue;
    const delta = tryAt(trial, run, frames, stop, at, found.secondDelta);
    if (delta === onlyMendable) found.mend.push({ at, floor });
    else if (delta < found.delta) {
      found.secondDelta = found.delta;
      found.secondAt = found.at;
      found.delta = delta;
      found.at = at;
    } else if (delta < found.secondDelta) {
      found.secondDelta = delta;
      found.secondAt = at;
    }
  }
  found.mend.sort((a, b) => a.floor - b.floor);
  return found;
}

/**
 * Settles meal and refills anew at the likeliest places where only they stand in the way. Fills
 * `found` when that costs less than `below`.
 */
export function mendInsertion(
  trial: Trial,
  run: SearchRun,
  stop: ReadyStop,
  found: Insertion,
  below: number,
): void {
  if (found.at >= 0 || found.mend.length === 0 || below <= found.mendTriedBelow) return;
  if (found.mend[0]!.floor >= below) return;
  found.mendTriedBelow = below;
  found.delta = below;
  for (const { at } of found.mend.slice(0, mendTries)) settleAt(trial, run, stop, at, found);
  if (found.at < 0) found.delta = Infinity;
}

/** The visit put in anew, meal and refills settled, at every place: slow and thorough. */
export function settledInsertion(
  trial: Trial,
  run: SearchRun,
  stop: ReadyStop,
  below: number,
): Insertion | null {
  if (stop.visit!.staticBroken[run.vanIndex]! > 0) return null;
  const found = nothingFound();
  found.delta = below;
  for (let at = 0; at <= run.stops.length; at += 1) settleAt(trial, run, stop, at, found);
  return found.at < 0 ? null : found;
}

function nothingFound(): Insertion {
  return {
    delta: Infinity,
    at: -1,
    stops: null,
    secondDelta: Infinity,
    secondAt: -1,
    mend: [],
    mendTriedBelow: -Infinity,
  };
}

function settleAt(
  trial: Trial,
  run: SearchRun,
  stop: ReadyStop,
  at: number,
  found: Insertion,
): void {
  const fixed = fixedStops(run);
  let place = 0;
  for (let i = 0; i < at; i += 1) if (!isLoose(run.stops[i]!)) place += 1;
  const settled = settleStops(trial.day, run.from, fixed.toSpliced(place, 0, stop), {
    hard: run.floorHard,
    cost: run.cost + found.delta,
  });
  if (!settled || missesAnew(trial, run, settled.stops)) return;
  found.delta = settled.cost - run.cost;
  found.at = at;
  found.stops = settled.stops;
}

/** True when a visit that was not on this van misses its window there, even if facts excuse it. */
export function missesAnew(trial: Trial, run: SearchRun, stops: readonly ReadyStop[]): boolean {
  if (trial.day.problem.nowSeconds === null) return false;
  const state = trial.scratch;
  copyWalk(run.from, state);
  for (let i = 0; i < stops.length; i += 1) {
    const stop = stops[i]!;
    stepRun(trial.day, state, stop, stops[i + 1] ?? null);
    if (stop.visit && state.begin.missedBy > 0 && isNewHere(trial, run, stop.visit)) return true;
  }
  return false;
}

function isNewHere(trial: Trial, run: SearchRun, visit: ReadyVisit): boolean {
  return trial.homeVan[visit.index] !== run.vanIndex;
}

function flatCost(day: ReadyDay, run: SearchRun, visit: ReadyVisit): number {
  const { otherGroomerSeconds, disturbSeconds } = day.problem.weights;
  const disturbs = visit.sentVan >= 0 && visit.sentVan !== run.vanIndex;
  return otherGroomerSeconds * visit.otherGroomer[run.vanIndex]! + (disturbs ? disturbSeconds : 0);
}

/** A floor under what driving and waiting add at a place; −∞ where sites make it unsure. */
function leastAdded(
  trial: Trial,
  run: SearchRun,
  frames: Frames,
  stop: ReadyStop,
  at: number,
  waitTotal: number,
): number {
  if (stop.visit!.fact.siteId !== null || run.stops[at - 1]?.kind === 'meal') return -Infinity;
  const { day } = trial;
  const state = frames.states[at]!;
  const row = state.point * day.pointCount;
  const to = frames.nextPoint[at]!;
  const there = day.base[row + stop.point]! + day.base[stop.point * day.pointCount + to]!;
  if (run.stops.length === 0 && state.stopsSeen === 0) return (there * trial.leastPermille) / 1000;
  const added = there - day.base[row + to]!;
  if (trial.leastPermille !== 1000) return added < 0 ? -Infinity : 0;
  const wait = waitTotal - state.waitSeconds;
  return added - (day.problem.weights.waitFactorPermille * wait) / 1000 - 1;
}

function tryAt(
  trial: Trial,
  run: SearchRun,
  frames: Frames,
  stop: ReadyStop,
  at: number,
  mostDelta: number,
): number {
  const { day, scratch, end } = trial;
  const { stops, floorHard } = run;
  const n = stops.length;
  const before = at > 0 ? stops[at - 1]! : null;
  if (before?.kind === 'meal') {
    // Where the meal is eaten depends on what comes after it.
    copyWalk(frames.states[at - 1]!, scratch);
    stepRun(day, scratch, before, stop);
  } else copyWalk(frames.states[at]!, scratch);
  stepRun(day, scratch, stop, at < n ? stops[at]! : null);
  if (scratch.hard - scratch.mendable > floorHard) return Infinity;
  if (scratch.begin.missedBy > 0 && isNewHere(trial, run, stop.visit!)) return Infinity;
  const nextPoint = at < n ? stops[at]!.point : run.from.van.endPoint;
  if (nextPoint >= 0 && frames.slack[at]! !== Infinity && stop.visit!.fact.siteId === null) {
    const arrive = scratch.freeSeconds + day.base[scratch.point * day.pointCount + nextPoint]!;
    if (arrive - frames.arrive[at]! > frames.slack[at]!) return Infinity;
  }
  const most = run.cost + mostDelta;
  for (let i = at; i < n; i += 1) {
    stepRun(day, scratch, stops[i]!, i + 1 < n ? stops[i + 1]! : null);
    if (scratch.hard - scratch.mendable > floorHard) return Infinity;
    if (costSoFar(day, scratch) >= most) return Infinity;
  }
  finishRun(day, scratch, end);
  if (scratch.hard - scratch.mendable > floorHard) return Infinity;
  if (scratch.hard > floorHard) return onlyMendable;
  return end.cost - run.cost;
}

function costSoFar(day: ReadyDay, state: WalkState): number {
  const weights = day.problem.weights;
  return (
    state.driveSeconds +
    weights.lateFactor * state.lateSeconds +
    (weights.waitFactorPermille * state.waitSeconds) / 1000 -
    1 +
    weights.otherGroomerSeconds * state.otherGroomers +
    weights.disturbSeconds * state.disturbed
  );
}
