import { expect, test } from 'vitest';
import { fitWithin } from './shrinkPhoto.ts';

test('the longest side becomes 1600, small photos stay as they are', () => {
  expect(fitWithin(4032, 3024)).toEqual({ width: 1600, height: 1200 });
  expect(fitWithin(3024, 4032)).toEqual({ width: 1200, height: 1600 });
  expect(fitWithin(800, 600)).toEqual({ width: 800, height: 600 });
  expect(fitWithin(10_000, 2)).toEqual({ width: 1600, height: 1 });
});
