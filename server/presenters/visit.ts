import type { z } from 'zod';
import type { visitCard } from '#shared/api/visits.ts';
import { findBreed, middleGrams } from '#shared/grooming/breeds.ts';
import type { Style } from '#shared/grooming/types.ts';
import type { Household } from '#server/models/Household.ts';
import type { Pet } from '#server/models/Pet.ts';
import type { Site } from '#server/models/Site.ts';
import type { Visit, VisitLearning } from '#server/models/Visit.ts';

interface VisitFacts {
  visit: Visit;
  household: Household;
  site: Site | null;
  pets: { pet: Pet; style: Style; cautions: { key: string; words: string; stop: boolean }[] }[];
  promise: { startMinutes: number; endMinutes: number; version: number } | null;
}

/** No gate code, no notes of access: those are on the run's card only. */
export function presentVisit(facts: VisitFacts): z.input<typeof visitCard> {
  const { visit, household, site } = facts;
  return {
    id: visit.id,
    date: visit.date,
    status: visit.status,
    householdId: household.id,
    householdName: household.name,
    addressLabel: household.addressLabel,
    siteName: site?.name ?? null,
    lat: household.lat,
    lon: household.lon,
    phone: household.phone ?? null,
    textsConsent: household.textsConsent,
    note: visit.note,
    promise: facts.promise,
    pets: facts.pets.map(({ pet, style, cautions }) => ({
      id: pet.id,
      name: pet.name,
      species: pet.species,
      breedName: breedNameOf(pet),
      weightGrams: pet.weightGrams ?? (pet.breedId ? middleGrams(findBreed(pet.breedId)) : 0),
      styleName: style.name,
      styleNotes: pet.styleNotes,
      temperament: pet.temperament,
      cautions,
      cautionNote: pet.cautionNote,
      vetName: pet.vetName,
      vetPhone: pet.vetPhone ?? null,
    })),
    steps: visit.forecast.steps,
    p10Seconds: visit.forecast.p10Seconds,
    p90Seconds: visit.forecast.p90Seconds,
    ...(visit.forecast.learning?.fitId && { learned: learnedOf(visit.forecast.learning) }),
  };
}

function learnedOf({ words, petVisits, learnedPermille }: VisitLearning) {
  return { words, petVisits, learnedPermille };
}

export function breedNameOf(pet: Pet): string {
  return pet.breedId
    ? findBreed(pet.breedId).name
    : pet.species === 'cat'
      ? 'Cat, mixed'
      : 'Dog, mixed';
}
