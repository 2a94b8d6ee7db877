import { badField, notFound } from '#server/errors.ts';
import { Visit } from '#server/models/Visit.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { type LoadedDay, loadDay } from './loadDay.ts';
import { lockDay } from './lockDay.ts';
import { logChange } from './logChange.ts';

/** Pins a visit to a van, so that no proposal moves it elsewhere, or frees it (null). */
export async function pinVisit(
  actor: Actor,
  date: string,
  visitId: string,
  vanId: string | null,
  now: Date,
): Promise<LoadedDay> {
  const day = await lockDay(date);
  const loaded = await loadDay(actor.businessId, date, now, { lock: true });
  const facts = loaded.problem.visits.find((visit) => visit.id === visitId);
  if (!facts) throw notFound('visit');
  const van = loaded.problem.vans.find((one) => one.vanId === vanId);
  if (vanId !== null && !van) throw badField('vanId', 'must be a van with a shift that day');
  await Visit.update({ pin: vanId === null ? null : { vanId } }, { where: { id: visitId } });
  await logChange(day, {
    actor,
    now,
    kind: 'pinVisit',
    words: van ? `${facts.label} pinned to ${van.vanName}` : `${facts.label} free to move`,
  });
  return loadDay(actor.businessId, date, now);
}
