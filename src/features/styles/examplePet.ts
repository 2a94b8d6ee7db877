import { breeds } from '#shared/grooming/breeds.ts';
import type { BreedFacts, PetFacts, Style } from '#shared/grooming/types.ts';

/**
 * A pet to show a style's minutes on: the first everyday breed whose usual style it is, else one
 * whose coat it suits, of middle weight, calm, six weeks after its last groom.
 */
export function examplePet(
  style: Pick<Style, 'id' | 'species' | 'coats'> & { basedOn?: string | null },
): {
  facts: PetFacts;
  words: string;
} {
  const ofSpecies = breeds.filter(({ species }) => species === style.species);
  const usual = (breed: BreedFacts) =>
    breed.usualStyleIds.includes(style.id) || breed.usualStyleIds.includes(style.basedOn ?? '');
  const suits = (breed: BreedFacts) => style.coats.includes(breed.coatType);
  const everyday = (breed: BreedFacts) => EVERYDAY.includes(breed.id);
  const breed =
    ofSpecies.find((one) => everyday(one) && usual(one) && suits(one)) ??
    ofSpecies.find((one) => everyday(one) && suits(one)) ??
    ofSpecies.find(usual) ??
    ofSpecies.find(suits) ??
    ofSpecies[0]!;
  const weightGrams = Math.round((breed.minGrams + breed.maxGrams) / 2);
  return {
    facts: {
      species: style.species,
      breedId: breed.id,
      weightGrams,
      ageYears: 4,
      coatState: { matting: 0, undercoatLoad: 0, soil: 0, lengthTenthsMm: null },
      temperament: 'calm',
      cautions: [],
      firstVisit: false,
      weeksSinceLast: 6,
    },
    words: `${breed.name}, ${Math.round(weightGrams / 100) / 10} kg`,
  };
}

/** Breeds every groomer knows, so that the minutes mean something to them. */
const EVERYDAY = [
  'labradoodle',
  'cockapoo',
  'labrador',
  'golden-retriever',
  'shih-tzu',
  'border-terrier',
  'english-cocker',
  'poodle-miniature',
  'domestic-short-hair',
  'domestic-long-hair',
  'persian',
];
