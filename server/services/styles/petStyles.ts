import { type OwnStyle, styleForPet } from '#shared/grooming/styleForPet.ts';
import type { Style } from '#shared/grooming/types.ts';
import type { PetStyle } from '#server/models/PetStyle.ts';
import { Photo } from '#server/models/Photo.ts';
import { checkPet, needPet } from '#server/services/households/pets.ts';
import { findStyles } from './findStyles.ts';
import { addVersion, allVersions, currentVersion } from './petVersions.ts';
import { ownOf } from './stylesOf.ts';

/** A version of a pet's style with the style it makes, and its photos, oldest first. */
export interface VersionFacts {
  row: PetStyle;
  style: Style;
  photos: Photo[];
}

export interface PetStyleInput extends OwnStyle {
  styleId: string;
  notes: string;
}

/** Newest first; never empty. */
export async function listPetStyles(petId: string): Promise<VersionFacts[]> {
  const rows = await allVersions(await needPet(petId));
  const [styles, photos] = await Promise.all([
    findStyles(rows.map((row) => row.styleId)),
    Photo.findAll({
      where: { petStyleId: rows.map((row) => row.id) },
      order: [
        ['takenAt', 'ASC'],
        ['id', 'ASC'],
      ],
    }),
  ]);
  return rows.map((row) => ({
    row,
    style: styleForPet(styles.get(row.styleId)!.style, ownOf(row)),
    photos: photos.filter((photo) => photo.petStyleId === row.id),
  }));
}

/** From now on the pet is forecast with this version; visits already booked keep their minutes. */
export async function addPetStyle(
  petId: string,
  input: PetStyleInput,
  now: Date,
  madeBy: string,
): Promise<VersionFacts> {
  const pet = await needPet(petId, true);
  const before = await currentVersion(pet);
  pet.set({ styleId: input.styleId, styleNotes: input.notes });
  await checkPet(pet, now, pet.changed('styleId'), input);
  if (before.isNewRecord) await before.save();
  const row = await addVersion(pet, before.version + 1, input, now, madeBy);
  await pet.save();
  const { style } = (await findStyles([input.styleId])).get(input.styleId)!;
  return { row, style: styleForPet(style, input), photos: [] };
}
