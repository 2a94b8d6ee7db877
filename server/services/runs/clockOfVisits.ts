import { Business } from '#server/models/Business.ts';
import { Run } from '#server/models/Run.ts';
import type { Visit } from '#server/models/Visit.ts';
import { loadHappened } from './loadHappened.ts';
import { workSeconds } from './workSeconds.ts';

export interface VisitClock {
  run: Run;
  workSeconds: number;
  note: string;
}

/** The clock of finished visits, keyed by visit id; visits nobody tapped are absent. */
export async function clockOfVisits(visits: Visit[]): Promise<Map<string, VisitClock>> {
  const clocks = new Map<string, VisitClock>();
  if (visits.length === 0) return clocks;
  const business = (await Business.findByPk(visits[0]!.businessId))!;
  const wanted = new Set(visits.map((visit) => visit.id));
  const runs = (
    await Run.findAll({ where: { date: [...new Set(visits.map((visit) => visit.date))] } })
  ).filter((run) => run.stops.some((stop) => stop.kind === 'visit' && wanted.has(stop.visitId)));
  const happened = await loadHappened(runs, business.timeZone);
  for (const run of runs) {
    for (const visit of visits) {
      const stop = happened.get(run.id)?.stops.get(visit.id);
      const seconds = stop && workSeconds(stop, visit.forecast);
      if (stop && seconds !== null && seconds !== undefined)
        clocks.set(visit.id, { run, workSeconds: seconds, note: stop.note });
    }
  }
  return clocks;
}
