import type { Move, Plan } from './types.ts';

/**
 * The move that takes `after` back to `before`: what undo sends. It is made on the plan as it then
 * is, so later changes elsewhere stay.
 */
export function inverseMove(before: Plan, after: Plan, move: Move): Move {
  if (move.kind === 'swapRuns') return move;
  if (move.kind === 'replacePlan') return { kind: 'replacePlan', plan: before };
  for (const run of before.runs) {
    const visits = run.stops.filter((stop) => stop.kind === 'visit');
    const index = visits.findIndex((stop) => stop.visitId === move.visitId);
    if (index >= 0) return { kind: 'placeVisit', visitId: move.visitId, vanId: run.vanId, index };
  }
  const isPlaced = after.runs.some((run) => run.stops.some((stop) => stop.id === move.visitId));
  return isPlaced ? { kind: 'unplaceVisit', visitId: move.visitId } : move;
}
