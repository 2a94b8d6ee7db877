import { describe, expect, it } from 'vitest';
import { blades, leftTenthsMm, shortestDefaultTenthsMm } from './blades.ts';
import { breeds, findBreed } from './breeds.ts';
import { findStyle, styles } from './styles.ts';

describe('starting styles', () => {
  it('are at least 14, with an id and a name of their own', () => {
    expect(styles.length).toBeGreaterThanOrEqual(14);
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

describe('breed table', () => {
  it('holds at least 60 dogs and 12 cats, ids once, sensible ranges, known styles', () => {
    expect(breeds.filter(({ species }) => species === 'dog').length).toBeGreaterThanOrEqual(60);
    expect(breeds.filter(({ species }) => species === 'cat').length).toBeGreaterThanOrEqual(12);
    expect(new Set(breeds.map(({ id }) => id)).size).toBe(breeds.length);
    for (const breed of breeds) {
      expect(breed.minGrams).toBeLessThan(breed.maxGrams);
      expect(breed.maxGrams / breed.minGrams).toBeLessThanOrEqual(3);
      expect(breed.usualStyleIds.length).toBeGreaterThan(0);
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
