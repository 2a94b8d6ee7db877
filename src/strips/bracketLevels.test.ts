import { describe, expect, it } from 'vitest';
import { bracketLevels } from './bracketLevels.ts';

const hours = (startSeconds: number, endSeconds: number) => ({
  startSeconds: startSeconds * 3600,
  endSeconds: endSeconds * 3600,
});

describe('bracketLevels', () => {
  it('keeps touching windows in one row', () => {
    expect(bracketLevels([hours(8, 10), hours(10, 12), hours(12, 14)])).toEqual([0, 0, 0]);
  });
  it('lifts a window that overlaps the one before', () => {
    expect(bracketLevels([hours(8, 10), hours(9, 11), hours(10, 12)])).toEqual([0, 1, 0]);
  });
  it('reads windows by start, whatever the order of the stops', () => {
    expect(bracketLevels([hours(12, 14), hours(11, 13), hours(8, 10)])).toEqual([1, 0, 0]);
  });
  it('has two rows: a third overlap shares the upper one', () => {
    expect(bracketLevels([hours(8, 12), hours(9, 12), hours(10, 12)])).toEqual([0, 1, 1]);
  });
  it('knows an empty day', () => {
    expect(bracketLevels([])).toEqual([]);
  });
});
