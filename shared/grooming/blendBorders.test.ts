import { describe, expect, it } from 'vitest';
import { blendBorders, borders, neighbours } from './blendBorders.ts';
import { bodyOf, regions } from './body.ts';
import type { Lengths } from './coatLengths.ts';
import { forecastPet } from './forecastPet.ts';
import { groomModel } from './groomModel.ts';
import { petLike } from './petLike.ts';
import { findStyle } from './styles.ts';
import type { Style } from './types.ts';

const even = Object.fromEntries(regions.map((region) => [region, 130])) as Lengths;
const clippedBack: Style['cuts'] = {
  back: { tool: 'blade', lengthTenthsMm: 32, direction: 'with' },
};

function found(lengths: Partial<Lengths>, cuts = clippedBack, weightGrams = 15_000) {
  return blendBorders(cuts, { ...even, ...lengths }, bodyOf(petLike({ weightGrams })), groomModel);
}

describe('blending along borders', () => {
  it('equal lengths, or one blade step apart, need none', () => {
    expect(found({})).toEqual([]);
    // 4F to 3F is one step
    expect(found({ back: 95 })).toEqual([]);
    expect(found({ back: 63 }).length).toBeGreaterThan(0);
  });

  it('one border worked out by hand: back against back legs', () => {
    // √0.6143 m² = 0.7838 m × 0.5 = 392 mm; #5F against #3F are two steps, one past the first.
    const it = found({ back: 63 }).find(({ between }) => between.includes('hindLegs'))!;
    expect(it).toEqual({ between: ['back', 'hindLegs'], lengthMm: 392, steps: 2, seconds: 20 });
  });

  it('minutes grow with the jump, up to a set line, and with the length of the border', () => {
    const seconds = (back: number, weightGrams = 15_000) =>
      found({ back }, clippedBack, weightGrams).reduce((sum, border) => sum + border.seconds, 0);
    expect(seconds(32)).toBeGreaterThan(seconds(63));
    expect(seconds(15)).toBe(seconds(2));
    // Four times the surface is twice the border: (60/7.5)^(2/3) = 4.
    expect(seconds(32, 60_000) / seconds(32, 7_500)).toBeCloseTo(2, 1);
  });

  it('two regions nobody cut are nobody’s border', () => {
    expect(found({ back: 32 }, {})).toEqual([]);
    const between = found({ back: 63, tail: 900 }).map((border) => border.between);
    expect(between).not.toContainEqual(['hindLegs', 'tail']);
    expect(between).toContainEqual(['back', 'tail']);
  });

  it('each border once, longest work first, neighbours both ways', () => {
    const names = borders.map(({ between }) => [...between].sort().join(' '));
    expect(new Set(names).size).toBe(borders.length);
    for (const region of regions) {
      for (const other of neighbours(region)) expect(neighbours(other)).toContain(region);
    }
    const work = found({ back: 32 }).map(({ seconds }) => seconds);
    expect(work).toEqual([...work].sort((a, b) => b - a));
  });

  it('a short body with full legs takes longer to blend than one length all over', () => {
    const blend = (styleId: string) =>
      forecastPet(petLike({}), findStyle(styleId)).steps.find(({ key }) => key === 'blend')!;
    expect(blend('lamb-legs').medianSeconds).toBeGreaterThan(
      2 * blend('half-inch-all-over').medianSeconds,
    );
  });
});
