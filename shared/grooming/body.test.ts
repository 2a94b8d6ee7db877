import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bodyOf, regions, regionShares, surfaceCm2 } from './body.ts';
import { forecastPet } from './forecastPet.ts';
import { petLike } from './petLike.ts';
import { findStyle } from './styles.ts';

describe('surfaceCm2', () => {
  // k·W^(2/3) worked out apart from the code, W in grams: 0.101 × kg^(2/3) m² for dogs.
  it.each([
    [1_000, 0.101],
    [2_000, 0.16033],
    [5_000, 0.29532],
    [10_000, 0.4688],
    [15_000, 0.6143],
    [30_000, 0.97515],
    [50_000, 1.37078],
  ])('a dog of %i g has %f m², to 0.1 %%', (grams, m2) => {
    expect(surfaceCm2('dog', grams) / 10_000 / m2).toBeGreaterThan(0.999);
    expect(surfaceCm2('dog', grams) / 10_000 / m2).toBeLessThan(1.001);
  });

  it.each([
    [2_000, 0.159],
    [3_000, 0.208],
    [4_000, 0.252],
    [5_000, 0.292],
    [6_000, 0.33],
    [8_000, 0.4],
  ])('a cat of %i g has %f m² (k = 10.0)', (grams, m2) => {
    expect(surfaceCm2('cat', grams) / 10_000).toBeCloseTo(m2, 3);
  });

  // Appendix "weight to body surface area (dogs)" of the classic veterinary manual (Merck type),
  // recalled from memory: it fits k = 10.0 rounded down, so ours may lie up to 0.02 m² from it.
  it.each([
    [500, 0.06],
    [1_000, 0.1],
    [2_000, 0.15],
    [3_000, 0.2],
    [4_000, 0.25],
    [5_000, 0.29],
    [7_000, 0.36],
    [10_000, 0.46],
    [15_000, 0.6],
    [20_000, 0.74],
    [25_000, 0.85],
    [30_000, 0.96],
    [35_000, 1.07],
    [40_000, 1.17],
    [45_000, 1.26],
    [50_000, 1.36],
  ])('the table gives %i g %f m², ours within 0.02', (grams, m2) => {
    expect(Math.abs(surfaceCm2('dog', grams) / 10_000 - m2)).toBeLessThanOrEqual(0.02);
  });

  it('grows with weight, in whole cm²', () => {
    const grams = fc.integer({ min: 400, max: 119_000 });
    fc.assert(
      fc.property(grams, fc.integer({ min: 50, max: 1_000 }), (weight, more) => {
        expect(surfaceCm2('dog', weight + more)).toBeGreaterThan(surfaceCm2('dog', weight));
        expect(Number.isInteger(surfaceCm2('cat', weight))).toBe(true);
      }),
    );
  });
});

describe('regionShares', () => {
  it('follows the rule of nines: head and neck 9 %, legs 54, back 18, belly 18, rest 1', () => {
    const share = regionShares();
    expect(share.head + share.ears + share.neck).toBeCloseTo(0.09, 12);
    expect(share.foreLegs + share.hindLegs + share.feet).toBeCloseTo(0.54, 12);
    expect(share.back).toBeCloseTo(0.18, 12);
    expect(share.belly).toBeCloseTo(0.18, 12);
    expect(share.tail + share.sanitary).toBeCloseTo(0.01, 12);
  });

  it('still adds to the whole pet when ears are large', () => {
    const share = regionShares({ ears: 2500 });
    expect(regions.reduce((sum, region) => sum + share[region], 0)).toBeCloseTo(1, 12);
    expect(share.ears).toBeGreaterThan(2 * regionShares().ears);
  });
});

describe('bodyOf', () => {
  it('lets a weight beat the breed, the breed beat a size class', () => {
    const pug = { breedId: 'pug', coatType: null, sizeClass: 'giant' } as const;
    expect(bodyOf(petLike({ ...pug, weightGrams: 8_100 })).weightGrams).toBe(8_100);
    // √(6 × 9) kg
    expect(bodyOf(petLike({ ...pug, weightGrams: null })).weightGrams).toBe(7_348);
    const cross = { breedId: null, weightGrams: null, sizeClass: 'large' } as const;
    expect(bodyOf(petLike(cross)).weightGrams).toBe(30_000);
  });

  it('asks for a cross’s weight: a size class beats its middle, and a guess says so', () => {
    const cross = { breedId: 'goldendoodle', coatType: null, weightGrams: null } as const;
    expect(bodyOf(petLike(cross))).toMatchObject({ weightGrams: 22_583, weightFrom: 'cross' });
    const large = bodyOf(petLike({ ...cross, sizeClass: 'large' }));
    expect(large).toMatchObject({ weightGrams: 30_000, weightFrom: 'size' });
    // ln(34/15) / 3.29
    expect(bodyOf(petLike(cross)).weightSpreadPermille).toBe(249);
    expect(bodyOf(petLike({ weightGrams: 20_000 })).weightSpreadPermille).toBe(0);
    expect(bodyOf(petLike({ ...cross, breedId: 'pug' })).weightFrom).toBe('breed');
  });

  it('a guessed weight widens the forecast, not its middle', () => {
    const style = findStyle('teddy');
    const guessed = forecastPet(petLike({ breedId: 'cockapoo', weightGrams: null }), style);
    const weighed = forecastPet(
      petLike({ breedId: 'cockapoo', weightGrams: guessed.heaviestGrams }),
      style,
    );
    expect([guessed.weightFrom, weighed.weightFrom]).toEqual(['cross', 'given']);
    expect(guessed.steps.map((step) => step.medianSeconds)).toEqual(
      weighed.steps.map((step) => step.medianSeconds),
    );
    expect(guessed.varianceSeconds2).toBeGreaterThan(weighed.varianceSeconds2 * 1.1);
  });

  it('says which field is wrong and what would be right', () => {
    const none = { breedId: null, weightGrams: null, sizeClass: null };
    expect(() => bodyOf(petLike(none))).toThrow('weightGrams is missing: give a weight, a breed');
    expect(() => bodyOf(petLike({ breedId: null, coatType: null }))).toThrow(/coatType is missing/);
    expect(() => bodyOf(petLike({ weightGrams: 22 }))).toThrow(/weightGrams must be whole grams/);
    expect(() => bodyOf(petLike({ breedId: 'unicorn' }))).toThrow(/breedId "unicorn"/);
    expect(() => bodyOf(petLike({ species: 'cat', breedId: 'pug' }))).toThrow(/is a dog/);
  });
});
