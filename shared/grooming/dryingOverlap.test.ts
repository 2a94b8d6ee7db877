import { describe, expect, it } from 'vitest';
import { dryingOverlap } from './dryingOverlap.ts';
import { forecastPet } from './forecastPet.ts';
import { forecastVisit } from './forecastVisit.ts';
import { petLike } from './petLike.ts';
import { findStyle } from './styles.ts';
import type { PetFacts } from './types.ts';

const bath = findStyle('bath-and-brush');
const labrador: Partial<PetFacts> = { breedId: 'labrador', coatType: null, weightGrams: 30_000 };

function overlap(known: Partial<PetFacts>) {
  const pet = petLike({ ...labrador, ...known });
  const next = forecastPet(petLike(labrador), bath);
  return dryingOverlap(pet, forecastPet(pet, bath), next);
}

describe('drying in sight while the next pet is prepared', () => {
  it('saves the air part of drying, at most the next pet’s prep, less a look every ten minutes', () => {
    const pet = petLike(labrador);
    const steps = forecastPet(pet, bath).steps;
    const dry = steps.find(({ key }) => key === 'dry')!.medianSeconds;
    const prep = steps.filter(({ family }) => family === 'prep');
    const together = Math.min(
      Math.round(dry * 0.4),
      prep.reduce((sum, { medianSeconds }) => sum + medianSeconds, 0),
    );
    expect(overlap({})).toEqual({
      seconds: together - 60 * Math.ceil(together / 600),
      refused: null,
    });
  });

  it.each<[string, Partial<PetFacts>]>([
    ['short-nosed', { breedId: 'boxer' }],
    ['old', { ageYears: 11 }],
    ['young', { ageYears: 0 }],
    ['anxious', { temperament: 'anxious' }],
    ['ill', { cautions: ['heart'] }],
    ['seizures', { cautions: ['seizures'] }],
    ['dryer-shy', { cautions: ['dryerShy'] }],
  ])('never for a pet that is %s', (_, known) => {
    expect(overlap(known).seconds).toBe(0);
    expect(overlap(known).refused).toMatch(/never left to dry/);
  });

  it('never for a cat, and nothing to gain with a coat dried under the brush', () => {
    const cat = petLike({ species: 'cat', breedId: 'ragdoll', coatType: null, weightGrams: null });
    const it = forecastPet(cat, findStyle('cat-bath-and-comb'));
    expect(dryingOverlap(cat, it, it).refused).toMatch(/cat/);
    expect(overlap({ breedId: null, coatType: 'curly' }).seconds).toBe(0);
  });

  it('is off unless the business allows it', () => {
    const two = ['a', 'b'].map((petId) => ({
      petId,
      name: petId,
      pet: petLike(labrador),
      style: bath,
    }));
    const usual = forecastVisit(two);
    const allowed = forecastVisit(two, { overlapDrying: true });
    expect(usual.overlapSeconds).toBe(0);
    expect(allowed.overlapSeconds).toBe(overlap({}).seconds);
    expect(allowed.work.meanSeconds).toBe(usual.work.meanSeconds - allowed.overlapSeconds);
  });
});
