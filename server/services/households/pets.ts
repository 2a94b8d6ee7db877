import { type AppError, badField, notFound } from '#server/errors.ts';
import { Pet } from '#server/models/Pet.ts';
import { breeds } from '#shared/grooming/breeds.ts';
import { cautions } from '#shared/grooming/cautions.ts';
import { forecastPet } from '#shared/grooming/forecastPet.ts';
import { findStyle, styles } from '#shared/grooming/styles.ts';
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
  | 'soil'
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

export async function createPet(householdId: string, input: PetInput, now: Date): Promise<Pet> {
  await needHousehold(householdId);
  const pet = Pet.build({ householdId, ...input });
  checkPet(pet, now);
  return pet.save();
}

export async function updatePet(
  petId: string,
  change: Partial<PetInput & { active: boolean }>,
  now: Date,
): Promise<Pet> {
  const pet = await needPet(petId);
  pet.set(change);
  checkPet(pet, now);
  return pet.save();
}

export async function needPet(petId: string): Promise<Pet> {
  const pet = await Pet.findByPk(petId);
  if (!pet) throw notFound('pet');
  return pet;
}

/** Keys must be in the tables of shared/grooming, and the pet must have a forecast at all. */
function checkPet(pet: Pet, now: Date): void {
  const breed = breeds.find((one) => one.id === pet.breedId);
  if (pet.breedId !== null && breed?.species !== pet.species)
    throw badField('breedId', `must be a ${pet.species} breed from the list, or none`);
  const style = styles.find((one) => one.id === pet.styleId);
  if (style?.species !== pet.species)
    throw badField('styleId', `must be a ${pet.species} style from the list`);
  if (pet.coatType !== null && !coatTypes.includes(pet.coatType))
    throw badField('coatType', `must be one of ${coatTypes.join(', ')}`);
  if (!temperaments.includes(pet.temperament))
    throw badField('temperament', `must be one of ${temperaments.join(', ')}`);
  const unknown = pet.cautions.find((key) => !cautions.some((one) => one.key === key));
  if (unknown) throw badField('cautions', `has an unknown entry, ${unknown}`);
  if (pet.breedId === null && pet.weightGrams === null)
    throw badField('weightGrams', 'is needed when no breed is chosen');
  try {
    forecastPet(petFactsOf(pet, now, null), findStyle(pet.styleId));
  } catch (error) {
    throw error instanceof RangeError ? asBadField(pet, error) : error;
  }
}

/** The model's errors begin with the name of the field. */
function asBadField(pet: Pet, { message }: RangeError): AppError {
  const [, field = '', words = ''] = /^(\w+) (.+?)\.?$/.exec(message) ?? [];
  return field in pet.dataValues ? badField(field, words) : badField('pet', message);
}
