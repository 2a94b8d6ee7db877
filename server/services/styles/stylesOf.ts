import { styleForPet } from '#shared/grooming/styleForPet.ts';
import { findStyle } from '#shared/grooming/styles.ts';
import type { Style } from '#shared/grooming/types.ts';
import type { Pet } from '#server/models/Pet.ts';
import { PetStyle } from '#server/models/PetStyle.ts';
import { findStyles } from './findStyles.ts';

/** The style that counts for a pet: its own or the starting style, with the pet's changes. */
export type StyleOf = (pet: Pick<Pet, 'id' | 'styleId'>) => Style;

/** The styles of a list of pets in two queries, however many pets. Ask only for pets of the list. */
export async function stylesOf(pets: readonly Pick<Pet, 'id' | 'styleId'>[]): Promise<StyleOf> {
  const styles = await findStyles(pets.map((pet) => pet.styleId));
  const versions = await PetStyle.findAll({
    where: { petId: [...new Set(pets.map((pet) => pet.id))] },
    order: [['version', 'ASC']],
  });
  const newest = new Map(versions.map((version) => [version.petId, version]));
  return (pet) => {
    const style = styles.get(pet.styleId)?.style ?? findStyle(pet.styleId);
    const version = newest.get(pet.id);
    // A pet about to get another style has no changes to it yet.
    return styleForPet(style, version?.styleId === pet.styleId ? ownOf(version) : null);
  };
}

export function ownOf(version: PetStyle) {
  return {
    ownCuts: version.ownCuts ?? null,
    ownFinish: version.ownFinish ?? null,
    ownServices: version.ownServices ?? null,
    ownPlanB: version.ownPlanB ?? null,
  };
}
