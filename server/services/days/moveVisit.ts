import { applyMove } from '#shared/schedule/applyMove.ts';
import type { Move, Plan } from '#shared/schedule/types.ts';
import { AppError } from '#server/errors.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { describeMove } from './describeMove.ts';
import { type LoadedDay, loadDay } from './loadDay.ts';
import { lockDay } from './lockDay.ts';
import { logChange } from './logChange.ts';
import { savePlan } from './savePlan.ts';

/** The day as it is now beside a change that came too late. */
export interface Conflict {
  conflict: true;
  day: LoadedDay;
}

/**
 * Makes one move with the same two functions the browser used. Versions are per run: when the runs
 * the move touches are as the screen saw them it is made on the day as it is now, else it is a
 * conflict and nothing changes.
 */
export async function moveVisit(
  actor: Actor,
  date: string,
  move: Move,
  runVersions: Record<string, number>,
  now: Date,
): Promise<LoadedDay | Conflict> {
  const day = await lockDay(date);
  const loaded = await loadDay(actor.businessId, date, now, { lock: true });
  if (isStale(loaded, touchedVans(loaded.plan, move), runVersions))
    return { conflict: true, day: loaded };
  const next = makeMove(loaded, move);
  if (next === loaded.plan) return loaded;
  await logChange(day, {
    actor,
    now,
    kind: 'moveVisit',
    words: describeMove(loaded, next, move),
    move,
    before: loaded.plan,
    after: next,
  });
  return savePlan(loaded, next);
}

/** The moved plan, or a refusal in words; the same plan when nothing moved. */
export function makeMove(loaded: LoadedDay, move: Move): Plan {
  let result;
  try {
    result = applyMove(loaded.problem, loaded.plan, move);
  } catch (error) {
    // Ids the day does not know: another business's look the same as none.
    if (error instanceof RangeError)
      throw new AppError('notFound', 'There is no such visit or van on this day.');
    throw error;
  }
  if (result.refusedBecause) throw new AppError('refusedMove', result.refusedBecause);
  return result.plan;
}

/** True when a run in question is not the version the screen saw. */
export function isStale(
  loaded: LoadedDay,
  vanIds: string[],
  runVersions: Record<string, number>,
): boolean {
  return vanIds.some((vanId) => {
    const run = loaded.runs.find((one) => one.van.id === vanId)?.run;
    return run !== undefined && runVersions[vanId] !== run.version;
  });
}

function touchedVans(plan: Plan, move: Move): string[] {
  if (move.kind === 'swapRuns') return [move.vanId, move.otherVanId];
  if (move.kind === 'replacePlan') return plan.runs.map((run) => run.vanId);
  const from = plan.runs.find((run) => run.stops.some((stop) => stop.id === move.visitId))?.vanId;
  return [
    ...new Set([...(from ? [from] : []), ...(move.kind === 'placeVisit' ? [move.vanId] : [])]),
  ];
}
