import { expect, test } from 'vitest';
import { petStart } from './petStart.ts';

test('a new pet begins as the call told it, the age as a birth year', () => {
  const told = {
    species: 'dog' as const,
    breedId: 'cockapoo',
    weightGrams: 9_000,
    coatType: null,
    matting: 1,
    undercoatLoad: 2,
    soil: 0,
    temperament: 'anxious' as const,
    ageYears: 3,
    styleId: 'teddy',
  };
  const start = petStart(null, told, 2026);
  expect(start).toMatchObject({
    name: '',
    breedId: 'cockapoo',
    matting: 1,
    undercoatLoad: 2,
    birthYear: 2023,
  });
  expect(start).not.toHaveProperty('ageYears');
  expect(petStart(null, null, 2026)).toMatchObject({ breedId: null, birthYear: null, styleId: '' });
});
