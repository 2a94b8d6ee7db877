import { describe, expect, it } from 'vitest';
import { bodyOf } from './body.ts';
import { coatLengths, lengthsAfter } from './coatLengths.ts';
import { forecastPet } from './forecastPet.ts';
import { groomModel } from './groomModel.ts';
import { goodCoat, petLike } from './petLike.ts';
import { findStyle } from './styles.ts';
import type { PetFacts } from './types.ts';

function lengths(known: Partial<PetFacts>, styleId: string) {
  const pet = petLike(known);
  return coatLengths(pet, findStyle(styleId), bodyOf(pet), groomModel);
}

describe('coat length on arrival', () => {
  it('grows half an inch a month from the last cut (common practice)', () => {
    // #5F with growth leaves 12.6 mm; eight weeks at 2.9 mm a week.
    const it = lengths({ weeksSinceLast: 8 }, 'lamb-legs');
    expect(it.back).toBe(126 + 8 * 29);
    expect((8 * 29) / 10 / 25.4).toBeCloseTo((8 / 52) * 12 * 0.5, 1);
  });

  it('grows from the style it was cut in, not from the one asked for', () => {
    const lastCuts = findStyle('short-all-over').cuts;
    const it = lengths({ weeksSinceLast: 4, lastCuts }, 'scissored-curly');
    expect(it.back).toBe(64 + 4 * 29);
  });

  it('stops at the length the coat reaches by itself', () => {
    const double = { coatType: 'double', weeksSinceLast: 200 } as const;
    expect(
      lengths({ ...double, lastCuts: { back: findStyle('teddy').cuts.back! } }, 'bath-and-brush')
        .back,
    ).toBe(500);
    expect(lengths({ coatType: 'smooth' }, 'bath-and-brush').back).toBe(150);
  });

  it('a coat kept long on purpose is long, one merely not named is as usual', () => {
    expect(lengths({ coatType: 'drop' }, 'long-coat-kept').back).toBe(2200);
    expect(lengths({ coatType: 'drop' }, 'bath-and-brush').back).toBe(440);
  });

  it('what was measured beats what was grown, a region beats the whole pet', () => {
    const coatState = { ...goodCoat, lengthTenthsMm: 700, lengthByRegionTenthsMm: { tail: 1200 } };
    const it = lengths({ coatState }, 'teddy');
    expect(it.back).toBe(700);
    expect(it.tail).toBe(1200);
  });
});

describe('coat length after the cut', () => {
  it('is what the tool leaves, never longer than before, feet as the legs', () => {
    const before = lengths({}, 'short-all-over');
    const after = lengthsAfter(findStyle('short-all-over').cuts, before, groomModel);
    expect(after.back).toBe(64);
    expect(after.hindLegs).toBe(126);
    expect(after.feet).toBe(126);
    const short = lengthsAfter(findStyle('teddy').cuts, { ...before, back: 40 }, groomModel);
    expect(short.back).toBe(40);
  });
});

describe('what the coat state changes', () => {
  const minutes = (known: Partial<PetFacts>, key: string, styleId = 'teddy') =>
    forecastPet(petLike(known), findStyle(styleId)).steps.find((step) => step.key === key)!
      .medianSeconds / 60;

  it('a longer coat of the same pet takes longer to dry and brush, and says why', () => {
    const long = { coatState: { ...goodCoat, lengthTenthsMm: 1200 } };
    expect(minutes(long, 'dry')).toBeGreaterThan(minutes({}, 'dry'));
    expect(minutes(long, 'brush')).toBeGreaterThan(minutes({}, 'brush'));
    const it = forecastPet(petLike(long), findStyle('teddy'));
    expect(it.steps.find(({ key }) => key === 'dry')!.reasons.map(({ text }) => text)).toContain(
      'long coat',
    );
  });

  it('undercoat and dirt count by the part of the body they are on', () => {
    const coat = (over: Partial<PetFacts['coatState']>) => ({
      coatType: 'double' as const,
      coatState: { ...goodCoat, ...over },
    });
    const none = minutes(coat({}), 'brush', 'bath-and-deshed');
    const breeches = minutes(
      coat({ undercoatLoadByRegion: { hindLegs: 2 } }),
      'brush',
      'bath-and-deshed',
    );
    const whole = minutes(coat({ undercoatLoad: 2 }), 'brush', 'bath-and-deshed');
    // Back legs are a third of the surface: a third of the whole difference.
    expect((breeches - none) / (whole - none)).toBeCloseTo(0.33, 1);
    const muddyLegs = coat({ soilByRegion: { feet: 2, foreLegs: 2, hindLegs: 2, belly: 2 } });
    expect(minutes(muddyLegs, 'bath')).toBeGreaterThan(minutes(coat({}), 'bath') * 1.3);
    expect(minutes(muddyLegs, 'bath')).toBeLessThan(minutes(coat({ soil: 2 }), 'bath'));
  });

  it('names a length or load out of range', () => {
    const coatState = { ...goodCoat, lengthByRegionTenthsMm: { tail: -1 } };
    expect(() => forecastPet(petLike({ coatState }), findStyle('teddy'))).toThrow(
      /lengthByRegionTenthsMm.tail/,
    );
    const load = { ...goodCoat, undercoatLoadByRegion: { back: 5 as 2 } };
    expect(() => forecastPet(petLike({ coatState: load }), findStyle('teddy'))).toThrow(
      /undercoatLoadByRegion.back/,
    );
  });
});
