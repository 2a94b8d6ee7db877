import { findBreed } from '#shared/grooming/breeds.ts';
import type { Style } from '#shared/grooming/types.ts';
import type { Pet } from '#server/models/Pet.ts';

/** "curly, teddy": the group a lean is told for and a new pet borrows from. */
export function coatStyleOf(pet: Pick<Pet, 'coatType' | 'breedId'>, style: Style): string {
  const coat = pet.coatType ?? (pet.breedId ? findBreed(pet.breedId).coatType : 'unknown');
  const words: Record<string, string> = {
    catShort: 'short-haired cat',
    catLong: 'long-haired cat',
  };
  return `${words[coat] ?? coat}, ${style.name.toLowerCase()}`;
}
