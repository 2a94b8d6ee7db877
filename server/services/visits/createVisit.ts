import { AppError, badField, notFound } from '#server/errors.ts';
import { Business } from '#server/models/Business.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Household } from '#server/models/Household.ts';
import { Pet } from '#server/models/Pet.ts';
import { Promise as PromiseRow } from '#server/models/Promise.ts';
import { type AllowedWall, Visit } from '#server/models/Visit.ts';
import { VisitPet } from '#server/models/VisitPet.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { logChange } from '#server/services/days/logChange.ts';
import { lockDay } from '#server/services/days/lockDay.ts';
import { localDateOf } from '#server/services/days/today.ts';
import { lastVisitDates } from '#server/services/households/getHousehold.ts';
import { lastCutsOf } from '#server/services/styles/lastCutsOf.ts';
import { stylesOf } from '#server/services/styles/stylesOf.ts';
import { doorOf } from './doorOf.ts';
import { forecastOf } from './forecastOf.ts';
import { learningOf } from './learningOf.ts';

export interface VisitInput {
  householdId: string;
  date: string;
  petIds: string[];
  promise: { startMinutes: number; endMinutes: number } | null;
  allowed: AllowedWall[];
  preferredGroomerId: string | null;
  note: string;
}

/** Books a visit: forecast and promise are stored, the visit waits in the day's "not placed". */
export async function createVisit(actor: Actor, input: VisitInput, now: Date): Promise<Visit> {
  const household = await Household.findByPk(input.householdId);
  if (!household) throw notFound('household');
  const business = (await Business.findByPk(actor.businessId))!;
  if (input.date < localDateOf(now, business.timeZone))
    throw badField('date', 'must be today or later');
  const petIds = [...new Set(input.petIds)];
  const pets = await Pet.findAll({
    where: { id: petIds, householdId: household.id, active: true },
  });
  if (pets.length !== petIds.length) throw badField('petIds', 'must be pets of this household');
  if (input.preferredGroomerId && !(await Groomer.findByPk(input.preferredGroomerId)))
    throw badField('preferredGroomerId', 'must be a groomer of this business');
  const day = await lockDay(input.date);
  await refuseTwice(pets, input.date);
  const ordered = petIds.map((id) => pets.find((pet) => pet.id === id)!);
  const lastVisits = await lastVisitDates(petIds);
  const { forecast, modelVersion } = forecastOf(
    ordered,
    business,
    input.date,
    lastVisits,
    await stylesOf(pets),
    await learningOf(actor.businessId),
    {
      lastCuts: await lastCutsOf(actor.businessId, lastVisits),
      door: await doorOf(household.id, business.timeZone),
    },
  );
  const visit = await Visit.create({
    householdId: household.id,
    date: input.date,
    status: 'booked',
    allowed: input.allowed,
    preferredGroomerId: input.preferredGroomerId,
    note: input.note,
    forecast,
    modelVersion,
    createdAt: now,
  });
  await VisitPet.bulkCreate(
    ordered.map((pet, position) => ({ visitId: visit.id, petId: pet.id, position })),
  );
  if (input.promise) await addPromise(visit, input.promise, 1, actor.userName, now);
  await logChange(day, {
    actor,
    now,
    kind: 'createVisit',
    words: `${ordered.map((pet) => pet.name).join(' & ')} booked`,
  });
  return visit;
}

/** A pet has one open visit a day: a second one is the second click of a double click. */
async function refuseTwice(pets: Pet[], date: string): Promise<void> {
  const visits = await Visit.findAll({
    where: { date, status: 'booked' },
    attributes: ['id', 'businessId'],
  });
  const taken = await VisitPet.findOne({
    where: { visitId: visits.map((visit) => visit.id), petId: pets.map((pet) => pet.id) },
  });
  if (!taken) return;
  const { name } = pets.find((pet) => pet.id === taken.petId)!;
  throw new AppError('alreadyThere', `${name} already has a visit on this day.`, {
    fields: { petIds: `${name} already has a visit on this day` },
  });
}

/** Promises are append-only: a new one is a new version, taking one back is a version without times. */
export async function addPromise(
  visit: Visit,
  promise: { startMinutes: number; endMinutes: number } | null,
  version: number,
  madeBy: string,
  now: Date,
): Promise<void> {
  await PromiseRow.create({
    visitId: visit.id,
    version,
    date: visit.date,
    startMinutes: promise?.startMinutes ?? null,
    endMinutes: promise?.endMinutes ?? null,
    madeAt: now,
    madeBy,
  });
}
