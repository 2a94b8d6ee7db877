import type { CreationAttributes } from 'sequelize';
import { addDays } from '#shared/time/localDate.ts';
import { inBusiness } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { Business } from '#server/models/Business.ts';
import { Pet } from '#server/models/Pet.ts';
import { Run } from '#server/models/Run.ts';
import { RunEvent } from '#server/models/RunEvent.ts';
import { Visit } from '#server/models/Visit.ts';
import { VisitPet } from '#server/models/VisitPet.ts';
import { stylesOf } from '#server/services/styles/stylesOf.ts';
import { forecastOf } from '#server/services/visits/forecastOf.ts';
import { seededRandom } from './random.ts';
import { instantAt } from './setClock.ts';

interface Past {
  businessId: string;
  /** The day after the last one worked. */
  before: string;
  vans: { vanId: string; groomerId: string }[];
  petIds: string[];
  days: number;
  /** True minutes ÷ forecast. */
  factor: (petId: string, groomerId: string) => number;
}

/**
 * Writes worked days straight into the tables: each van does two visits a day, tapped like a phone
 * would. One stopwatch in forty is stopped hours late.
 */
export function finishedVisits(past: Past): Promise<void> {
  const random = seededRandom(5);
  return inBusiness(past.businessId, async () => {
    const business = (await Business.findByPk(past.businessId))!;
    const pets = await Pet.findAll({ where: { id: past.petIds } });
    const everSeen = new Map(pets.map((pet) => [pet.id, addDays(past.before, -35)]));
    const styleOf = await stylesOf(pets);
    const forecasts = new Map(
      pets.map((pet) => [pet.id, forecastOf([pet], business, past.before, everSeen, styleOf)]),
    );
    const runs: CreationAttributes<Run>[] = [];
    const visits: CreationAttributes<Visit>[] = [];
    const visitPets: CreationAttributes<VisitPet>[] = [];
    const events: ReturnType<typeof tapsOf> = [];
    let turn = 0;
    for (let day = past.days; day > 0; day -= 1) {
      const date = addDays(past.before, -day);
      for (const { vanId, groomerId } of past.vans) {
        const run = {
          id: newId(),
          date,
          vanId,
          groomerId,
          stops: [],
          sentVersion: 1,
          sentAt: instantAt(date, '6:00'),
        };
        runs.push(run);
        for (const hour of [9, 13]) {
          // Pets go round the vans, so that groomer and pet can be told apart.
          const pet = pets[(turn + Math.floor(turn / pets.length)) % pets.length]!;
          turn += 1;
          const { forecast, modelVersion } = forecasts.get(pet.id)!;
          const visit = {
            id: newId(),
            householdId: pet.householdId,
            date,
            status: 'done' as const,
            allowed: [],
            note: '',
            forecast,
            modelVersion,
            createdAt: instantAt(date, '6:00'),
          };
          visits.push(visit);
          visitPets.push({ visitId: visit.id, petId: pet.id, position: 0 });
          const noise = 0.9 + 0.2 * random();
          const seconds = forecast.steps.reduce((sum, step) => sum + step.medianSeconds, 0);
          const late = random() < 0.025 ? 4 * 3600 : 0;
          const took = Math.round(seconds * noise * past.factor(pet.id, groomerId)) + late;
          events.push(...tapsOf(run.id, visit.id, pet.id, instantAt(date, `${hour}:00`), took));
        }
      }
    }
    await Run.bulkCreate(runs);
    await Visit.bulkCreate(visits);
    await VisitPet.bulkCreate(visitPets);
    await RunEvent.bulkCreate(events);
  });
}

let deviceSeq = 0;

function tapsOf(runId: string, stopId: string, petId: string, start: Date, took: number) {
  const tap = (kind: string, seconds: number, data: Record<string, unknown>) => {
    deviceSeq += 1;
    const deviceAt = new Date(start.getTime() + seconds * 1000);
    return {
      id: newId(),
      runId,
      deviceId: '11111111-1111-4111-8111-111111111111',
      deviceSeq,
      deviceAt,
      offsetMs: 0,
      happenedAt: deviceAt,
      receivedAt: deviceAt,
      runVersion: 1,
      stopId,
      kind,
      v: 1,
      data,
    };
  };
  return [
    tap('arrived', 0, {}),
    tap('petOnTable', 360, { petId }),
    tap('petDone', 360 + took, { petId }),
    tap('stopDone', 720 + took, { note: '' }),
  ];
}
