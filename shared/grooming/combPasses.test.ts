import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bodyOf } from './body.ts';
import { coatLengths } from './coatLengths.ts';
import { combPlanOf, scissorWork } from './combPasses.ts';
import { forecastPet } from './forecastPet.ts';
import { groomModel, type GroomModel } from './groomModel.ts';
import { petLike } from './petLike.ts';
import { findStyle } from './styles.ts';
import type { PetFacts } from './types.ts';

const lambLegs = findStyle('lamb-legs');

function hindLegs(known: Partial<PetFacts>, model: GroomModel = groomModel) {
  const pet = petLike(known);
  const body = bodyOf(pet);
  const arrival = coatLengths(pet, lambLegs, body, model);
  return scissorWork('hindLegs', lambLegs, arrival, body, model, 1, 1);
}

function mostPasses(passes: number): GroomModel {
  return { ...groomModel, guideComb: { ...groomModel.guideComb, mostPasses: passes } };
}

describe('guide comb against scissors', () => {
  it('one region, worked out by hand: 15 kg, back legs, six weeks', () => {
    // 0.6143 m² × 330 ‰ = 0.2027 m². Alone 120 + 0.2027 × (950 + 1500) = 616.7 s; one pass costs
    // 15 + 0.2027 × 330 = 81.9 s and takes 60 % of the bulk, 0.2027 × 900 = 182.4 s. A second would
    // take 73.0 s for 81.9: one pass.
    const it = hindLegs({});
    expect(it.passes).toBe(1);
    expect(it.aloneSeconds).toBeCloseTo(616.7, 0);
    expect(it.afterSeconds).toBeCloseTo(434.3, 0);
    expect(it.passSeconds).toBeCloseTo(81.9, 0);
    expect(combPlanOf([it], 1, 1)).toEqual({
      passes: 1,
      byRegion: [{ region: 'hindLegs', passes: 1 }],
      savedSeconds: 101,
      words: 'one guide-comb pass over back legs saves 2 min',
    });
  });

  it('finds the number with the least total, and returns fall', () => {
    const weeks = fc.integer({ min: 0, max: 60 });
    fc.assert(
      fc.property(weeks, fc.integer({ min: 2_000, max: 80_000 }), (weeksSinceLast, weightGrams) => {
        const pet = { weeksSinceLast, weightGrams };
        const found = hindLegs(pet);
        const bulk = found.aloneSeconds - found.fixedSeconds;
        expect(bulk).toBeGreaterThan(0);
        const m2 =
          (bodyOf(petLike(pet)).surfaceCm2 * bodyOf(petLike(pet)).shares.hindLegs) / 10_000;
        const finish = found.fixedSeconds + m2 * groomModel.scissor.perM2Seconds;
        const total = (passes: number) =>
          finish + (found.aloneSeconds - finish) * 0.4 ** passes + passes * found.passSeconds;
        const totals = [0, 1, 2, 3, 4].map(total);
        expect(total(found.passes)).toBeCloseTo(Math.min(...totals), 6);
        for (const n of [1, 2, 3]) {
          expect(total(n - 1) - total(n)).toBeGreaterThan(total(n) - total(n + 1));
        }
      }),
    );
  });

  it('saves what the whole forecast saves against a groomer with scissors alone', () => {
    for (const styleId of ['lamb-legs', 'scissored-curly']) {
      const pet = petLike({ weightGrams: 25_000, weeksSinceLast: 12 });
      const with_ = forecastPet(pet, findStyle(styleId));
      const without = forecastPet(pet, findStyle(styleId), { model: mostPasses(0) });
      expect(without.combPlan).toBeNull();
      const saved = without.medianSeconds - with_.medianSeconds;
      // The sum's median is a little under the sum of medians, hence the tenth.
      expect(with_.combPlan!.savedSeconds / saved).toBeGreaterThan(0.9);
      expect(with_.combPlan!.savedSeconds / saved).toBeLessThan(1.1);
    }
  });

  it('pays more on a large dog and an overgrown coat, not at all on feathers or a fresh cut', () => {
    const saved = (known: Partial<PetFacts>, styleId = 'scissored-curly') =>
      forecastPet(petLike(known), findStyle(styleId)).combPlan?.savedSeconds ?? 0;
    expect(saved({ weightGrams: 30_000 })).toBeGreaterThan(saved({ weightGrams: 5_000 }));
    expect(saved({ weeksSinceLast: 26 })).toBeGreaterThan(saved({ weeksSinceLast: 6 }));
    expect(saved({ coatType: 'combination' }, 'spaniel-outline')).toBe(0);
    expect(saved({ weeksSinceLast: 0 })).toBe(0);
  });

  it('longer away never makes scissors and comb together shorter', () => {
    const work = (weeksSinceLast: number) =>
      forecastPet(petLike({ weeksSinceLast }), findStyle('scissored-curly'))
        .steps.filter(({ key }) => key === 'comb' || key === 'scissor')
        .reduce((sum, { medianSeconds }) => sum + medianSeconds, 0);
    for (let weeks = 0; weeks < 60; weeks += 1) {
      expect(work(weeks + 1)).toBeGreaterThanOrEqual(work(weeks) - 2);
    }
  });

  it('tells it in the step: the pass in the comb, the minutes off in the scissors', () => {
    const it = forecastPet(petLike({}), lambLegs);
    const step = (key: string) => it.steps.find((each) => each.key === key)!;
    expect(step('comb').reasons.map(({ text }) => text)).toContain(
      'one guide-comb pass before scissors',
    );
    const told = step('scissor').reasons.find(({ text }) => text === 'one guide-comb pass first')!;
    expect(told.deltaSeconds).toBeLessThan(-200);
  });
});
