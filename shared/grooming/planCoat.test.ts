import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { forecastPet } from './forecastPet.ts';
import { goodCoat, petLike } from './petLike.ts';
import { findStyle } from './styles.ts';
import type { CoatState, MattingLevel, PetFacts } from './types.ts';

const teddy = findStyle('teddy');

function matted(state: Partial<CoatState>, known: Partial<PetFacts> = {}) {
  return forecastPet(petLike({ coatState: { ...goodCoat, ...state }, ...known }), teddy);
}

function mats(it: ReturnType<typeof matted>): number {
  return it.steps.find(({ key }) => key === 'mats')?.medianSeconds ?? 0;
}

describe('mats', () => {
  it('light +5 min, moderate +10–15 on a medium dog (salon policies)', () => {
    expect(mats(matted({ matting: 0 }))).toBe(0);
    expect(Math.round(mats(matted({ matting: 1 })) / 60)).toBe(5);
    expect(mats(matted({ matting: 2 })) / 60).toBeGreaterThanOrEqual(10);
    expect(mats(matted({ matting: 2 })) / 60).toBeLessThanOrEqual(15);
  });

  it('heavy and pelted coats are clipped short with consent, never brushed out', () => {
    for (const matting of [3, 4] as const) {
      const it = matted({ matting });
      expect(mats(it)).toBe(0);
      expect(it.planChange).toMatchObject({ kind: 'clipShort', needsConsent: true });
      expect(it.planChange!.words).toMatch(/^Clip short with consent/);
      const off = it.steps.find(({ key }) => key === 'clipOff')!;
      // 15–30 min extra, before the bath
      expect(off.medianSeconds / 60).toBeGreaterThanOrEqual(15);
      expect(off.medianSeconds / 60).toBeLessThanOrEqual(30);
      const keys = it.steps.map(({ key }) => key);
      expect(keys.indexOf('clipOff')).toBeLessThan(keys.indexOf('bath'));
      expect(it.cautions.map(({ key }) => key)).toEqual(
        expect.arrayContaining(['matLimit', 'skinAfterMats']),
      );
    }
  });

  it('most of the scissor finish falls away with the coat', () => {
    const scissor = (it: ReturnType<typeof matted>) =>
      it.steps.find(({ key }) => key === 'scissor')!.medianSeconds;
    expect(scissor(matted({ matting: 4 }))).toBeLessThan(0.6 * scissor(matted({ matting: 0 })));
  });

  it('young and old pets bear 10 min: moderate mats then mean clipping short', () => {
    expect(matted({ matting: 2 }, { ageYears: 4 }).planChange).toBeNull();
    expect(matted({ matting: 2 }, { ageYears: 0 }).planChange).not.toBeNull();
    expect(matted({ matting: 2 }, { ageYears: 12 }).planChange).not.toBeNull();
    expect(matted({ matting: 1 }, { ageYears: 12 }).planChange).toBeNull();
  });

  it('only the regions that need it are clipped', () => {
    const it = matted({ mattingByRegion: { hindLegs: 4, ears: 1 } });
    expect(it.planChange!.regions).toEqual(['hindLegs']);
    expect(mats(it)).toBeGreaterThan(0);
    const step = it.steps.find(({ key }) => key === 'mats')!;
    expect(step.reasons[0]!.text).toBe('matting: ears');
  });

  it('smooth, bare and corded coats have no mats to work on', () => {
    for (const coatType of ['smooth', 'hairless', 'corded'] as const) {
      expect(matted({ matting: 4 }, { coatType }).planChange).toBeNull();
    }
  });

  it('mat work already done today counts: what is left of the limit binds', () => {
    const pet = petLike({ coatState: { ...goodCoat, matting: 1 } });
    expect(forecastPet(pet, teddy, { matSecondsUsed: 0 }).planChange).toBeNull();
    const used = forecastPet(pet, teddy, { matSecondsUsed: 700 });
    expect(used.planChange!.words).toMatch(/15 min of mat work a visit are used up/);
    expect(used.steps.some(({ key }) => key === 'mats')).toBe(false);
    expect(() => forecastPet(pet, teddy, { matSecondsUsed: -1 })).toThrow(/matSecondsUsed/);
  });

  it('never plans past the humane limit, whatever the mats, size and age', () => {
    const level = fc.constantFrom<MattingLevel>(0, 1, 2, 3, 4);
    fc.assert(
      fc.property(
        level,
        fc.option(fc.record({ ears: level, belly: level, hindLegs: level, back: level })),
        fc.integer({ min: 1_000, max: 90_000 }),
        fc.integer({ min: 0, max: 18 }),
        fc.boolean(),
        (matting, byRegion, weightGrams, ageYears, firstVisit) => {
          const state = byRegion ? { matting, mattingByRegion: byRegion } : { matting };
          const it = matted(state, { weightGrams, ageYears, firstVisit, temperament: 'nippy' });
          const gentle = ageYears < 1 || ageYears >= (weightGrams > 30_000 ? 8 : 10);
          const step = it.steps.find(({ key }) => key === 'mats');
          expect(step?.meanSeconds ?? 0).toBeLessThanOrEqual(gentle ? 600 : 900);
        },
      ),
    );
  });
});
