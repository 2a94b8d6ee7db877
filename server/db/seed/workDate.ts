import { addDays } from '#shared/time/localDate.ts';
import { dayStart } from '#shared/time/dayStart.ts';
import { secondsToInstant, wallToSeconds } from '#shared/time/wallSeconds.ts';
import type { Business } from '#server/models/Business.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Run } from '#server/models/Run.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { loadDay } from '#server/services/days/loadDay.ts';
import { sendRuns } from '#server/services/days/sendRuns.ts';
import { lastVisitDates } from '#server/services/households/getHousehold.ts';
import { addRunEvents } from '#server/services/runs/addRunEvents.ts';
import { sentVersion } from '#server/services/runs/getRun.ts';
import { loadVisitFacts } from '#server/services/visits/visitFacts.ts';
import { Visit } from '#server/models/Visit.ts';
import { simulateRun } from './simulateRun.ts';

/** Sends a past date's runs in the morning and lets them be worked as the documented model draws. */
export async function workDate(
  business: Business,
  dispatcher: Actor,
  date: string,
  weeksSinceStart: number,
): Promise<void> {
  const { dayStartUtc } = dayStart(date, business.timeZone);
  const morning = new Date(
    secondsToInstant(dayStartUtc, wallToSeconds(date, business.timeZone, 6 * 60 + 30)),
  );
  const loaded = await loadDay(business.id, date, morning);
  const versions = Object.fromEntries(loaded.runs.map(({ run }) => [run.vanId, run.version]));
  const sent = await sendRuns(dispatcher, date, undefined, versions, morning);
  if ('conflict' in sent) return;
  const night = new Date(
    Date.parse(dayStart(addDays(date, 1), business.timeZone).dayStartUtc) + 3_600_000,
  );
  const groomers = await Groomer.findAll();
  for (const run of await Run.findAll({ where: { date } })) {
    const version = await sentVersion(run);
    if (!version) continue;
    const visits = await loadVisitFacts(
      await Visit.findAll({ where: { id: version.problem.visits.map((visit) => visit.id) } }),
    );
    const pets = visits.flatMap(({ pets: list }) => list.map(({ pet }) => pet.id));
    const events = simulateRun({
      business,
      version,
      visits,
      lastVisits: await lastVisitDates(pets, date),
      groomerName: groomers.find((groomer) => groomer.id === run.groomerId)!.name,
      weeksSinceStart,
    });
    if (events.length > 0)
      await addRunEvents(dispatcher, run.id, events, 'http://127.0.0.1', night);
  }
}
