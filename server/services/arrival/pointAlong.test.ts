import { expect, it } from 'vitest';
import { pointAlong } from './pointAlong.ts';

const east = { seconds: 600, line: [[0, 0], [0, 1]] as [number, number][] }; // prettier-ignore

it('moves evenly from start to end and stays there', () => {
  expect(pointAlong(east, 0)).toEqual({ lat: 0, lon: 0 });
  expect(pointAlong(east, 300)!.lon).toBeCloseTo(0.5, 6);
  expect(pointAlong(east, 900)!.lon).toBeCloseTo(1, 6);
});

it('has no place without a line', () => {
  expect(pointAlong({ seconds: 10, line: [] }, 5)).toBeNull();
  expect(pointAlong({ seconds: 10, line: [[3, 4]] }, 5)).toEqual({ lat: 3, lon: 4 });
});
