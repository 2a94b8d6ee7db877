import { compileDay, factOf, type ReadyDay } from './compileDay.ts';
import { settleRun } from './settleRun.ts';
import type { DayProblem, Move, Plan, Run, Stop } from './types.ts';

/** What became of a move. The plan is the same object when nothing moved. */
export interface MoveResult {
  plan: Plan;
  moved: boolean;
  /** For people; only when the move may not be made. Broken rules do not refuse: they are shown. */
  refusedBecause?: string;
}

/**
 * Makes a move and settles the touched runs (refills, meals and rests put back at least cost).
 * `index` counts the run's other visits: 0 is before the first of them. Refused, with words, are
 * moves of started stops and moves before them. Throws a RangeError for ids the day does not know.
 */
export function applyMove(problem: DayProblem, plan: Plan, move: Move): MoveResult {
  const day = compileDay(problem);
  const full = withAllRuns(problem, plan);
  const made = makeMove(day, full, move);
  if (typeof made === 'string') return { plan, moved: false, refusedBecause: made };
  const runs = made.runs.map((run) => (full.runs.includes(run) ? run : settleRun(problem, run)));
  const next = { runs, notPlaced: made.notPlaced };
  return samePlan(plan, next) ? { plan, moved: false } : { plan: next, moved: true };
}

function makeMove(day: ReadyDay, plan: Plan, move: Move): Plan | string {
  if (move.kind === 'placeVisit')
    return placeVisit(day, plan, move.visitId, move.vanId, move.index);
  if (move.kind === 'unplaceVisit') return unplaceVisit(day, plan, move.visitId);
  if (move.kind === 'swapRuns') return swapRuns(day, plan, move.vanId, move.otherVanId);
  return replacePlan(day, plan, move.plan);
}

function placeVisit(
  day: ReadyDay,
  plan: Plan,
  visitId: string,
  vanId: string,
  index: number,
): Plan | string {
  const refused = refuseStarted(day, visitId);
  if (refused) return refused;
  if (!Number.isInteger(index) || index < 0)
    throw new RangeError('index: must be a whole number, 0 for before the first visit');
  const from = plan.runs.find((run) => run.stops.some((stop) => stop.id === visitId));
  const stop = from?.stops.find((each) => each.id === visitId) ?? {
    kind: 'visit' as const,
    id: visitId,
    visitId,
  };
  const target = plan.runs.find((run) => run.vanId === vanId);
  if (!target) throw new RangeError(`vanId: '${vanId}' has no shift on this day`);
  const others = target.stops.filter((each) => each.id !== visitId);
  const lastStarted = others.findLastIndex((each) => isStarted(day, each, vanId));
  const at = placeOfVisit(others, index);
  if (at <= lastStarted) {
    const name = day.problem.vans[day.vanIndex.get(vanId)!]!.vanName;
    return `${name} has already started later stops; place it after them.`;
  }
  return {
    runs: plan.runs.map((run) => {
      if (run === target) return { ...run, stops: others.toSpliced(at, 0, stop) };
      return run === from ? without(run, visitId) : run;
    }),
    notPlaced: plan.notPlaced.filter((id) => id !== visitId),
  };
}

function unplaceVisit(day: ReadyDay, plan: Plan, visitId: string): Plan | string {
  const refused = refuseStarted(day, visitId);
  if (refused) return refused;
  if (plan.notPlaced.includes(visitId)) return plan;
  return {
    runs: plan.runs.map((run) =>
      run.stops.some((stop) => stop.id === visitId) ? without(run, visitId) : run,
    ),
    notPlaced: [...plan.notPlaced, visitId],
  };
}

/** The unstarted, unpinned visits of two vans change places; all else stays. */
function swapRuns(day: ReadyDay, plan: Plan, vanId: string, otherVanId: string): Plan | string {
  const one = plan.runs.find((run) => run.vanId === vanId);
  const other = plan.runs.find((run) => run.vanId === otherVanId);
  if (!one) throw new RangeError(`vanId: '${vanId}' has no shift on this day`);
  if (!other) throw new RangeError(`otherVanId: '${otherVanId}' has no shift on this day`);
  if (one === other) return plan;
  const moves = (run: Run) => (stop: Stop) =>
    stop.kind === 'visit' && !stop.pinned && !isStarted(day, stop, run.vanId);
  const swapped = (run: Run, given: Stop[]): Run => {
    const stays = run.stops.filter((stop) => !moves(run)(stop));
    const lastStarted = stays.findLastIndex((stop) => isStarted(day, stop, run.vanId));
    return { ...run, stops: stays.toSpliced(lastStarted + 1, 0, ...given) };
  };
  const fromOne = one.stops.filter(moves(one));
  const fromOther = other.stops.filter(moves(other));
  return {
    ...plan,
    runs: plan.runs.map((run) =>
      run === one ? swapped(one, fromOther) : run === other ? swapped(other, fromOne) : run,
    ),
  };
}

