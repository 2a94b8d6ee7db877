import { findBreed, middleGrams } from './breeds.ts';
import type {
  BreedFacts,
  CoatType,
  PetFacts,
  Region,
  SizeClass,
  Species,
  WeightFrom,
} from './types.ts';

/** A pet's body as the model needs it, settled from what is known about the pet. */
export interface Body {
  species: Species;
  breed: BreedFacts | null;
  weightGrams: number;
  weightFrom: WeightFrom;
  /** SD of the log of the weight × 1000: 0 when weighed, else from the range it was guessed in. */
  weightSpreadPermille: number;
  coatType: CoatType;
  undercoat: boolean;
  surfaceCm2: number;
  /** Shares of the surface by region; they add to 1 but for floating-point dust. */
  shares: Record<Region, number>;
}

export const regions: readonly Region[] = [
  'head',
  'ears',
  'neck',
  'back',
  'belly',
  'foreLegs',
  'hindLegs',
  'feet',
  'tail',
  'sanitary',
];

/**
 * Settles weight, coat and surface. A weight given beats the breed's middle weight, which beats a
 * size class; for a cross the size class beats the middle. A coat given beats the breed's.
 * @throws RangeError naming the field that is missing or out of range and what would be right.
 */
export function bodyOf(pet: PetFacts): Body {
  const breed = pet.breedId === null ? null : findBreed(pet.breedId);
  if (breed && breed.species !== pet.species) {
    throw new RangeError(
      `breedId "${breed.id}" is a ${breed.species}, but species is ${pet.species}.`,
    );
  }
  const weight = weightOf(pet, breed);
  const coatType = pet.coatType ?? breed?.coatType;
  if (!coatType) {
    throw new RangeError(
      'coatType is missing: without a breed, name the coat (for example "curly").',
    );
  }
  return {
    species: pet.species,
    breed,
    ...weight,
    coatType,
    undercoat: coatType === 'double' || (breed?.undercoat ?? false),
    surfaceCm2: surfaceCm2(pet.species, weight.weightGrams),
    shares: regionShares(breed?.regionPermille ?? {}),
  };
}

/**
 * Body surface by the Meeh form k·W^(2/3), W in grams, area in cm², rounded to whole cm².
 * k = 10.1 for dogs (veterinary oncology's usual constant) and 10.0 for cats (from memory).
 * Real dogs scatter −9 % to +19 % about it (Girens et al., J Vet Intern Med 2019).
 */
export function surfaceCm2(species: Species, weightGrams: number): number {
  return Math.round(MEEH_K[species] * Math.cbrt(weightGrams) ** 2);
}

/**
 * Shares of the surface by region, after the rule of nines of veterinary burn care: head and neck
 * 9 %, each foreleg 9, each hind leg 18, back 18, belly 18, the rest tail and perineum (recalled
 * from memory). The finer split of head and neck, and of feet from legs, is our own guess.
 * `permille` scales single regions (large ears, plumed tail) before shares are taken.
 */
export function regionShares(
  permille: Partial<Record<Region, number>> = {},
): Record<Region, number> {
  const raw = regions.map((region) => NINES_PERMILLE[region] * (permille[region] ?? 1000));
  const total = raw.reduce((sum, part) => sum + part, 0);
  const shares = { ...NINES_PERMILLE };
  regions.forEach((region, index) => {
    shares[region] = raw[index]! / total;
  });
  return shares;
}

/** Guide weights where neither weight nor breed is known. */
export const sizeClassGrams: Record<Species, Record<SizeClass, number>> = {
  dog: { small: 5_000, medium: 15_000, large: 30_000, giant: 50_000 },
  cat: { small: 3_000, medium: 4_500, large: 6_500, giant: 9_000 },
};

const MEEH_K: Record<Species, number> = { dog: 10.1, cat: 10 };

const NINES_PERMILLE: Record<Region, number> = {
  head: 45,
  ears: 12,
  neck: 33,
  back: 180,
  belly: 180,
  foreLegs: 160,
  hindLegs: 330,
  feet: 50,
  tail: 7,
  sanitary: 3,
};

/** A size class spans about 2.5 times between its ends: ln 2.5 / 3.29. */
const SIZE_CLASS_SPREAD = 279;

/** Wider than any sound pet: catches grams typed as kilograms and the reverse. */
const WEIGHT_LIMITS: Record<Species, [number, number]> = {
  dog: [400, 120_000],
  cat: [400, 20_000],
};

type Weight = Pick<Body, 'weightGrams' | 'weightFrom' | 'weightSpreadPermille'>;

function weightOf(pet: PetFacts, breed: BreedFacts | null): Weight {
  if (pet.weightGrams !== null) {
    const [least, most] = WEIGHT_LIMITS[pet.species];
    if (!Number.isInteger(pet.weightGrams) || pet.weightGrams < least || pet.weightGrams > most) {
      throw new RangeError(
        `weightGrams must be whole grams from ${least} to ${most} for a ${pet.species}, got ${pet.weightGrams}.`,
      );
    }
    return { weightGrams: pet.weightGrams, weightFrom: 'given', weightSpreadPermille: 0 };
  }
  if (pet.sizeClass && (breed === null || breed.cross)) {
    const weightGrams = sizeClassGrams[pet.species][pet.sizeClass];
    return { weightGrams, weightFrom: 'size', weightSpreadPermille: SIZE_CLASS_SPREAD };
  }
  if (breed) {
    return {
      weightGrams: middleGrams(breed),
      weightFrom: breed.cross ? 'cross' : 'breed',
      // The usual range is taken to hold nine in ten adults, 3.29 SDs.
      weightSpreadPermille: Math.round((1000 * Math.log(breed.maxGrams / breed.minGrams)) / 3.29),
    };
  }
  throw new RangeError('weightGrams is missing: give a weight, a breed or a size class.');
}
