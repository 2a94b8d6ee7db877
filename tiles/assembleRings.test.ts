import { describe, expect, it } from 'vitest';
import { assembleRings } from './assembleRings.ts';

describe('assembleRings', () => {
  it('keeps a way that is a ring already', () => {
    expect(assembleRings([[1, 2, 3, 1]])).toEqual([[1, 2, 3, 1]]);
  });

  it('joins ways in any order and direction', () => {
    const [ring] = assembleRings([
      [1, 2, 3],
      [6, 5, 1],
      [3, 4, 6],
    ]);
    expect(ring).toEqual([1, 2, 3, 4, 6, 5, 1]);
    const [turned] = assembleRings([
      [1, 2, 3],
      [1, 5, 6],
      [6, 4, 3],
    ]);
    expect(turned).toEqual([1, 2, 3, 4, 6, 5, 1]);
  });

  it('tells two rings apart and leaves out what never closes', () => {
    const rings = assembleRings([
      [1, 2, 3, 1],
      [7, 8],
      [8, 9, 7],
      [20, 21, 22],
    ]);
    expect(rings).toEqual([
      [1, 2, 3, 1],
      [7, 8, 9, 7],
    ]);
  });
});
