import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { settleRun, takeApart, toStops } from '#shared/schedule/settleRun.ts';
import { compileDay } from '#shared/schedule/compileDay.ts';
import type { DayProblem, DayTimes, Plan, Run } from '#shared/schedule/types.ts';
import { localMove } from './localMove.ts';
import { insertThoroughly, recreate, resettleChanged } from './recreate.ts';
import { ruin } from './ruin.ts';
import { restore, type SearchState, type Snapshot, takeSnapshot } from './searchState.ts';
import { startSearch } from './startSearch.ts';

/** How long and how to search. Give `iterations`, `stop`, or both; the first to say so ends it. */
export interface OptimiseOptions {
  seed: number;
  iterations?: number;
  /** Asked every 256 iterations. */
  stop?: () => boolean;
  /** How much of the time is used, 0–1: cools the search. Without it and `iterations` it cools in ever longer rounds. */
  fractionDone?: () => number;
  /** Called with every better plan, at most once in 256 iterations; first with the starting plan. */
  onBest?: (plan: Plan, times: DayTimes) => void;
  onProgress?: (progress: OptimiseProgress) => void;
}

export interface OptimiseProgress {
  iterations: number;
  fractionDone: number;
  totalCost: number;
}

export interface OptimiseResult {
  plan: Plan;
  times: DayTimes;
  iterations: number;
}

const checkEvery = 256;
const localChance = 0.5;
const settlingGain = 600;

/**
 * A good plan for the day: ruin and recreate by string removals under simulated annealing, with
 * local moves between (see the design's method section). Anytime, and the same for the same seed and
 * iterations. Started stops stay, pinned visits keep their van and order, and no hard rule is broken
 * that facts (or pinned stops and errands) had not broken already. Never worse than the given plan
 * where that is feasible.
 */
export function optimise(
  problem: DayProblem,
  plan: Plan,
  options: OptimiseOptions,
): OptimiseResult {
  if (options.iterations === undefined && !options.stop)
    throw new RangeError('iterations or stop: give at least one, or the search never ends');
  if (problem.vans.length === 0 || problem.visits.length === 0)
    return finish(problem, plan, plan, 0);
  const state = startSearch(problem, plan, options.seed);
  let best = takeSnapshot(state);
  const tell = () => options.onBest?.(...withTimes(problem, plan, best));
  if (options.onBest) tell();
  const iterations = search(state, options, best, (better, isCheck) => {
    best = better;
    if (isCheck) tell();
  });
  restore(state, best);
  insertThoroughly(state);
  return finish(problem, plan, toPlan(problem, plan, state.runs, state.absent), iterations);
}

function search(
  state: SearchState,
  options: OptimiseOptions,
  start: Snapshot,
  onBetter: (best: Snapshot, isCheck: boolean) => void,
): number {
  const { dice } = state;
  const limit = options.iterations ?? Infinity;
  if (state.near.length < 2) return 0;
  let best = start;
  let told = start;
  const hottest = 1.5 * typicalLeg(state);
  const coldest = Math.max(1, hottest / 200);
  let roundStart = 0;
  let roundLength = 4096;
  let temperature = hottest;
  let iteration = 0;
  let current = takeSnapshot(state);
  for (; iteration < limit; iteration += 1) {
    if (iteration % checkEvery === 0) {
      if (best !== told) {
        told = best;
        onBetter(best, true);
      }
      if (options.stop?.()) break;
      let fraction = options.fractionDone?.() ?? iteration / limit;
      if (!options.fractionDone && limit === Infinity) {
        if (iteration - roundStart >= roundLength) {
          roundStart = iteration;
          roundLength *= 2;
          restore(state, best);
          current = best;
        }
        fraction = (iteration - roundStart) / roundLength;
      }
      temperature = hottest * (coldest / hottest) ** Math.min(1, fraction);
      options.onProgress?.({
        iterations: iteration,
        fractionDone: Math.min(1, fraction),
        totalCost: best.cost,
      });
    }
    const threshold = current.cost - temperature * Math.log(1 - dice.next());
    if (dice.chance(localChance)) {
      if (!localMove(state, threshold)) continue;
    } else {
      recreate(state, ruin(state) + 4);
      // Settling gains some minutes at most: it is left out where they would not help.
      if (state.cost < threshold + settlingGain) resettleChanged(state, current.runs);
      if (state.cost >= threshold) {
        restore(state, current);
        continue;
      }
    }
    current = takeSnapshot(state);
    if (state.cost < best.cost) {
      best = current;
      onBetter(best, false);
    }
  }
  if (best !== told) onBetter(best, true);
  return iteration;
}

/** Seconds to about the fifth-nearest visit: the scale of what a change of order costs. */
function typicalLeg(state: SearchState): number {
  const { day } = state.trial;
  const legs = state.near
    .map((near, visit) => {
      const to = near[Math.min(5, near.length - 1)]!;
      const points = [visit, to].map((index) => day.visits[index]!.fact.point);
      return day.base[points[0]! * day.pointCount + points[1]!]!;
    })
    .sort((a, b) => a - b);
  return Math.max(60, legs[Math.floor(legs.length / 2)] ?? 60);
}

function withTimes(problem: DayProblem, given: Plan, best: Snapshot): [Plan, DayTimes] {
  const plan = toPlan(problem, given, best.runs, best.absent);
  return [plan, evaluateDay(problem, plan)];
}

function toPlan(
  problem: DayProblem,
  given: Plan,
  runs: SearchState['runs'],
  absent: number[],
): Plan {
  const day = compileDay(problem);
  const notPlaced = [...absent].sort((a, b) => a - b).map((visit) => problem.visits[visit]!.id);
  return {
    runs: runs.map((found, i): Run => {
      const vanId = problem.vans[i]!.vanId;
      const run = given.runs.find((each) => each.vanId === vanId) ?? { vanId, stops: [] };
      const { started } = takeApart(day, run);
      return settleRun(problem, {
        vanId,
        stops: toStops(run, started, [...found.stops]),
      });
    }),
    notPlaced,
  };
}

/** The better of what was found and what was given, evaluated. */
function finish(problem: DayProblem, given: Plan, found: Plan, iterations: number): OptimiseResult {
  const times = evaluateDay(problem, found);
  if (found !== given) {
    const before = evaluateDay(problem, given);
    if (before.feasible && before.totalCost <= times.totalCost)
      return { plan: given, times: before, iterations };
  }
  return { plan: found, times, iterations };
}
