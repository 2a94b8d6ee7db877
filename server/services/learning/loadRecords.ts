import { Op } from 'sequelize';
import type { GroomRecord } from '#shared/grooming/learning/groomRecord.ts';
import { Business } from '#server/models/Business.ts';
import { Pet } from '#server/models/Pet.ts';
import { Run } from '#server/models/Run.ts';
import { Visit } from '#server/models/Visit.ts';
import { loadHappened } from '#server/services/runs/loadHappened.ts';
import { recordsOf } from './recordsOf.ts';

/** Runs read at a time: their taps are many. */
const chunkRuns = 200;

/** Every finished visit of the business in scope as records to learn from, oldest first. */
export async function loadRecords(businessId: string): Promise<GroomRecord[]> {
  const business = (await Business.findByPk(businessId))!;
  const pets = new Map((await Pet.findAll()).map((pet) => [pet.id, pet]));
  const runs = await Run.findAll({
    where: { sentVersion: { [Op.ne]: null } },
    order: [
      ['date', 'ASC'],
      ['id', 'ASC'],
    ],
  });
  const records: GroomRecord[] = [];
  for (let from = 0; from < runs.length; from += chunkRuns) {
    const chunk = runs.slice(from, from + chunkRuns);
    const happened = await loadHappened(chunk, business.timeZone);
    const done = [...happened.values()].flatMap(({ stops }) =>
      [...stops.values()].filter(({ state }) => state === 'done').map(({ stopId }) => stopId),
    );
    const visits = new Map(
      (await Visit.findAll({ where: { id: done } })).map((visit) => [visit.id, visit]),
    );
    for (const run of chunk) {
      for (const stop of happened.get(run.id)!.stops.values()) {
        const visit = visits.get(stop.stopId);
        if (visit) records.push(...recordsOf(run, visit, stop, pets));
      }
    }
  }
  return records;
}
