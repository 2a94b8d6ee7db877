import { describe, expect, it } from 'vitest';
import { forecastPet, type ForecastOptions } from './forecastPet.ts';
import { pacelessSteps } from './handling.ts';
import { goodCoat, petLike } from './petLike.ts';
import { findStyle } from './styles.ts';
import type { PetFacts, StepKey } from './types.ts';

function steps(known: Partial<PetFacts>, options?: ForecastOptions) {
  const it = forecastPet(petLike(known), findStyle('teddy'), options);
  return new Map(it.steps.map((step) => [step.key, step]));
}

function times(known: Partial<PetFacts>, key: StepKey): number {
  return steps(known).get(key)!.medianSeconds / steps({}).get(key)!.medianSeconds;
}

function feet(known: Partial<PetFacts>): number {
  return steps(known)
    .get('scissor')!
    .sections!.find(({ region }) => region === 'feet')!.medianSeconds;
}

describe('temper by step', () => {
  it('a restless pet costs most in scissor work at face and feet', () => {
    const restless = { temperament: 'restless' } as const;
    const head = times(restless, 'head');
    for (const key of ['nails', 'bath', 'dry', 'brush', 'comb', 'scissor', 'blend'] as const) {
      expect(times(restless, key)).toBeLessThan(head);
    }
    expect(feet(restless) / feet({})).toBeCloseTo(1.4, 1);
    expect(feet(restless) / feet({})).toBeGreaterThan(times(restless, 'scissor'));
  });

  it('an anxious pet costs most in drying, nails and feet', () => {
    const anxious = { temperament: 'anxious' } as const;
    const worst = Math.min(
      times(anxious, 'dry'),
      times(anxious, 'nails'),
      feet(anxious) / feet({}),
    );
    for (const key of ['ears', 'bath', 'brush', 'comb', 'scissor', 'head', 'blend'] as const) {
      expect(times(anxious, key)).toBeLessThan(worst);
    }
  });

  it('sections add to the scissor step and follow the order of work', () => {
    for (const temperament of ['calm', 'restless', 'anxious', 'nippy'] as const) {
      const scissor = steps({ temperament, firstVisit: true }).get('scissor')!;
      const sum = scissor.sections!.reduce((total, { medianSeconds }) => total + medianSeconds, 0);
      expect(sum).toBe(scissor.medianSeconds);
      expect(scissor.sections!.map(({ region }) => region)).toEqual([
        'hindLegs',
        'foreLegs',
        'feet',
        'tail',
      ]);
    }
  });
});

describe('rests', () => {
  it('an old pet lies down for three minutes after every forty', () => {
    const it = forecastPet(petLike({ ageYears: 12 }), findStyle('teddy'));
    const rest = it.steps.find(({ key }) => key === 'rest')!;
    expect(rest.medianSeconds).toBe(Math.floor(it.tableSeconds / 2_400) * 180);
    expect(rest.medianSeconds).toBeGreaterThan(0);
    expect(rest.reasons[0]!.text).toBe('rests for an old pet');
    expect(steps({}).has('rest')).toBe(false);
  });

  it('several reasons to rest are one rest: the one that asks for most', () => {
    const both = steps({ ageYears: 12, cautions: ['heart', 'weakJoints'] }).get('rest')!;
    expect(both.reasons.map(({ text }) => text)).toEqual(['rests for the heart']);
  });

  it('rests and mat work are the pet’s: no pace touches them', () => {
    const known = { ageYears: 12, coatState: { ...goodCoat, matting: 1 as const } };
    const pace = { prep: 1400, wash: 1400, dry: 1400, clip: 1400, scissor: 1400, wrap: 1400 };
    const usual = steps(known);
    const slow = steps(known, { paceByFamilyPermille: pace });
    for (const key of pacelessSteps) {
      const told = slow.get(key)!.reasons.map(({ text }) => text);
      expect(told).not.toContain('groomer’s pace');
    }
    expect(slow.get('mats')!.medianSeconds).toBe(usual.get('mats')!.medianSeconds);
    expect(slow.get('dry')!.medianSeconds).toBeGreaterThan(usual.get('dry')!.medianSeconds);
  });
});
