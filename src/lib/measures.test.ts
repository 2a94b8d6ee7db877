import { expect, test } from 'vitest';
import { fromGrams, toGrams, writeDistance, writeWeight } from './measures.ts';

// The pound is 0.45359237 kg and the mile 1,609.344 m by definition (NIST SP 811, appendix B).
test('pounds and kilograms go there and back', () => {
  expect(toGrams(10, 'lb')).toBe(4536);
  expect(fromGrams(4536, 'lb')).toBe(10);
  expect(toGrams(5.1, 'kg')).toBe(5100);
  expect(writeWeight(22_000, 'kg')).toBe('22 kg');
  expect(writeWeight(22_000, 'lb')).toBe('48.5 lb');
  for (let tenths = 1; tenths < 1500; tenths += 7)
    expect(fromGrams(toGrams(tenths / 10, 'lb'), 'lb')).toBe(tenths / 10);
});

test('distances keep a decimal below ten', () => {
  expect(writeDistance(1609.344, 'mi')).toBe('1 mi');
  expect(writeDistance(8040, 'km')).toBe('8 km');
  expect(writeDistance(8060, 'km')).toBe('8.1 km');
  expect(writeDistance(88_400, 'km')).toBe('88 km');
});
