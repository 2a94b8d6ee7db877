import type { CoatState, PetFacts } from './types.ts';

/** A coat in good order: what a forecast starts from when nothing is known against it. */
export const goodCoat: CoatState = { matting: 0, undercoatLoad: 0, soil: 0, lengthTenthsMm: null };

/**
 * A calm, grown, 15 kg curly dog in good order, seen six weeks ago, but for what is given. For a
 * quick forecast on the phone, where most answers are "the usual", and for tests.
 */
export function petLike(known: Partial<PetFacts>): PetFacts {
  return {
    species: 'dog',
    breedId: null,
    weightGrams: 15_000,
    sizeClass: null,
    ageYears: 4,
    coatType: 'curly',
    coatState: goodCoat,
    temperament: 'calm',
    cautions: [],
    firstVisit: false,
    weeksSinceLast: 6,
    ...known,
  };
}
