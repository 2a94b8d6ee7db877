import { expect, test } from 'vitest';
import { forecastPet } from '#shared/grooming/forecastPet.ts';
import { findStyle, styles } from '#shared/grooming/styles.ts';
import { petFactsOf, type PetLike } from './petFactsOf.ts';
import { styleChoices } from './styleChoices.ts';

const fern: PetLike = {
  species: 'dog',
  breedId: 'labradoodle',
  weightGrams: 22_000,
  coatType: null,
  matting: 2,
  mattingByRegion: null,
  undercoatLoad: 0,
  soil: 1,
  tableLimitMinutes: null,
  temperament: 'restless',
  birthYear: 2022,
  cautions: ['feetShy'],
};

test('a form becomes the facts the model wants', () => {
  expect(petFactsOf(fern, '2026-03-03', '2026-04-14')).toMatchObject({
    breedId: 'labradoodle',
    weightGrams: 22_000,
    coatType: null,
    ageYears: 4,
    firstVisit: false,
    weeksSinceLast: 6,
    coatState: { matting: 2, soil: 1 },
    cautions: ['feetShy'],
  });
  expect(petFactsOf(fern, null, '2026-04-14')).toMatchObject({
    firstVisit: true,
    weeksSinceLast: null,
  });
});

test('mats in places, loose undercoat and the table limit reach the model', () => {
  const told = {
    ...fern,
    mattingByRegion: { ears: 3 as const },
    undercoatLoad: 2,
    tableLimitMinutes: 45,
  };
  expect(petFactsOf(told, null, '2026-04-14')).toMatchObject({
    coatState: { mattingByRegion: { ears: 3 }, undercoatLoad: 2 },
    tableLimitSeconds: 2700,
  });
  const halfTyped = { ...fern, mattingByRegion: {}, tableLimitMinutes: 4 };
  const facts = petFactsOf(halfTyped, null, '2026-04-14');
  if (typeof facts === 'string') throw new Error(facts);
  expect(facts.tableLimitSeconds).toBeNull();
  expect(facts.coatState).not.toHaveProperty('mattingByRegion');
});

test('what is still missing is said in words', () => {
  expect(petFactsOf({ ...fern, breedId: null, coatType: null }, null, '2026-04-14')).toBe(
    'Choose a breed, or give weight and coat, and the minutes show here.',
  );
  expect(petFactsOf({ ...fern, weightGrams: Number.NaN }, null, '2026-04-14')).toBe(
    'Give the weight as a number, and the minutes show here.',
  );
});

test('a year half typed does not break the forecast', () => {
  const facts = petFactsOf({ ...fern, birthYear: 20 }, null, '2026-04-14');
  expect(facts).toMatchObject({ ageYears: null });
  if (typeof facts === 'string') throw new Error(facts);
  expect(forecastPet(facts, findStyle('teddy')).steps.length).toBeGreaterThan(3);
});

test('styles: the usual ones of the breed first, what does not suit the coat last', () => {
  const choices = styleChoices(styles, 'dog', 'labradoodle', null);
  expect(choices[0]).toEqual({ value: 'teddy', label: expect.stringContaining(' · usual') });
  expect(choices.at(-1)?.label).toContain('not for this coat');
  expect(
    styleChoices(styles, 'cat', null, null).every(
      ({ value }) => findStyle(value).species === 'cat',
    ),
  ).toBe(true);
});
