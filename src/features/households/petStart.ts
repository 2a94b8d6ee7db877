import type { z } from 'zod';
import type { createPet, Pet } from '#shared/api/pets.ts';

/** What a pet's form begins with. */
export function petStart(pet: Pet | null): z.input<typeof createPet.body> {
  return {
    name: pet?.name ?? '',
    species: pet?.species ?? 'dog',
    breedId: pet?.breedId ?? null,
    weightGrams: pet?.weightGrams ?? null,
    coatType: pet?.coatType ?? null,
    matting: pet?.matting ?? 0,
    soil: pet?.soil ?? 0,
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
