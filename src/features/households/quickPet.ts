import type { CoatType, Species, Temperament } from '#shared/grooming/types.ts';
import type { Where } from '#src/api/useWhere.ts';

/** A pet as it is told over the phone. */
export interface QuickPet {
  species: Species;
  breedId: string | null;
  weightGrams: number | null;
  coatType: CoatType | null;
  matting: number;
  undercoatLoad: number;
  soil: number;
  temperament: Temperament;
  ageYears: number | null;
  styleId: string;
  where: Where;
}

/** What the next screens are handed: the address for the household, then the pet for its form. */
export interface ToldByPhone {
  where: Where;
  pet: Omit<QuickPet, 'where'>;
}

export const quickStart: QuickPet = {
  species: 'dog',
  breedId: null,
  weightGrams: null,
  coatType: null,
  matting: 0,
  undercoatLoad: 0,
  soil: 0,
  temperament: 'calm',
  ageYears: null,
  styleId: '',
  where: { addressLabel: '', lat: null, lon: null },
};
