import type { Style } from '#shared/grooming/types.ts';
import { Household } from '#server/models/Household.ts';
import { Pet } from '#server/models/Pet.ts';
import { Promise as PromiseRow } from '#server/models/Promise.ts';
import { Site } from '#server/models/Site.ts';
import type { Visit } from '#server/models/Visit.ts';
import { VisitPet } from '#server/models/VisitPet.ts';
import { stylesOf } from '#server/services/styles/stylesOf.ts';
import { cautionNotes, type CautionNoteRow } from './cautionNotes.ts';

/** A visit with everything its card, its problem row and its text need. */
export interface VisitFacts {
  visit: Visit;
  household: Household;
  site: Site | null;
  pets: { pet: Pet; style: Style; cautions: CautionNoteRow[] }[];
  /** The promise that counts; null when none was made or it was taken back. */
  promise: { startMinutes: number; endMinutes: number; version: number } | null;
}

/** Loads visits' surroundings in seven queries, however many visits. Order is kept. */
export async function loadVisitFacts(visits: Visit[]): Promise<VisitFacts[]> {
  const visitIds = visits.map((visit) => visit.id);
  const [households, visitPets, promises] = await Promise.all([
    Household.findAll({ where: { id: visits.map((visit) => visit.householdId) } }),
    VisitPet.findAll({ where: { visitId: visitIds }, order: [['position', 'ASC']] }),
    PromiseRow.findAll({ where: { visitId: visitIds }, order: [['version', 'ASC']] }),
  ]);
  const [pets, sites] = await Promise.all([
    Pet.findAll({ where: { id: visitPets.map((one) => one.petId) } }),
    Site.findAll({ where: { id: households.flatMap((one) => one.siteId ?? []) } }),
  ]);
  const styleOf = await stylesOf(pets);
  const petById = new Map(pets.map((pet) => [pet.id, pet]));
  const latest = new Map(promises.map((promise) => [promise.visitId, promise]));
  return visits.map((visit) => {
    const household = households.find((one) => one.id === visit.householdId)!;
    const promise = latest.get(visit.id);
    return {
      visit,
      household,
      site: sites.find((one) => one.id === household.siteId) ?? null,
      pets: visitPets
        .filter((one) => one.visitId === visit.id)
        .map((one) => petById.get(one.petId)!)
        .map((pet) => {
          const style = styleOf(pet);
          return { pet, style, cautions: cautionNotes(pet, style, visit.date) };
        }),
      promise:
        promise && promise.startMinutes != null && promise.endMinutes != null
          ? {
              startMinutes: promise.startMinutes,
              endMinutes: promise.endMinutes,
              version: promise.version,
            }
          : null,
    };
  });
}

/** "Rook & Wren" */
export function labelOf(facts: VisitFacts): string {
  return facts.pets.map(({ pet }) => pet.name).join(' & ');
}
