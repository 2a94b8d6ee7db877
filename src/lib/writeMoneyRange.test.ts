import { expect, test } from 'vitest';
import { writeMoneyRange } from './writeMoneyRange.ts';

test('a price range in whole units of the currency', () => {
  expect(writeMoneyRange(6120, 8390, 'EUR')).toMatch(/^€61\s?–\s?€?84$/);
  expect(writeMoneyRange(6120, 6090, 'USD')).toBe('US$61');
});
