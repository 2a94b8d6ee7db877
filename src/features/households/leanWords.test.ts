import { expect, test } from 'vitest';
import { leanWords } from './leanWords.ts';

const visit = (forecastMinutes: number, clockMinutes: number) => ({
  forecastSeconds: forecastMinutes * 60,
  clockSeconds: clockMinutes * 60,
});

test('the lean of a pet in words', () => {
  expect(leanWords([visit(100, 110), visit(100, 106)])).toBe(
    'Last 2 visits: 8 % longer than forecast, 8 min each.',
  );
  expect(leanWords([visit(60, 48)])).toBe('Last visit: 20 % shorter than forecast, 12 min.');
  expect(leanWords([visit(100, 101), visit(100, 99)])).toBe('Last 2 visits: as forecast.');
});

test('only the newest eight count', () => {
  const past = [...Array.from({ length: 8 }, () => visit(60, 60)), visit(60, 600)];
  expect(leanWords(past)).toBe('Last 8 visits: as forecast.');
});
