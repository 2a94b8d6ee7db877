import type { z } from 'zod';
import type { createPet, Pet } from '#shared/api/pets.ts';
import type { ToldByPhone } from './quickPet.ts';

/** What a pet's form begins with; `told` is what a call told of a new one, in the year `thisYear`. */
export function petStart(
  pet: Pet | null,
  told: ToldByPhone['pet'] | null,
  thisYear: number,
): z.input<typeof createPet.body> {
  if (!pet && told) {
    const { ageYears, ...fields } = told;
    const birthYear = ageYears === null ? null : thisYear - ageYears;
    return { ...petStart(null, null, thisYear), ...fields, birthYear };
  }
  return {
    name: pet?.name ?? '',
    species: pet?.species ?? 'dog',
    breedId: pet?.breedId ?? null,
    weightGrams: pet?.weightGrams ?? null,
    coatType: pet?.coatType ?? null,
    matting: pet?.matting ?? 0,
    mattingByRegion: pet?.mattingByRegion ?? null,
    undercoatLoad: pet?.undercoatLoad ?? 0,
    soil: pet?.soil ?? 0,
    tableLimitMinutes: pet?.tableLimitMinutes ?? null,
    temperament: pet?.temperament ?? 'calm',
    birthYear: pet?.birthYear ?? null,
    cautions: pet?.cautions ?? [],
    cautionNote: pet?.cautionNote ?? '',
    vetName: pet?.vetName ?? '',
    vetPhone: pet?.vetPhone ?? null,
    styleId: pet?.styleId ?? '',
    styleNotes: pet?.styleNotes ?? '',
    intervalWeeks: pet?.intervalWeeks ?? 6,
  };
}
