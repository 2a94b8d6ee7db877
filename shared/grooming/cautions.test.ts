import { describe, expect, it } from 'vitest';
import { cautionName, cautions, findCaution, notedCautions, standingCautions } from './cautions.ts';
import { forecastPet } from './forecastPet.ts';
import { petLike } from './petLike.ts';
import { findStyle } from './styles.ts';
import type { CautionKey, PetFacts } from './types.ts';

function keysOf(known: Partial<PetFacts>, styleId: string): CautionKey[] {
  return forecastPet(petLike(known), findStyle(styleId)).cautions.map(({ key }) => key);
}

describe('the cautions table', () => {
  it('has each key once, with words short enough for a card', () => {
    expect(new Set(cautions.map(({ key }) => key)).size).toBe(cautions.length);
    for (const { words } of cautions) {
      expect(words.length).toBeGreaterThan(15);
      expect(words.length).toBeLessThanOrEqual(110);
      expect(words).toMatch(/\.$/);
      expect(words).not.toMatch(/!/);
    }
  });

  it('stops, and sends to a vet, where a groomer must not go on', () => {
    for (const key of ['breathing', 'sedated', 'ringworm', 'openMouthCat', 'vomiting'] as const) {
      expect(findCaution(key)).toMatchObject({ stop: true, decides: 'vet' });
    }
  });

  it('shows standing rules while the step is under way', () => {
    const drying = standingCautions('dry', 'dog').map(({ key }) => key);
    expect(drying).toEqual(
      expect.arrayContaining(['neverAlone', 'dryerFace', 'dryerNoise', 'carbonMonoxide']),
    );
    expect(drying).not.toContain('hotBlade');
    expect(standingCautions('clip', 'dog').map(({ key }) => key)).toContain('hotBlade');
    expect(standingCautions('nails', 'dog').map(({ key }) => key)).not.toContain('catBite');
    expect(standingCautions('nails', 'cat').map(({ key }) => key)).toContain('catBite');
  });

  it('offers what may be noted on a pet, each under a short name of its own', () => {
    const names = notedCautions().map(cautionName);
    expect(names).toContain('Afraid of the dryer');
    expect(names).toContain('Heart condition');
    expect(new Set(names).size).toBe(names.length);
    for (const name of names) expect(name.length).toBeLessThan(35);
    expect(notedCautions().map(({ key }) => key)).not.toContain('shortNosed');
  });

  it('refuses a key it does not know', () => {
    expect(() => findCaution('moonlight' as CautionKey)).toThrow(/"moonlight"/);
  });
});

describe('cautions that follow from the pet', () => {
  it('short-nosed breeds, old and young pets, cats', () => {
    expect(keysOf({ breedId: 'pug', coatType: null }, 'bath-and-brush')).toEqual(['shortNosed']);
    expect(keysOf({ ageYears: 11 }, 'teddy')).toEqual(['senior']);
    expect(keysOf({ ageYears: 9 }, 'teddy')).toEqual([]);
    expect(keysOf({ ageYears: 9, weightGrams: 40_000 }, 'teddy')).toEqual(['senior']);
    expect(keysOf({ ageYears: 0 }, 'teddy')).toEqual(['young']);
    const cat = { species: 'cat', breedId: 'bengal', coatType: null, weightGrams: null } as const;
    expect(keysOf(cat, 'cat-nails')).toEqual(['catHandling']);
  });

  it('a double coat cut short needs consent; a bath does not', () => {
    const golden = { breedId: 'golden-retriever', coatType: null, weightGrams: null };
    expect(keysOf(golden, 'short-all-over')).toEqual(['doubleCoatShort']);
    expect(keysOf(golden, 'bath-and-deshed')).toEqual([]);
  });

  it('stop signs come first, each caution once', () => {
    const known = { ageYears: 11, cautions: ['allergy', 'sedated', 'allergy'] } as const;
    expect(keysOf(known, 'teddy')).toEqual(['sedated', 'allergy', 'senior']);
  });

  it('stitches bar the bath and the dryer, and with them the water', () => {
    const it = forecastPet(petLike({ cautions: ['stitches'] }), findStyle('teddy'));
    const keys = it.steps.map(({ key }) => key);
    expect(keys).not.toContain('bath');
    expect(keys).not.toContain('dry');
    expect(it.waterMl).toBe(0);
  });

  it('a dryer-shy pet is dried by hand, and the step says so', () => {
    const it = forecastPet(petLike({ cautions: ['dryerShy'] }), findStyle('teddy'));
    const dry = it.steps.find(({ key }) => key === 'dry')!;
    expect(dry.reasons.find(({ text }) => text === 'dried by hand')!.deltaSeconds).toBeGreaterThan(
      300,
    );
  });
});
