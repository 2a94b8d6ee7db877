import {
  type DoorLearned,
  type DoorVisit,
  doorPermille,
} from '#shared/grooming/learning/doorPermille.ts';
import type { StopHappened } from '#shared/schedule/reduceEvents.ts';
import { Run } from '#server/models/Run.ts';
import { Visit, type VisitForecast } from '#server/models/Visit.ts';
import { loadHappened } from '#server/services/runs/loadHappened.ts';

/** Older visits say little about today's gate code, and taps are many. */
const mostVisits = 12;

/** Door minutes of a household against the usual, from its latest finished visits' taps. */
export async function doorOf(householdId: string, timeZone: string): Promise<DoorLearned> {
  const visits = await Visit.findAll({
    where: { householdId, status: 'done' },
    order: [
      ['date', 'DESC'],
      ['id', 'DESC'],
    ],
    limit: mostVisits,
  });
  if (visits.length === 0) return doorPermille([]);
  const wanted = new Set(visits.map((visit) => visit.id));
  const runs = (await Run.findAll({ where: { date: visits.map((visit) => visit.date) } })).filter(
    ({ stops }) => stops.some((stop) => stop.kind === 'visit' && wanted.has(stop.visitId)),
  );
  const happened = [...(await loadHappened(runs, timeZone)).values()];
  return doorPermille(
    visits.flatMap((visit) => {
      const stops = happened.flatMap(({ stops: all }) => all.get(visit.id) ?? []);
      return stops.flatMap((stop) => doorVisitOf(stop, visit.forecast) ?? []);
    }),
  );
}

/** null when a tap at either end is missing: then nobody knows which minutes were around the pets. */
export function doorVisitOf(
  stop: StopHappened,
  booked: Pick<VisitForecast, 'door' | 'setUpSeconds' | 'cleanDownSeconds'>,
): DoorVisit | null {
  const { arrivedSeconds, leftSeconds } = stop.fact;
  const [first, last] = [stop.pets[0], stop.pets.at(-1)];
  if (stop.state !== 'done' || stop.implied.length > 0 || !first || !last) return null;
  if (first.startImplied || last.doneImplied || last.doneSeconds === null) return null;
  if (arrivedSeconds === null || leftSeconds === null) return null;
  // Booked before doors were learned: as usual.
  const usualSeconds = booked.door
    ? booked.door.usualSeconds
    : booked.setUpSeconds + booked.cleanDownSeconds;
  if (usualSeconds === null) return null;
  const before = first.startedSeconds - arrivedSeconds;
  const after = leftSeconds - last.doneSeconds;
  return before < 0 || after < 0 ? null : { usualSeconds, actualSeconds: before + after };
}
