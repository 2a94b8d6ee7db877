import { describe, expect, it } from 'vitest';
import { unsentWords } from './unsentWords.ts';

const times = {
  runs: [
    { vanId: 'a', leaveSeconds: 27_000, stops: [{ kind: 'visit' }] },
    { vanId: 'b', leaveSeconds: 36_000, stops: [{ kind: 'visit' }] },
    { vanId: 'c', leaveSeconds: 27_000, stops: [] },
  ],
} as never;
const problem = {
  vans: [
    { vanId: 'a', vanName: 'Otter' },
    { vanId: 'b', vanName: 'Plover' },
    { vanId: 'c', vanName: 'Curlew' },
  ],
};
const day = (sentAt: string | null) =>
  ({ problem, runs: ['a', 'b', 'c'].map((vanId) => ({ vanId, sentAt })) }) as never;

describe('unsentWords', () => {
  it('names vans with visits whose hour to leave is over', () => {
    expect(unsentWords(day(null), times, 30_000)).toBe(
      'Otter should have left and is not sent: times as planned',
    );
    expect(unsentWords(day(null), times, 40_000)).toBe(
      'Otter and Plover should have left and are not sent: times as planned',
    );
  });

  it('is silent before, once sent, and on other days', () => {
    expect(unsentWords(day(null), times, 20_000)).toBeNull();
    expect(unsentWords(day('2026-04-14T06:00:00Z'), times, 40_000)).toBeNull();
    expect(unsentWords(day(null), times, null)).toBeNull();
  });
});
