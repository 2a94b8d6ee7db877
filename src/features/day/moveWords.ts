import type { DayProblem, Move, Plan } from '#shared/schedule/types.ts';

/** "Plover, after Sorrel"; "Plover, first"; "not placed". */
export function targetWords(problem: DayProblem, plan: Plan, move: Move): string {
  if (move.kind === 'unplaceVisit') return 'not placed';
  if (move.kind !== 'placeVisit') return '';
  const van = problem.vans.find((one) => one.vanId === move.vanId);
  const before = otherVisits(plan, move.vanId, move.visitId)[move.index - 1];
  const label = problem.visits.find((visit) => visit.id === before)?.label;
  return `${van?.vanName ?? 'another van'}, ${label ? `after ${label}` : 'first'}`;
}

/** "Juniper moves to Plover, after Sorrel" */
export function moveWords(problem: DayProblem, plan: Plan, move: Move): string {
  if (move.kind === 'replacePlan' || move.kind === 'swapRuns') return 'Runs change places';
  const label = problem.visits.find((visit) => visit.id === move.visitId)?.label ?? 'The visit';
  const verb = label.includes(' & ') ? ['move', 'leave'] : ['moves', 'leaves'];
  if (move.kind === 'unplaceVisit') return `${label} ${verb[1]} the vans, not placed`;
  const target = targetWords(problem, plan, move);
  const stays = placeOf(plan, move.visitId)?.vanId === move.vanId;
  return `${label} ${verb[0]} ${stays ? 'within' : 'to'} ${target}`;
}

/** Ids of a van's visits in order, without the one being moved: what a move's index counts. */
export function otherVisits(plan: Plan, vanId: string, visitId: string): string[] {
  const run = plan.runs.find((one) => one.vanId === vanId);
  return (run?.stops ?? []).flatMap((stop) =>
    stop.kind === 'visit' && stop.visitId !== visitId ? [stop.visitId] : [],
  );
}

/** Where a visit is: its van and its place among the van's other visits; null when not placed. */
export function placeOf(plan: Plan, visitId: string): { vanId: string; index: number } | null {
  for (const run of plan.runs) {
    const visits = run.stops.filter((stop) => stop.kind === 'visit');
    const index = visits.findIndex((stop) => stop.visitId === visitId);
    if (index >= 0) return { vanId: run.vanId, index };
  }
  return null;
}
