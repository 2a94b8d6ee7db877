import type { Move, Plan } from '#shared/schedule/types.ts';
import type { LoadedDay } from './loadDay.ts';

/** A move in words for the log and the undo button: "Juniper to Plover, after Sorrel". */
export function describeMove(loaded: Pick<LoadedDay, 'problem'>, after: Plan, move: Move): string {
  const label = (visitId: string) =>
    loaded.problem.visits.find((visit) => visit.id === visitId)?.label ?? 'A visit';
  const vanName = (vanId: string) =>
    loaded.problem.vans.find((van) => van.vanId === vanId)?.vanName ?? 'a van';
  if (move.kind === 'unplaceVisit') return `${label(move.visitId)} to not placed`;
  if (move.kind === 'swapRuns')
    return `${vanName(move.vanId)} and ${vanName(move.otherVanId)} swapped`;
  if (move.kind === 'replacePlan') return 'A proposal kept';
  const visits = after.runs
    .find((run) => run.vanId === move.vanId)!
    .stops.flatMap((stop) => (stop.kind === 'visit' ? stop.visitId : []));
  const before = visits[visits.indexOf(move.visitId) - 1];
  const where = before ? `after ${label(before)}` : 'first';
  return `${label(move.visitId)} to ${vanName(move.vanId)}, ${where}`;
}
