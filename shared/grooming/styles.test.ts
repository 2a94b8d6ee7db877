import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bladeSteps, blades, leftTenthsMm, shortestDefaultTenthsMm } from './blades.ts';
import { breeds, findBreed } from './breeds.ts';
import { findStyle, styles } from './styles.ts';

describe('starting styles', () => {
  it('are at least 25, with an id and a name of their own', () => {
    expect(styles.length).toBeGreaterThanOrEqual(25);
    expect(new Set(styles.map(({ id }) => id)).size).toBe(styles.length);
    expect(new Set(styles.map(({ name }) => name)).size).toBe(styles.length);
  });

  it('never use the shortest blades by default', () => {
    for (const { cuts } of styles) {
      for (const cut of Object.values(cuts)) {
        const length = 'lengthTenthsMm' in cut ? (cut.lengthTenthsMm ?? Infinity) : Infinity;
        expect(length).toBeGreaterThanOrEqual(shortestDefaultTenthsMm);
      }
    }
  });

  it('each say for every service and region what stays when the pet has had enough', () => {
    for (const style of styles) {
      const { services, regions } = style.planB!;
      expect(Object.keys(services).sort()).toEqual([...style.services].sort());
      const cut = Object.entries(style.cuts).filter(([, { tool }]) => tool !== 'leave');
      expect(Object.keys(regions).sort()).toEqual(cut.map(([region]) => region).sort());
    }
    expect(findStyle('teddy').planB!.services.nails).toBe('must');
    expect(findStyle('teddy').planB!.regions).toMatchObject({
      back: 'must',
      hindLegs: 'ifAllowed',
      tail: 'leave',
    });
  });

  it('findStyle says which id it does not know', () => {
    expect(findStyle('teddy').name).toMatch(/^Teddy/);
    expect(() => findStyle('mohawk')).toThrow(/styleId "mohawk"/);
  });
});

describe('blades', () => {
  it('leave strictly less as the number rises (suppliers’ charts agree on the order)', () => {
    const lengths = blades.map(({ lengthTenthsMm }) => lengthTenthsMm);
    expect(lengths).toEqual([...new Set(lengths)].sort((a, b) => a - b));
    expect(blades.map(({ label }) => Number.parseInt(label, 10))).toEqual([
      50, 40, 30, 15, 10, 9, 8, 7, 5, 4, 3,
    ]);
  });

  it('leave about twice as much with growth', () => {
    expect(leftTenthsMm({ lengthTenthsMm: 32, direction: 'against' })).toBe(32);
    expect(leftTenthsMm({ lengthTenthsMm: 32, direction: 'with' })).toBe(64);
  });
});

describe('guide combs and steps between lengths', () => {
  it('a comb with growth leaves a little more, never twice as much', () => {
    const comb = { tool: 'comb', lengthTenthsMm: 130 } as const;
    expect(leftTenthsMm({ ...comb, direction: 'against' })).toBe(130);
    expect(leftTenthsMm({ ...comb, direction: 'with' })).toBe(150);
  });

  it('counts places on the ladder: #10 to #7F are three, #7F to #5F one', () => {
    expect(bladeSteps(15, 32)).toBeCloseTo(3, 12);
    expect(bladeSteps(63, 32)).toBeCloseTo(1, 12);
    expect(bladeSteps(45, 45)).toBe(0);
    // Past the longest comb: 320 / 220 to the step
    expect(bladeSteps(320, (320 * 320) / 220)).toBeCloseTo(1, 12);
  });

  it('is symmetric, adds up along the ladder, and knows lengths under the shortest blade', () => {
    const length = fc.integer({ min: 0, max: 3000 });
    fc.assert(
      fc.property(length, length, length, (one, two, three) => {
        const [a, b, c] = [one, two, three].sort((x, y) => x - y) as [number, number, number];
        expect(bladeSteps(a, b)).toBeCloseTo(bladeSteps(b, a), 12);
        expect(bladeSteps(a, b) + bladeSteps(b, c)).toBeCloseTo(bladeSteps(a, c), 9);
      }),
    );
  });
});

describe('breed table', () => {
  it('holds at least 150 dogs and 25 cats, ids once, sensible ranges, known styles', () => {
    expect(breeds.filter(({ species }) => species === 'dog').length).toBeGreaterThanOrEqual(150);
    expect(breeds.filter(({ species }) => species === 'cat').length).toBeGreaterThanOrEqual(25);
    expect(new Set(breeds.map(({ id }) => id)).size).toBe(breeds.length);
    for (const breed of breeds) {
      expect(breed.minGrams).toBeLessThan(breed.maxGrams);
      expect(breed.maxGrams / breed.minGrams).toBeLessThanOrEqual(3);
      expect(breed.usualStyleIds.length).toBeGreaterThan(0);
      expect(breed.shortNosed).toBe(breed.headShape === 'short');
      for (const styleId of breed.usualStyleIds) {
        expect(findStyle(styleId).species).toBe(breed.species);
      }
    }
  });

  it('keeps sizes of poodle, schnauzer and dachshund apart', () => {
    const grams = (id: string) => findBreed(id).maxGrams;
    expect(grams('poodle-toy')).toBeLessThan(grams('poodle-miniature'));
    expect(grams('poodle-medium')).toBeLessThan(grams('poodle-standard'));
    expect(grams('miniature-schnauzer')).toBeLessThan(grams('standard-schnauzer'));
    expect(findBreed('dachshund-wire').coatType).toBe('wire');
    expect(findBreed('dachshund-long').coatType).toBe('combination');
  });
});
