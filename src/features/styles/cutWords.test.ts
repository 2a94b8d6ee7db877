import { expect, test } from 'vitest';
import type { Style } from '#shared/grooming/types.ts';
import { bladeLabel, cutWords, writeMm } from './cutWords.ts';

const cuts: Style['cuts'] = {
  back: { tool: 'blade', lengthTenthsMm: 95, direction: 'against' },
  head: { tool: 'blade', lengthTenthsMm: 15, direction: 'with' },
  neck: { tool: 'comb', lengthTenthsMm: 130, direction: 'with' },
  tail: { tool: 'scissor', lengthTenthsMm: 250 },
  ears: { tool: 'leave' },
};

test('labels as short as a leader line needs them', () => {
  expect(cutWords(cuts, 'back')).toMatchObject({
    label: '4F · 9.5 mm',
    direction: 'against growth',
  });
  // With growth a blade leaves about twice what is printed on it (common practice).
  expect(cutWords(cuts, 'head')).toMatchObject({ label: '#10 · 3 mm', tool: 'blade 10' });
  expect(cutWords(cuts, 'neck').label).toBe('comb · 15 mm');
  expect(cutWords(cuts, 'tail')).toMatchObject({ label: 'scissor · 25 mm', left: '25 mm' });
  expect(cutWords(cuts, 'ears').label).toBe('kept long');
  expect(cutWords(cuts, 'feet')).toMatchObject({ tool: 'not touched', left: '' });
});

test('a length no blade has is told in millimetres; tenths only where they say something', () => {
  expect(bladeLabel(77)).toBe('7.7 mm');
  expect(writeMm(149.5)).toBe('15');
  expect(writeMm(63)).toBe('6.3');
});
