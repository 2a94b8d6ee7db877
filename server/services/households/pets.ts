import { type AppError, badField, notFound } from '#server/errors.ts';
import { Pet } from '#server/models/Pet.ts';
import { breeds } from '#shared/grooming/breeds.ts';
import { cautions } from '#shared/grooming/cautions.ts';
import { forecastPet } from '#shared/grooming/forecastPet.ts';
import { type OwnStyle, styleForPet } from '#shared/grooming/styleForPet.ts';
import { findStyles } from '#server/services/styles/findStyles.ts';
import { addVersion, currentVersion, nothingOwn } from '#server/services/styles/petVersions.ts';
import { ownOf, stylesOf } from '#server/services/styles/stylesOf.ts';
import { needHousehold } from './households.ts';
import { petFactsOf } from './petFactsOf.ts';

export type PetInput = Pick<
  Pet,
  | 'name'
  | 'species'
  | 'breedId'
  | 'weightGrams'
  | 'coatType'
  | 'matting'
  | 'mattingByRegion'
  | 'undercoatLoad'
  | 'soil'
  | 'tableLimitMinutes'
  | 'temperament'
  | 'birthYear'
  | 'cautions'
  | 'cautionNote'
  | 'vetName'
  | 'vetPhone'
  | 'styleId'
  | 'styleNotes'
  | 'intervalWeeks'
>;

export const coatTypes = [
  'smooth', 'double', 'curly', 'drop', 'wire', 'combination', 'corded', 'hairless', 'catShort', 'catLong',
]; // prettier-ignore
export const temperaments = ['calm', 'restless', 'anxious', 'nippy'];

/** A new pet's style is its version 1. */
export async function createPet(
  householdId: string,
  input: PetInput,
  now: Date,
  madeBy = '',
): Promise<Pet> {
  await needHousehold(householdId);
  const pet = Pet.build({ householdId, ...input });
  await checkPet(pet, now, true);
  await pet.save();
  await addVersion(pet, 1, nothingOwn, now, madeBy);
  return pet;
}

export async function updatePet(
  petId: string,
  change: Partial<PetInput & { active: boolean }>,
  now: Date,
  madeBy = '',
): Promise<Pet> {
  const pet = await needPet(petId, true);
  const before = await currentVersion(pet);
  pet.set(change);
  const changed = pet.changed('styleId');
  await checkPet(pet, now, changed);
  if (changed || pet.changed('styleNotes')) {
    const own = changed ? nothingOwn : ownOf(before);
    if (before.isNewRecord) await before.save();
    await addVersion(pet, before.version + 1, own, now, madeBy);
  }
  return pet.save();
}

export async function needPet(petId: string, lock = false): Promise<Pet> {
  const pet = await Pet.findByPk(petId, { lock });
  if (!pet) throw notFound('pet');
  return pet;
}

/** Keys must be in the tables of shared/grooming, and the pet must have a forecast at all. */
export async function checkPet(
  pet: Pet,
  now: Date,
  styleIsNew: boolean,
  own: OwnStyle | null = null,
): Promise<void> {
  const breed = breeds.find((one) => one.id === pet.breedId);
  if (pet.breedId !== null && breed?.species !== pet.species)
    throw badField('breedId', `must be a ${pet.species} breed from the list, or none`);
  const found = (await findStyles([pet.styleId])).get(pet.styleId);
  if (found?.style.species !== pet.species || (styleIsNew && found.retired))
    throw badField('styleId', `must be a ${pet.species} style from the list`);
  if (pet.coatType !== null && !coatTypes.includes(pet.coatType))
    throw badField('coatType', `must be one of ${coatTypes.join(', ')}`);
  if (!temperaments.includes(pet.temperament))
    throw badField('temperament', `must be one of ${temperaments.join(', ')}`);
  const unknown = pet.cautions.find((key) => !cautions.some((one) => one.key === key));
  if (unknown) throw badField('cautions', `has an unknown entry, ${unknown}`);
  if (pet.breedId === null && pet.weightGrams === null)
    throw badField('weightGrams', 'is needed when no breed is chosen');
  // Crosses differ too much for a middle weight; a pet stored without one may still change its name.
  const told = pet.isNewRecord || pet.changed('breedId') || pet.changed('weightGrams');
  if (breed?.cross && pet.weightGrams === null && told)
    throw badField('weightGrams', `is needed for a cross such as ${breed.name.toLowerCase()}`);
  try {
    const style = own ? styleForPet(found.style, own) : (await stylesOf([pet]))(pet);
    forecastPet(petFactsOf(pet, now, null), style);
  } catch (error) {
    throw error instanceof RangeError ? asBadField(pet, error) : error;
  }
}

/** The model's errors begin with the name of the field. */
function asBadField(pet: Pet, { message }: RangeError): AppError {
  const [, field = '', words = ''] = /^(\w+) (.+?)\.?$/.exec(message) ?? [];
  return field in pet.dataValues ? badField(field, words) : badField('pet', message);
}
