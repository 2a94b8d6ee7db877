import type { Pet } from '#shared/api/pets.ts';
import { findBreed } from '#shared/grooming/breeds.ts';
import type { CautionKey, CoatState, PetFacts, Style } from '#shared/grooming/types.ts';
import { daysBetween } from '#shared/time/localDate.ts';

/** What of a pet's form the forecast reads. */
export type PetLike = Pick<
  Pet,
  | 'species'
  | 'breedId'
  | 'weightGrams'
  | 'coatType'
  | 'matting'
  | 'mattingByRegion'
  | 'undercoatLoad'
  | 'soil'
  | 'tableLimitMinutes'
  | 'temperament'
  | 'birthYear'
  | 'cautions'
>;

/**
 * The pet as the groom-minute model wants it, or the words of what is still missing. `lastVisitDate`
 * null means a first visit; `lastCuts` null, that the coat grew from the style it has now.
 */
export function petFactsOf(
  pet: PetLike,
  lastVisitDate: string | null,
  today: string,
  lastCuts: Style['cuts'] | null = null,
): PetFacts | string {
  const breed = pet.breedId ? findBreed(pet.breedId) : null;
  if (!breed && !(pet.weightGrams && pet.coatType))
    return 'Choose a breed, or give weight and coat, and the minutes show here.';
  if (Number.isNaN(pet.weightGrams) || (pet.weightGrams !== null && pet.weightGrams < 300))
    return 'Give the weight as a number, and the minutes show here.';
  const year = Number(today.slice(0, 4));
  const badYear = pet.birthYear !== null && !(pet.birthYear >= year - 40 && pet.birthYear <= year);
  return {
    species: pet.species,
    breedId: pet.breedId,
    weightGrams: pet.weightGrams,
    sizeClass: null,
    ageYears: pet.birthYear === null || badYear ? null : year - pet.birthYear,
    coatType: (pet.coatType as PetFacts['coatType']) ?? null,
    coatState: {
      matting: pet.matting as CoatState['matting'],
      ...(pet.mattingByRegion && Object.keys(pet.mattingByRegion).length > 0
        ? { mattingByRegion: pet.mattingByRegion as NonNullable<CoatState['mattingByRegion']> }
        : {}),
      undercoatLoad: pet.undercoatLoad as CoatState['undercoatLoad'],
      soil: pet.soil as CoatState['soil'],
      lengthTenthsMm: null,
    },
    temperament: pet.temperament as PetFacts['temperament'],
    cautions: pet.cautions as CautionKey[],
    firstVisit: lastVisitDate === null,
    weeksSinceLast:
      lastVisitDate === null
        ? null
        : Math.max(0, Math.floor(daysBetween(lastVisitDate, today) / 7)),
    lastCuts,
    tableLimitSeconds: tableLimitOf(pet.tableLimitMinutes),
  };
}

/** A limit half typed counts as none, so that the minutes stay. */
function tableLimitOf(minutes: number | null): number | null {
  return minutes !== null && minutes >= 10 && minutes <= 240 ? minutes * 60 : null;
}
