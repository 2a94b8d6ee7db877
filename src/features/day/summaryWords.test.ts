import { describe, expect, it } from 'vitest';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { sampleDay } from './sampleDay.ts';
import { summaryWords } from './summaryWords.ts';

const day = sampleDay();
const times = evaluateDay(day.problem, day.plan);

describe('summaryWords', () => {
  it('says the day in the design’s order', () => {
    const facts = {
      ...times,
      workSeconds: 43_500,
      driveSeconds: 9_060,
      driveMetres: 88_200,
      promisesSafe: 16,
      promisesAtRisk: 1,
    };
    const words = summaryWords(day.plan, facts, 'km');
    expect(words.title).toBe('3 vans, 13 visits');
    expect(words.parts.map((part) => part.words)).toEqual([
      '12 h 05 grooming',
      '2 h 31 driving',
      '88 km',
      '16 of 17 promises safe',
      '1 at risk',
      '2 not placed',
    ]);
  });
  it('writes miles for a business that drives miles', () => {
    const parts = summaryWords(day.plan, { ...times, driveMetres: 88_200 }, 'mi').parts;
    expect(parts[2]!.words).toBe('55 mi');
  });
  it('says nothing of promises on a day without any', () => {
    const none = { ...times, promisesSafe: 0, promisesAtRisk: 0 };
    expect(summaryWords(day.plan, none, 'km').parts).toHaveLength(4);
  });
  it('says a day without vans short', () => {
    expect(summaryWords({ runs: [], notPlaced: ['a'] }, times, 'km')).toEqual({
      title: 'No vans',
      parts: [{ words: '1 not placed', tone: 'plain' }],
    });
  });
  it('counts of a past day what was done', () => {
    const stop = (state: 'done' | 'ahead', onTimePermille: number) => ({
      ...times.runs[0]!.stops[0]!,
      state,
      onTimePermille,
    });
    const past = {
      ...times,
      runs: [
        { ...times.runs[0]!, stops: [stop('done', 1000), stop('done', 0), stop('ahead', 950)] },
      ],
    };
    const words = summaryWords(day.plan, past, 'km', true).parts.map((part) => part.words);
    expect(words).toContain('1 of 2 promises kept');
    expect(words).toContain('1 not kept');
  });
});
