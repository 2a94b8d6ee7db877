import { expect, test } from 'vitest';
import { readNumber } from './NumberField.tsx';
import { readTime, writeTime } from './TimeField.tsx';

test('times of day as people type them', () => {
  expect(['9', '930', '9:30', '9.30', '09:05', '24:00', ' 17h45 '].map(readTime)).toEqual([
    540, 570, 570, 570, 545, 1440, 1065,
  ]);
  expect(readTime('')).toBeNull();
  for (const wrong of ['9:60', '24:01', 'noon', '25', '-1']) expect(readTime(wrong)).toBeNaN();
});

test('times are written on the 24-hour clock', () => {
  expect([0, 65, 570, 1440].map(writeTime)).toEqual(['0:00', '1:05', '9:30', '24:00']);
});

test('numbers take a comma or a point', () => {
  expect(['12,5', '12.5', ' 7 ', '.5', '12.', '-3'].map(readNumber)).toEqual([
    12.5, 12.5, 7, 0.5, 12, -3,
  ]);
  expect(readNumber(' ')).toBeNull();
  for (const wrong of ['twelve', '1,2,3', '5kg', '-', '.']) expect(readNumber(wrong)).toBeNaN();
});
