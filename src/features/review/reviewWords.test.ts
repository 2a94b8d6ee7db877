import { describe, expect, it } from 'vitest';
import {
  groomPerDrive,
  hoursWords,
  keptWords,
  leanWords,
  reviewHeadline,
  weekWords,
} from './reviewWords.ts';

const totals = {
  groomSeconds: 61 * 3600 + 20 * 60,
  scissorSeconds: 0,
  driveSeconds: 13 * 3600 + 15 * 60,
  waitSeconds: 0,
  driveMetres: 0,
  visits: 40,
  promises: 41,
  promisesKept: 38,
};

describe('the week in words', () => {
  it('leads with grooming per hour of driving', () => {
    // 61 h 20 over 13 h 15 is 4.63.
    expect(reviewHeadline(totals)).toBe('For every hour of driving, 4.6 hours of grooming');
    expect(reviewHeadline({ ...totals, driveSeconds: 0 })).toBe(
      '61 h 20 of grooming without driving',
    );
    expect(reviewHeadline({ ...totals, groomSeconds: 0, driveSeconds: 0 })).toBe(
      'No finished visit this week',
    );
    expect(groomPerDrive(totals)).toBe('4.6');
  });
  it('writes hours, shares and leans', () => {
    expect(hoursWords(59 * 60 + 29)).toBe('59 min');
    expect(hoursWords(4 * 3600 + 5 * 60)).toBe('4 h 05');
    expect(keptWords(totals)).toBe('93 %');
    expect(keptWords({ ...totals, promises: 0 })).toBeNull();
    expect([102, -12, 3].map(leanWords)).toEqual(['+10 %', '−1 %', '0 %']);
  });
  it('writes a week within a month, over its end and in another year', () => {
    expect(weekWords('2026-04-06', '2026-04-12', 2026)).toBe('6–12 April');
    expect(weekWords('2026-03-30', '2026-04-05', 2026)).toBe('30 March – 5 April');
    expect(weekWords('2025-12-29', '2026-01-04', 2025)).toBe('29 December – 4 January 2026');
  });
});
