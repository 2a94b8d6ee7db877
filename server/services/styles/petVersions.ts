import type { OwnStyle } from '#shared/grooming/styleForPet.ts';
import type { Pet } from '#server/models/Pet.ts';
import { PetStyle } from '#server/models/PetStyle.ts';

/** As the style says. */
export const nothingOwn: OwnStyle = {
  ownCuts: null,
  ownFinish: null,
  ownServices: null,
  ownPlanB: null,
};

/**
 * The version that counts. A pet from before versions were kept has its version 1 by its fields: a
 * row not saved yet (`isNewRecord`), to be saved before anything refers to it.
 */
export async function currentVersion(pet: Pet): Promise<PetStyle> {
  const newest = await PetStyle.findOne({
    where: { petId: pet.id },
    order: [['version', 'DESC']],
  });
  return newest ?? firstVersion(pet);
}

/** All versions, newest first; never empty. */
export async function allVersions(pet: Pet): Promise<PetStyle[]> {
  const rows = await PetStyle.findAll({
    where: { petId: pet.id },
    order: [['version', 'DESC']],
  });
  return rows.length > 0 ? rows : [firstVersion(pet)];
}

/** Adds a version from the pet's present style and notes. Call with the pet's row locked or new. */
export function addVersion(
  pet: Pet,
  version: number,
  own: OwnStyle,
  now: Date,
  madeBy: string,
): Promise<PetStyle> {
  return PetStyle.create({
    petId: pet.id,
    version,
    styleId: pet.styleId,
    ownCuts: own.ownCuts,
    ownFinish: own.ownFinish,
    ownServices: own.ownServices && [...own.ownServices],
    ownPlanB: own.ownPlanB,
    notes: pet.styleNotes,
    madeAt: now,
    madeBy,
  });
}

function firstVersion(pet: Pet): PetStyle {
  return PetStyle.build({
    petId: pet.id,
    version: 1,
    styleId: pet.styleId,
    notes: pet.styleNotes,
    madeAt: null,
    madeBy: '',
  });
}
