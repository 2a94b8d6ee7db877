import type { DayProblem, Plan, Run, Stop } from './types.ts';

/**
 * One van's share of a day, for its phone: only its shift, its visits and the places it can reach,
 * with the drive matrix cut to those points. Weights and clock stay; nothing of other households
 * is left in. Throws a RangeError for a van the day does not have.
 */
export function restrictToVan(
  problem: DayProblem,
  plan: Plan,
  vanId: string,
): { problem: DayProblem; plan: Plan } {
  const van = problem.vans.find((one) => one.vanId === vanId);
  if (!van) throw new RangeError(`vanId: '${vanId}' has no shift on ${problem.date}`);
  const run = runOf(plan, vanId);
  const visitIds = new Set(
    run.stops.flatMap((stop) => (stop.kind === 'visit' ? stop.visitId : [])),
  );
  const visits = problem.visits.filter(({ id }) => visitIds.has(id));
  const kept = [
    ...new Set([
      van.startPoint,
      van.endPoint,
      ...visits.map(({ point }) => point),
      ...problem.refills.map(({ point }) => point),
      ...run.stops.flatMap((stop) => (stop.kind === 'errand' ? stop.point : [])),
    ]),
  ].sort((a, b) => a - b);
  const renumber = new Map(kept.map((old, index) => [old, index]));
  const to = (point: number) => renumber.get(point)!;
  return {
    problem: {
      ...problem,
      points: kept.map((old) => problem.points[old]!),
      drive: {
        ...problem.drive,
        baseSeconds: cut(problem.drive.baseSeconds, kept, problem.points.length),
        metres: cut(problem.drive.metres, kept, problem.points.length),
      },
      vans: [{ ...van, startPoint: to(van.startPoint), endPoint: to(van.endPoint) }],
      visits: visits.map((visit) => ({ ...visit, point: to(visit.point) })),
      refills: problem.refills.map((refill) => ({ ...refill, point: to(refill.point) })),
      facts: problem.facts.filter((fact) => fact.vanId === vanId),
      sent: problem.sent && {
        runs: [renumberRun(runOf(problem.sent, vanId), renumber)],
        notPlaced: [],
      },
    },
    plan: { runs: [renumberRun(run, renumber)], notPlaced: [] },
  };
}

function runOf(plan: Plan, vanId: string): Run {
  return plan.runs.find((run) => run.vanId === vanId) ?? { vanId, stops: [] };
}

function cut(matrix: readonly number[], kept: readonly number[], size: number): number[] {
  return kept.flatMap((row) => kept.map((column) => matrix[row * size + column]!));
}

/** An errand only the older sent order holds lies outside the points kept: it is left out. */
function renumberRun(run: Run, renumber: ReadonlyMap<number, number>): Run {
  return {
    vanId: run.vanId,
    stops: run.stops.flatMap((stop): Stop[] => {
      if (stop.kind !== 'errand') return [stop];
      const point = renumber.get(stop.point);
      return point === undefined ? [] : [{ ...stop, point }];
    }),
  };
}
