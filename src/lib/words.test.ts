import { expect, test } from 'vitest';
import { safePlace } from './safePlace.ts';
import { writeCount, writeDate, writeDelta, writeList, writeSpan } from './words.ts';

test('lengths read like the design sheet', () => {
  expect([0, 48 * 60, 8040, 3600, 3599].map(writeSpan)).toEqual([
    '0 min',
    '48 min',
    '2 h 14',
    '1 h 00',
    '1 h 00',
  ]);
  expect(writeSpan(-600)).toBe('−10 min');
  expect([540, -180, 0].map(writeDelta)).toEqual(['+9', '−3', '+0']);
});

test('dates, lists and counts', () => {
  expect(writeDate('2026-04-14')).toBe('Tuesday 14 April');
  expect(writeDate('2026-04-14', 'short')).toBe('Tue 14 Apr');
  expect(writeDate('2025-12-31', 'long', 2026)).toBe('Wednesday 31 December 2025');
  expect(writeList([])).toBe('');
  expect(writeList(['Moss'])).toBe('Moss');
  expect(writeList(['Moss', 'Clover', 'Fern'])).toBe('Moss, Clover and Fern');
  expect([writeCount(1, 'pet'), writeCount(2, 'pet'), writeCount(2, 'match', 'matches')]).toEqual([
    '1 pet',
    '2 pets',
    '2 matches',
  ]);
});

test('after the sign-in only an address of this site is gone to', () => {
  expect(safePlace('/day/2026-04-14?van=1')).toBe('/day/2026-04-14?van=1');
  for (const bad of [null, '', 'https://example.org', '//example.org', '/\\example.org', 'day'])
    expect(safePlace(bad)).toBe('/');
});
