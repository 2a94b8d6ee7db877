import { describe, expect, it } from 'vitest';
import { durationWords } from './durationWords.ts';
import { explain, reasonWords } from './explain.ts';
import { forecastPet } from './forecastPet.ts';
import { goodCoat, petLike } from './petLike.ts';
import { regionWords } from './regionWords.ts';
import { findStyle } from './styles.ts';

describe('words', () => {
  it('minutes up to an hour, then hours and minutes', () => {
    expect(durationWords(2_640)).toBe('44 min');
    expect(durationWords(8_040)).toBe('2 h 14');
    expect(durationWords(3_900)).toBe('1 h 05');
    expect(durationWords(7_200)).toBe('2 h');
    // 59.6 min rounds to the hour, not to "60 min"
    expect(durationWords(3_576)).toBe('1 h');
  });

  it('a reason carries its sign', () => {
    expect(reasonWords({ text: 'matting', deltaSeconds: 720 })).toBe('+12 min: matting');
    expect(reasonWords({ text: 'smooth coat', deltaSeconds: -540 })).toBe('−9 min: smooth coat');
  });

  it('both pairs of legs are legs', () => {
    expect(regionWords(['head', 'foreLegs', 'hindLegs', 'tail'])).toBe('legs, head and tail');
    expect(regionWords(['hindLegs'])).toBe('back legs');
    expect(regionWords([])).toBe('');
  });
});

describe('explain', () => {
  it('tells the whole and why each step is longer', () => {
    const coatState = { ...goodCoat, matting: 2 as const };
    const pet = petLike({ weightGrams: 15_000, coatState, temperament: 'restless' });
    const told = explain(forecastPet(pet, findStyle('teddy')));
    expect(told.summary).toMatch(/^\d h \d\d, 8 in 10 between \d h( \d\d)? and \d h \d\d$/);
    const step = (label: string) => told.steps.find((each) => each.label === label)!;
    expect(step('mats, before the bath').why).toEqual(['+12 min: matting']);
    expect(step('scissor legs, feet and tail').why).toEqual([
      '−5 min: one guide-comb pass first',
      '+4 min: restless',
    ]);
    expect(step('scissor head and ears').why).toEqual(['+3 min: restless at the face']);
    expect(told.notes).toEqual(['one guide-comb pass over legs saves 2 min']);
    expect(step('ears').why).toEqual([]);
  });
});