function replacePlan(day: ReadyDay, plan: Plan, wanted: Plan): Plan | string {
  for (const run of plan.runs)
    for (const stop of run.stops) {
      if (!isStarted(day, stop, run.vanId)) continue;
      const stays = wanted.runs
        .find((each) => each.vanId === run.vanId)
        ?.stops.some((each) => each.id === stop.id);
      if (!stays) return `${labelOf(day, stop)} has been started since and cannot be moved.`;
    }
  const placed = new Set<string>();
  for (const run of wanted.runs)
    for (const stop of run.stops) {
      if (stop.kind !== 'visit') continue;
      if (!day.visitIndex.has(stop.visitId))
        throw new RangeError(`plan: '${stop.visitId}' is no visit of this day`);
      if (placed.has(stop.visitId))
        throw new RangeError(`plan: visit '${stop.visitId}' is in it twice`);
      placed.add(stop.visitId);
    }
  const runs = day.problem.vans.map(
    (van) => wanted.runs.find((run) => run.vanId === van.vanId) ?? { vanId: van.vanId, stops: [] },
  );
  const notPlaced = wanted.notPlaced.filter((id) => day.visitIndex.has(id) && !placed.has(id));
  const rest = day.problem.visits.filter(({ id }) => !placed.has(id) && !notPlaced.includes(id));
  return { runs, notPlaced: [...notPlaced, ...rest.map(({ id }) => id)] };
}

function refuseStarted(day: ReadyDay, visitId: string): string | null {
  const index = day.visitIndex.get(visitId);
  if (index === undefined) throw new RangeError(`visitId: '${visitId}' is no visit of this day`);
  const fact = day.facts.get(visitId);
  if (!fact) return null;
  const label = day.visits[index]!.fact.label;
  if (fact.leftSeconds !== null) return `${label} is already done and stays where it was.`;
  if (fact.arrivedSeconds !== null || fact.workingSinceSeconds !== null)
    return `The van is already at ${label}; it cannot be moved.`;
  return `The van is already driving to ${label}; it cannot be moved.`;
}

function isStarted(day: ReadyDay, stop: Stop, vanId: string): boolean {
  return factOf(day, stop.id, vanId) !== null;
}

function labelOf(day: ReadyDay, stop: Stop): string {
  if (stop.kind !== 'visit') return `The ${stop.kind}`;
  return day.visits[day.visitIndex.get(stop.visitId)!]!.fact.label;
}

/** Where in the stops a visit lands that is to be the `index`-th: right before the visit now there. */
function placeOfVisit(stops: Stop[], index: number): number {
  let seen = 0;
  for (let at = 0; at < stops.length; at += 1) {
    if (stops[at]!.kind !== 'visit') continue;
    if (seen === index) return at;
    seen += 1;
  }
  return stops.length;
}

function without(run: Run, visitId: string): Run {
  return { ...run, stops: run.stops.filter((stop) => stop.id !== visitId) };
}

/** The plan with a run for every van, in the problem's order when any was missing. */
function withAllRuns(problem: DayProblem, plan: Plan): Plan {
  if (problem.vans.every((van) => plan.runs.some((run) => run.vanId === van.vanId))) return plan;
  return {
    ...plan,
    runs: problem.vans.map(
      (van) => plan.runs.find((run) => run.vanId === van.vanId) ?? { vanId: van.vanId, stops: [] },
    ),
  };
}

function samePlan(one: Plan, other: Plan): boolean {
  const text = (plan: Plan) =>
    JSON.stringify([plan.runs.filter((run) => run.stops.length > 0), [...plan.notPlaced].sort()]);
  return one === other || text(one) === text(other);
}
