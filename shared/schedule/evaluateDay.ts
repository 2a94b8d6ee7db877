import { compileDay, readyStop } from './compileDay.ts';
import { finishRun, walkStarted } from './finishRun.ts';
import { isGivenUp } from './stepFact.ts';
import { stepRun } from './stepRun.ts';
import type { BrokenRule, CostParts, DayProblem, DayTimes, Plan, Run, RunTimes } from './types.ts';
import { type RunRecord, startWalk, type WalkState } from './walkState.ts';

/**
 * Every time, cost part and broken rule of a plan (RULES.md). Pure and integer: the same answer on
 * every machine. Runs that the plan leaves out are empty; visits in no run count as not placed.
 * Throws a RangeError for a van, visit or place the problem does not know.
 */
export function evaluateDay(problem: DayProblem, plan: Plan): DayTimes {
  const day = compileDay(problem);
  const cost: CostParts = {
    driveSeconds: 0,
    lateSeconds: 0,
    waitSeconds: 0,
    overtimeSeconds: 0,
    notPlacedSeconds: 0,
    otherGroomerSeconds: 0,
    disturbSeconds: 0,
  };
  const weights = problem.weights;
  const placed = new Set<string>();
  const runs = plan.runs.map((run) => {
    const { times, state } = evaluateRun(problem, run);
    for (const stop of run.stops) {
      if (stop.kind !== 'visit') continue;
      if (placed.has(stop.visitId))
        throw new RangeError(`plan: visit '${stop.visitId}' is in it twice`);
      placed.add(stop.visitId);
    }
    cost.driveSeconds += state.driveSeconds;
    cost.lateSeconds += weights.lateFactor * state.lateSeconds;
    cost.waitSeconds += Math.floor((weights.waitFactorPermille * state.waitSeconds + 500) / 1000);
    cost.overtimeSeconds += weights.overtimeFactor * times.overtimeSeconds;
    cost.otherGroomerSeconds += weights.otherGroomerSeconds * state.otherGroomers;
    cost.disturbSeconds += weights.disturbSeconds * state.disturbed;
    return times;
  });
  for (const visit of problem.visits)
    if (!placed.has(visit.id)) cost.notPlacedSeconds += visit.valueSeconds;
  addMissingStarted(problem, plan, runs, day.facts.keys());
  return sumUp(runs, cost);
}

/** One run's times, and the walk's last state for the cost's raw amounts. */
export function evaluateRun(problem: DayProblem, run: Run): { times: RunTimes; state: WalkState } {
  const day = compileDay(problem);
  const vanIndex = day.vanIndex.get(run.vanId);
  if (vanIndex === undefined)
    throw new RangeError(`vanId: '${run.vanId}' has no shift on this day`);
  const stops = run.stops.map((stop) => readyStop(day, stop, run.vanId));
  const firstAhead = stops.findIndex((stop) => stop.fact === null);
  const started = firstAhead < 0 ? stops : stops.slice(0, firstAhead);
  const record: RunRecord = { stops: [], broken: [] };
  const state = startWalk(problem.vans[vanIndex]!, vanIndex, record);
  const leave = state.freeSeconds;
  if (started.length > 0) state.inherited = walkStarted(day, vanIndex, started).inherited;
  for (let i = 0; i < stops.length; i += 1) {
    const stop = stops[i]!;
    if (stop.fact !== null && i >= started.length && !isGivenUp(stop.fact))
      record.broken.push(startedRule(run, stop.id));
    stepRun(day, state, stop, stops[i + 1] ?? null);
  }
  const drivenOut = { seconds: state.driveSeconds, metres: state.driveMetres };
  const end = { finishSeconds: 0, overtimeSeconds: 0, cost: 0 };
  finishRun(day, state, end);
  const times: RunTimes = {
    vanId: run.vanId,
    leaveSeconds: record.stops[0]?.departSeconds ?? leave,
    stops: record.stops,
    homeDriveSeconds: state.driveSeconds - drivenOut.seconds,
    homeDriveMetres: state.driveMetres - drivenOut.metres,
    homeRough: stops.length > 0 && state.leg.rough,
    finishSeconds: end.finishSeconds,
    driveSeconds: state.driveSeconds,
    driveMetres: state.driveMetres,
    workSeconds: state.workSeconds,
    waitSeconds: state.waitSeconds,
    overtimeSeconds: end.overtimeSeconds,
    broken: record.broken,
  };
  return { times, state };
}

function addMissingStarted(
  problem: DayProblem,
  plan: Plan,
  runs: RunTimes[],
  startedIds: Iterable<string>,
): void {
  for (const stopId of startedIds) {
    const fact = problem.facts.find((each) => each.stopId === stopId)!;
    if (isGivenUp(fact)) continue;
    const at = plan.runs.findIndex(
      (run) => run.vanId === fact.vanId && run.stops.some((stop) => stop.id === stopId),
    );
    const run = runs.find((each) => each.vanId === fact.vanId);
    if (at < 0 && run) run.broken.push(startedRule(run, stopId));
  }
}

function startedRule(run: { vanId: string }, stopId: string): BrokenRule {
  return {
    rule: 'started',
    hard: true,
    vanId: run.vanId,
    stopId,
    byAmount: 0,
    inherited: false,
  };
}

function sumUp(runs: RunTimes[], cost: CostParts): DayTimes {
  let driveSeconds = 0;
  let driveMetres = 0;
  let workSeconds = 0;
  let waitSeconds = 0;
  let promisesSafe = 0;
  let promisesAtRisk = 0;
  let feasible = true;
  for (const run of runs) {
    driveSeconds += run.driveSeconds;
    driveMetres += run.driveMetres;
    workSeconds += run.workSeconds;
    waitSeconds += run.waitSeconds;
    for (const stop of run.stops)
      if (stop.onTimePermille !== null) {
        if (stop.onTimePermille >= 900) promisesSafe += 1;
        else promisesAtRisk += 1;
      }
    if (run.broken.some((broken) => broken.hard && !broken.inherited)) feasible = false;
  }
  const totalCost =
    cost.driveSeconds +
    cost.lateSeconds +
    cost.waitSeconds +
    cost.overtimeSeconds +
    cost.notPlacedSeconds +
    cost.otherGroomerSeconds +
    cost.disturbSeconds;
  return {
    runs,
    cost,
    totalCost,
    driveSeconds,
    driveMetres,
    workSeconds,
    waitSeconds,
    promisesSafe,
    promisesAtRisk,
    feasible,
  };
}
