import { compileDay, type ReadyDay, type ReadyStop } from '#shared/schedule/compileDay.ts';
import { takeApart } from '#shared/schedule/settleRun.ts';
import type { DayProblem, Plan } from '#shared/schedule/types.ts';
import { startWalk } from '#shared/schedule/walkState.ts';
import type { Trial } from './insertion.ts';
import { Dice } from './random.ts';
import { recreate, resettleChanged } from './recreate.ts';
import { fixedStops, hardOf, isMovable, makeRun, rebuildRun, type SearchRun } from './searchRun.ts';
import { putAbsent, replaceRun, restore, type SearchState, takeSnapshot } from './searchState.ts';

/** A search standing on the better of the given plan, made feasible and filled up, and a fresh one. */
export function startSearch(problem: DayProblem, plan: Plan, seed: number): SearchState {
  const day = compileDay(problem);
  const state = stateOf(day, plan, seed);
  const given = state.runs.some((run) => run.stops.some(isMovable));
  fill(state);
  if (!given) return state;
  const warm = takeSnapshot(state);
  for (const run of state.runs) {
    const kept = fixedStops(run).filter((stop) => !isMovable(stop));
    if (kept.length === fixedStops(run).length) continue;
    const bare = rebuildRun(day, run, kept);
    if (!bare) continue;
    for (const stop of run.stops) if (isMovable(stop)) putAbsent(state, stop.visit!.index);
    replaceRun(state, bare);
  }
  fill(state);
  if (state.cost >= warm.cost) restore(state, warm);
  return state;
}

function fill(state: SearchState): void {
  if (state.absent.length === 0) return;
  const before = [...state.runs];
  recreate(state);
  resettleChanged(state, before);
}

function stateOf(day: ReadyDay, plan: Plan, seed: number): SearchState {
  const { problem } = day;
  const vans = problem.vans.length;
  const count = problem.visits.length;
  const vanOf = new Int32Array(count).fill(-1);
  const homeVan = new Int32Array(count).fill(-1);
  const stopOf = [...day.visitStops];
  const trial: Trial = {
    day,
    scratch: startWalk(problem.vans[0]!, 0),
    end: { finishSeconds: 0, overtimeSeconds: 0, cost: 0 },
    leastPermille: day.leastPermille,
    homeVan,
  };
  const runs: SearchRun[] = problem.vans.map((van) => {
    const run = plan.runs.find((each) => each.vanId === van.vanId) ?? {
      vanId: van.vanId,
      stops: [],
    };
    const { vanIndex, started, fixed, rests, from } = takeApart(day, run);
    for (const stop of started) if (stop.visit) vanOf[stop.visit.index] = -2;
    for (const stop of fixed)
      if (stop.visit) {
        stopOf[stop.visit.index] = stop;
        homeVan[stop.visit.index] = vanIndex;
      }
    return feasibleRun(day, vanIndex, from, [...fixed, ...rests]);
  });
  for (const run of runs)
    for (const stop of run.stops)
      if (stop.visit) vanOf[stop.visit.index] = stop.pinned ? -2 : run.vanIndex;
  const state: SearchState = {
    trial,
    dice: new Dice(seed),
    runs,
    absent: [],
    vanOf,
    stopOf,
    cost: runs.reduce((sum, run) => sum + run.cost, 0),
    near: nearOf(day),
    cache: {
      version: new Float64Array(count * vans).fill(-1),
      found: new Array(count * vans).fill(null),
    },
  };
  for (let visit = 0; visit < count; visit += 1) {
    if (vanOf[visit] !== -1) continue;
    // Started on a van the plan forgot: facts hold it, the search leaves it.
    if (day.facts.has(problem.visits[visit]!.id)) vanOf[visit] = -2;
    else putAbsent(state, visit);
  }
  return state;
}

/** The run with as few visits taken out as make it break no hard rule, pinned ones last. */
function feasibleRun(
  day: ReadyDay,
  vanIndex: number,
  from: SearchRun['from'],
  stops: ReadyStop[],
): SearchRun {
  const like = makeRun({ vanIndex, from, floorHard: 0 }, [], 0);
  for (const mayTake of [isMovable, (stop: ReadyStop) => stop.kind === 'visit']) {
    let left = stops;
    for (;;) {
      const run = rebuildRun(day, like, left);
      if (run) return run;
      const taken = worstOf(day, from, left, mayTake);
      if (!taken) break;
      left = left.filter((stop) => stop !== taken);
    }
  }
  // Only errands, rests and pinned pauses are left: they stay, whatever they break.
  const rest = stops.filter((stop) => stop.kind !== 'visit');
  const floorHard = hardOf(day, from, rest);
  return (
    rebuildRun(day, { ...like, floorHard: floorHard + 1 }, rest) ??
    makeRun({ vanIndex, from, floorHard }, rest, 0)
  );
}

/** The visit whose leaving leaves fewest broken rules, then the least worth, then the later one. */
function worstOf(
  day: ReadyDay,
  from: SearchRun['from'],
  stops: ReadyStop[],
  mayTake: (stop: ReadyStop) => boolean,
): ReadyStop | null {
  let worst: ReadyStop | null = null;
  let least = Infinity;
  for (const stop of stops) {
    if (!mayTake(stop)) continue;
    const hard = hardOf(
      day,
      from,
      stops.filter((each) => each !== stop),
    );
    const rank = hard * 1e9 + stop.visit!.fact.valueSeconds;
    if (rank > least) continue;
    least = rank;
    worst = stop;
  }
  return worst;
}

/** Every visit's others by nearness (the shorter way of the two), itself first; 60 at most. */
function nearOf(day: ReadyDay): Int32Array[] {
  const { visits, base, pointCount } = day;
  return visits.map((visit) => {
    const away = visits.map((other) =>
      other === visit
        ? -1
        : Math.min(
            base[visit.fact.point * pointCount + other.fact.point]!,
            base[other.fact.point * pointCount + visit.fact.point]!,
          ),
    );
    const order = visits.map((_, i) => i).sort((a, b) => away[a]! - away[b]! || a - b);
    return Int32Array.from(order.slice(0, 60));
  });
}
