import type { Day } from '#shared/api/days.ts';
import type { Move, Plan } from '#shared/schedule/types.ts';
import { placeOf } from './moveWords.ts';

/** Versions of the runs a move touches, by van id, as this screen saw them. */
export function runVersionsOf(day: Day, plan: Plan, move: Move): Record<string, number> {
  const touched = new Set<string>();
  if (move.kind === 'placeVisit' || move.kind === 'unplaceVisit') {
    const from = placeOf(plan, move.visitId);
    if (from) touched.add(from.vanId);
  }
  if (move.kind === 'placeVisit') touched.add(move.vanId);
  if (move.kind === 'swapRuns') touched.add(move.vanId).add(move.otherVanId);
  return versionsOf(day, touched);
}

/** All runs', or those of some vans. */
export function versionsOf(day: Day, vanIds?: ReadonlySet<string>): Record<string, number> {
  return Object.fromEntries(
    day.runs
      .filter((run) => !vanIds || vanIds.has(run.vanId))
      .map((run) => [run.vanId, run.version]),
  );
}
