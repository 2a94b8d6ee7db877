import { Groomer } from '#server/models/Groomer.ts';
import { Pet } from '#server/models/Pet.ts';
import { Promise as PromiseRow } from '#server/models/Promise.ts';
import { Run } from '#server/models/Run.ts';
import { Van } from '#server/models/Van.ts';
import { Visit } from '#server/models/Visit.ts';
import { VisitPet } from '#server/models/VisitPet.ts';
import { lastCutsOf } from '#server/services/styles/lastCutsOf.ts';
import { stylesOf } from '#server/services/styles/stylesOf.ts';
import { clockOfVisits } from '#server/services/runs/clockOfVisits.ts';
import { needHousehold } from './households.ts';
import { needPet } from './pets.ts';

const shownVisits = 30;

/** A household with its pets, and its latest and coming visits with van and promise. */
export async function getHousehold(householdId: string) {
  const household = await needHousehold(householdId);
  const [pets, visits] = await Promise.all([
    Pet.findAll({
      where: { householdId },
      order: [
        ['active', 'DESC'],
        ['name', 'ASC'],
      ],
    }),
    Visit.findAll({ where: { householdId }, order: [['date', 'DESC']], limit: shownVisits }),
  ]);
  const visitIds = visits.map((visit) => visit.id);
  const [visitPets, promises, runs, vans] = await Promise.all([
    VisitPet.findAll({ where: { visitId: visitIds } }),
    PromiseRow.findAll({ where: { visitId: visitIds }, order: [['version', 'ASC']] }),
    Run.findAll({ where: { date: visits.map((visit) => visit.date) } }),
    Van.findAll(),
  ]);
  const styleOf = await stylesOf(pets);
  const lastVisits = await lastVisitDates(pets.map((pet) => pet.id));
  const lastCuts = await lastCutsOf(household.businessId, lastVisits);
  return {
    household,
    pets,
    visits,
    visitPets,
    promises,
    runs,
    vans,
    styleOf,
    lastVisits,
    lastCuts,
  };
}

/** The date of each pet's last finished visit. */
export async function lastVisitDates(
  petIds: string[],
  before?: string,
): Promise<Map<string, string>> {
  const visitPets = await VisitPet.findAll({ where: { petId: petIds } });
  const visits = await Visit.findAll({
    where: { id: visitPets.map((one) => one.visitId), status: 'done' },
    attributes: ['id', 'date', 'status'],
  });
  const dates = new Map<string, string>();
  for (const { petId, visitId } of visitPets) {
    const date = visits.find((visit) => visit.id === visitId)?.date;
    if (date && (!before || date < before) && date > (dates.get(petId) ?? ''))
      dates.set(petId, date);
  }
  return dates;
}

/** A pet with its finished visits, forecast against clock, newest first. */
export async function getPet(petId: string) {
  const pet = await needPet(petId);
  const household = await needHousehold(pet.householdId);
  const visitPets = await VisitPet.findAll({ where: { petId } });
  const visits = await Visit.findAll({
    where: { id: visitPets.map((one) => one.visitId), status: 'done' },
    order: [['date', 'DESC']],
    limit: shownVisits,
  });
  const [clocks, groomers, last] = await Promise.all([
    clockOfVisits(visits),
    Groomer.findAll(),
    lastVisitDates([petId]),
  ]);
  const style = (await stylesOf([pet]))(pet);
  const lastCuts = await lastCutsOf(pet.businessId, last);
  return {
    pet,
    style,
    household,
    visits,
    clocks,
    groomers,
    lastVisitDate: last.get(petId) ?? null,
    lastCuts: lastCuts.get(petId) ?? null,
  };
}
