import type { ReadyVisit } from '#shared/schedule/compileDay.ts';
import { bestInsertion, type Insertion, mendInsertion, settledInsertion } from './insertion.ts';
import { makeRun, resettle, type SearchRun } from './searchRun.ts';
import { replaceRun, type SearchState, takeAbsent } from './searchState.ts';

const blinkChance = 0.02;

/**
 * Puts the bank's visits back one by one where they cost least, in a thrown order, blinking at the
 * best place now and then. A visit that costs more than it is worth stays out.
 */
export function recreate(state: SearchState, most = Infinity): void {
  for (const visit of throwOrder(state, most)) insertBest(state, visit, blinkChance);
}

/** Settles meals and refills anew in the runs that are not those of `before`. */
export function resettleChanged(state: SearchState, before: readonly SearchRun[]): void {
  for (let van = 0; van < before.length; van += 1) {
    const run = state.runs[van]!;
    if (run === before[van]) continue;
    const settled = resettle(state.trial.day, run);
    if (settled !== run) replaceRun(state, settled);
  }
}

/** Tries every visit of the bank on every van without blinks, meal and refills settled at each place. */
export function insertThoroughly(state: SearchState): void {
  const worth = (visit: number) => state.stopOf[visit]!.visit!.fact.valueSeconds;
  for (const visit of [...state.absent].sort((a, b) => worth(b) - worth(a) || a - b)) {
    let best: Insertion | null = null;
    let bestRun: SearchRun | null = null;
    for (const run of state.runs) {
      const below = best?.delta ?? worth(visit);
      const found = settledInsertion(state.trial, run, state.stopOf[visit]!, below);
      if (!found) continue;
      best = found;
      bestRun = run;
    }
    if (best && bestRun) putIn(state, bestRun, visit, best.at, best.delta, best);
  }
}

/** Puts one visit where it costs least; false when nowhere is worth it. */
export function insertBest(state: SearchState, visit: number, blink: number): boolean {
  let delta = state.stopOf[visit]!.visit!.fact.valueSeconds;
  let at = -1;
  let found: Insertion | null = null;
  let into: SearchRun | null = null;
  let anyMend = false;
  for (const run of state.runs) {
    const tried = lookUp(state, run, visit);
    if (!tried) continue;
    if (tried.stops === null && tried.mend.length > 0) anyMend = true;
    const blinks = blink > 0 && tried.secondAt >= 0 && state.dice.chance(blink);
    const cost = blinks ? tried.secondDelta : tried.delta;
    if (cost >= delta) continue;
    delta = cost;
    at = blinks ? tried.secondAt : tried.at;
    found = blinks ? null : tried;
    into = run;
  }
  if (anyMend)
    for (const run of state.runs) {
      const tried = lookUp(state, run, visit);
      if (!tried || tried.at >= 0) continue;
      mendInsertion(state.trial, run, state.stopOf[visit]!, tried, delta);
      if (tried.delta >= delta) continue;
      delta = tried.delta;
      at = tried.at;
      found = tried;
      into = run;
    }
  if (!into) return false;
  putIn(state, into, visit, at, delta, found);
  return true;
}

function putIn(
  state: SearchState,
  run: SearchRun,
  visit: number,
  at: number,
  delta: number,
  found: Insertion | null,
): void {
  const stops = found?.stops ?? run.stops.toSpliced(at, 0, state.stopOf[visit]!);
  takeAbsent(state, visit);
  replaceRun(state, makeRun(run, stops, run.cost + delta));
}

function lookUp(state: SearchState, run: SearchRun, visit: number): Insertion | null {
  const { cache } = state;
  const key = visit * state.runs.length + run.vanIndex;
  if (cache.version[key] === run.version) return cache.found[key]!;
  const found = bestInsertion(state.trial, run, state.stopOf[visit]!);
  cache.version[key] = run.version;
  cache.found[key] = found;
  return found;
}

/** The bank in one of several orders: by chance, long work, far, near, narrow window, early, late, worth. */
function throwOrder(state: SearchState, most: number): number[] {
  // Those cut out last are at the end of the bank: all of them, and some that were absent before.
  const order = state.absent.length > most ? throwSome(state, most) : [...state.absent];
  for (let i = order.length - 1; i > 0; i -= 1) {
    const j = state.dice.below(i + 1);
    [order[i], order[j]] = [order[j]!, order[i]!];
  }
  const key = throwKey(state);
  if (!key) return order;
  const rank = new Map(order.map((visit) => [visit, key(state.stopOf[visit]!.visit!)]));
  return order.sort((a, b) => rank.get(a)! - rank.get(b)!);
}

function throwSome(state: SearchState, most: number): number[] {
  const { absent, dice } = state;
  const chosen = absent.slice(-Math.min(most, absent.length));
  const older = absent.length - chosen.length;
  const from = dice.below(older);
  for (let i = 0; i < Math.min(older, 6); i += 1) chosen.push(absent[(from + i) % older]!);
  return chosen;
}

function throwKey(state: SearchState): ((visit: ReadyVisit) => number) | null {
  const thrown = state.dice.below(17);
  const { day } = state.trial;
  const depot = day.problem.vans[0]?.startPoint ?? 0;
  const away = (visit: ReadyVisit) => day.base[depot * day.pointCount + visit.fact.point]!;
  if (thrown < 4) return null;
  if (thrown < 8) return (visit) => -visit.fact.work.meanSeconds;
  if (thrown < 10) return (visit) => -away(visit);
  if (thrown < 11) return away;
  if (thrown < 12) return (visit) => latestOf(visit) - earliestOf(visit);
  if (thrown < 13) return earliestOf;
  if (thrown < 14) return (visit) => -latestOf(visit);
  return (visit) => -visit.fact.valueSeconds;
}

function earliestOf(visit: ReadyVisit): number {
  return Math.max(visit.notBefore, visit.windows[0]?.startSeconds ?? 0);
}

function latestOf(visit: ReadyVisit): number {
  const last = visit.windows.at(-1)?.endSeconds ?? 200_000;
  return Math.min(last, visit.fact.promise?.endSeconds ?? 200_000);
}
