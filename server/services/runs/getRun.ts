import { Business } from '#server/models/Business.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Place } from '#server/models/Place.ts';
import type { Run } from '#server/models/Run.ts';
import { RunEvent } from '#server/models/RunEvent.ts';
import { RunVersion } from '#server/models/RunVersion.ts';
import { Van } from '#server/models/Van.ts';
import { Visit } from '#server/models/Visit.ts';
import { VisitPet } from '#server/models/VisitPet.ts';
import { loadVisitFacts } from '#server/services/visits/visitFacts.ts';
import { clockOfVisits, type VisitClock } from './clockOfVisits.ts';

/** One run as its phone has it: the sent version whole, cards as they are now, taps so far. */
export async function getRun(run: Run, now: Date) {
  const [business, van, groomer, version, rows, places] = await Promise.all([
    Business.findByPk(run.businessId),
    Van.findByPk(run.vanId),
    Groomer.findByPk(run.groomerId),
    sentVersion(run),
    RunEvent.findAll({
      where: { runId: run.id },
      order: [
        ['happenedAt', 'ASC'],
        ['id', 'ASC'],
      ],
    }),
    Place.findAll({ order: [['name', 'ASC']] }),
  ]);
  const visitIds =
    version?.plan.runs[0]?.stops.flatMap((stop) => (stop.kind === 'visit' ? stop.visitId : [])) ??
    [];
  const visits = await loadVisitFacts(await Visit.findAll({ where: { id: visitIds } }));
  return {
    run,
    business: business!,
    van: van!,
    groomer: groomer!,
    version,
    visits,
    lastTimes: await lastTimes(visits.map(({ visit }) => visit)),
    places,
    rows,
    now,
  };
}

export type RunFacts = Awaited<ReturnType<typeof getRun>>;

export function sentVersion(run: Run): Promise<RunVersion | null> {
  if (run.sentVersion == null) return Promise.resolve(null);
  return RunVersion.findOne({ where: { runId: run.id, version: run.sentVersion } });
}

/** For each visit, the last finished one with the same first pet: what it took and what was noted. */
async function lastTimes(
  visits: Visit[],
): Promise<Map<string, { date: string; clock: VisitClock }>> {
  const own = await VisitPet.findAll({
    where: { visitId: visits.map((visit) => visit.id), position: 0 },
  });
  const others = await VisitPet.findAll({ where: { petId: own.map((one) => one.petId) } });
  // Years of visits: their forecasts are read of the few that are shown only.
  const past = await Visit.findAll({
    where: { id: others.map((one) => one.visitId), status: 'done' },
    attributes: ['id', 'businessId', 'date'],
    order: [['date', 'DESC']],
  });
  const wanted = new Map<string, Visit>();
  for (const visit of visits) {
    const petId = own.find((one) => one.visitId === visit.id)?.petId;
    const last = past.find(
      (one) =>
        one.date < visit.date &&
        others.some((row) => row.visitId === one.id && row.petId === petId),
    );
    if (last) wanted.set(visit.id, last);
  }
  const clocks = await clockOfVisits(
    await Visit.findAll({ where: { id: [...wanted.values()].map((visit) => visit.id) } }),
  );
  return new Map(
    [...wanted].flatMap(([visitId, last]) => {
      const clock = clocks.get(last.id);
      return clock ? [[visitId, { date: last.date, clock }] as const] : [];
    }),
  );
}
