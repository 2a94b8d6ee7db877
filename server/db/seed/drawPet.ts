import { breeds } from '#shared/grooming/breeds.ts';
import type { BreedFacts } from '#shared/grooming/types.ts';
import type { PetInput } from '#server/services/households/pets.ts';
import { pick } from './randomFor.ts';

/** Everyday breeds come up more often than the rest of the table. */
const everyday = [
  'bichon-frise', 'poodle-toy', 'poodle-miniature', 'shih-tzu', 'yorkshire-terrier', 'maltese', 'english-cocker',
  'cavalier', 'west-highland-terrier', 'miniature-schnauzer', 'golden-retriever', 'labrador', 'border-terrier', 'pug',
  'french-bulldog', 'lhasa-apso', 'cockapoo', 'cavapoo', 'maltipoo', 'springer-spaniel', 'pomeranian', 'havanese',
  'jack-russell-smooth', 'dachshund-smooth', 'shetland-sheepdog', 'chihuahua', 'cairn-terrier',
]; // prettier-ignore

const tempers = ['calm', 'calm', 'calm', 'calm', 'restless', 'restless', 'anxious', 'nippy'];

/** A pet as the model fixes it: breed, a weight inside the breed's range, coat and handling. */
export function drawPet(random: () => number, name: string, year: number): PetInput {
  const isCat = random() < 0.12;
  const pool = breeds.filter((breed) => breed.species === (isCat ? 'cat' : 'dog'));
  const usual = pool.filter((breed) => everyday.includes(breed.id));
  const breed = pick(random, !isCat && random() < 0.75 ? usual : pool);
  const age = 1 + Math.floor(random() * 13);
  const matting = random() < 0.8 ? 0 : random() < 0.7 ? 1 : random() < 0.8 ? 2 : 3;
  return {
    name,
    species: breed.species,
    breedId: breed.id,
    weightGrams: weightOf(random, breed),
    coatType: null,
    matting,
    mattingByRegion: null,
    undercoatLoad: 0,
    tableLimitMinutes: null,
    soil: random() < 0.8 ? 0 : 1,
    temperament: pick(random, tempers),
    birthYear: year - age,
    cautions: drawCautions(random, age),
    cautionNote: '',
    vetName: pick(random, ['Lantern Veterinary Hospital', 'Dunes Animal Clinic', '']),
    vetPhone: null,
    styleId: breed.usualStyleIds[random() < 0.7 ? 0 : Math.min(1, breed.usualStyleIds.length - 1)]!,
    styleNotes:
      random() < 0.25
        ? pick(random, ['Tail left long.', 'Round face.', 'Ears short.', 'Feet tight.'])
        : '',
    intervalWeeks: pick(random, [4, 4, 5]),
  };
}

function weightOf(random: () => number, breed: BreedFacts): number {
  const share = (random() + random()) / 2;
  return Math.round((breed.minGrams + share * (breed.maxGrams - breed.minGrams)) / 100) * 100;
}

function drawCautions(random: () => number, age: number): string[] {
  const keys: string[] = [];
  if (random() < 0.06) keys.push('bites');
  if (random() < 0.1) keys.push('feetShy');
  if (random() < 0.08) keys.push('dryerShy');
  if (age > 9 && random() < 0.25) keys.push('weakJoints');
  if (age > 9 && random() < 0.15) keys.push('heart');
  if (random() < 0.04) keys.push('allergy');
  return keys;
}
