import type {
  CautionKey,
  CoatType,
  MattingLevel,
  PetFacts,
  Style,
  Temperament,
} from '#shared/grooming/types.ts';
import type { Pet } from '#server/models/Pet.ts';

/**
 * What the groom-minute model needs, from a pet's row. `lastVisitDate` null = first visit; `lastCuts`
 * null = the coat has grown from the style asked for.
 */
export function petFactsOf(
  pet: Pet,
  on: Date,
  lastVisitDate: string | null,
  lastCuts: Style['cuts'] | null = null,
): PetFacts {
  const weeks = lastVisitDate
    ? Math.max(0, Math.floor((on.getTime() - Date.parse(lastVisitDate)) / (7 * 86_400_000)))
    : null;
  return {
    species: pet.species,
    breedId: pet.breedId ?? null,
    weightGrams: pet.weightGrams ?? null,
    ageYears: pet.birthYear == null ? null : ageOn(on, pet.birthYear),
    coatType: (pet.coatType ?? null) as CoatType | null,
    coatState: {
      matting: pet.matting as MattingLevel,
      ...(pet.mattingByRegion && Object.keys(pet.mattingByRegion).length > 0
        ? { mattingByRegion: pet.mattingByRegion }
        : {}),
      undercoatLoad: (pet.undercoatLoad ?? 0) as 0 | 1 | 2,
      soil: pet.soil as 0 | 1 | 2,
      lengthTenthsMm: null,
    },
    temperament: pet.temperament as Temperament,
    cautions: pet.cautions as CautionKey[],
    firstVisit: lastVisitDate === null,
    weeksSinceLast: weeks,
    lastCuts,
    tableLimitSeconds: pet.tableLimitMinutes == null ? null : pet.tableLimitMinutes * 60,
  };
}

/** The model knows ages from 0 to 40; a slip in the year must not stop a booking. */
function ageOn(on: Date, birthYear: number): number {
  return Math.min(40, Math.max(0, on.getUTCFullYear() - birthYear));
}
