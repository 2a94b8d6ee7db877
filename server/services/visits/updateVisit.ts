import { AppError, badField, notFound } from '#server/errors.ts';
import type { Day } from '#server/models/Day.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Promise as PromiseRow } from '#server/models/Promise.ts';
import { RunEvent } from '#server/models/RunEvent.ts';
import { type AllowedWall, Visit } from '#server/models/Visit.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { loadDay } from '#server/services/days/loadDay.ts';
import { lockDay } from '#server/services/days/lockDay.ts';
import { logChange } from '#server/services/days/logChange.ts';
import { makeMove } from '#server/services/days/moveVisit.ts';
import { savePlan } from '#server/services/days/savePlan.ts';
import { forgetMoves } from '#server/services/days/undoMove.ts';
import { addPromise } from './createVisit.ts';
import { labelOf, loadVisitFacts } from './visitFacts.ts';

export interface VisitChange {
  promise?: { startMinutes: number; endMinutes: number } | null | undefined;
  allowed?: AllowedWall[] | undefined;
  preferredGroomerId?: string | null | undefined;
  note?: string | undefined;
}

/** Changes what a visit may bend; a changed promise is a new version, the old ones stay. */
export async function updateVisit(
  actor: Actor,
  visitId: string,
  change: VisitChange,
  now: Date,
): Promise<Visit> {
  const { day, visit } = await lockBookedVisit(visitId);
  if (change.preferredGroomerId && !(await Groomer.findByPk(change.preferredGroomerId)))
    throw badField('preferredGroomerId', 'must be a groomer of this business');
  if (change.promise !== undefined) {
    const last = await PromiseRow.findOne({ where: { visitId }, order: [['version', 'DESC']] });
    const same =
      (last?.startMinutes ?? null) === (change.promise?.startMinutes ?? null) &&
      (last?.endMinutes ?? null) === (change.promise?.endMinutes ?? null);
    if (!same)
      await addPromise(visit, change.promise, (last?.version ?? 0) + 1, actor.userName, now);
  }
  await visit.update({
    ...(change.allowed !== undefined && { allowed: change.allowed }),
    ...(change.preferredGroomerId !== undefined && {
      preferredGroomerId: change.preferredGroomerId,
    }),
    ...(change.note !== undefined && { note: change.note }),
  });
  const [facts] = await loadVisitFacts([visit]);
  await logChange(day, { actor, now, kind: 'updateVisit', words: `${labelOf(facts!)} changed` });
  return visit;
}

/** Cancels a visit nobody has set out for; its place on the run closes up. */
export async function cancelVisit(
  actor: Actor,
  visitId: string,
  reason: string,
  now: Date,
): Promise<void> {
  const { day, visit } = await lockBookedVisit(visitId);
  if (await RunEvent.findOne({ where: { stopId: visitId } }))
    throw new AppError(
      'refusedMove',
      'The van has already set out for this visit. Use “Can’t do it” on the run.',
    );
  const loaded = await loadDay(actor.businessId, visit.date, now, { lock: true });
  await savePlan(loaded, makeMove(loaded, { kind: 'unplaceVisit', visitId }));
  await forgetMoves(day, visitId, now);
  await visit.update({ status: 'cancelled', cancelReason: reason });
  const [facts] = await loadVisitFacts([visit]);
  await logChange(day, {
    actor,
    now,
    kind: 'cancelVisit',
    words: `${labelOf(facts!)} cancelled: ${reason}`,
  });
}

/** Locks the day, then the visit, in every writer's order; refused once the visit is over. */
async function lockBookedVisit(visitId: string): Promise<{ day: Day; visit: Visit }> {
  const found = await Visit.findByPk(visitId);
  if (!found) throw notFound('visit');
  const day = await lockDay(found.date);
  const visit = (await Visit.findByPk(visitId, { lock: true }))!;
  if (visit.status !== 'booked')
    throw new AppError('refusedMove', `This visit is ${visit.status} and cannot change any more.`);
  return { day, visit };
}
