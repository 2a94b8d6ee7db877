import { describe, expect, it } from 'vitest';
import { bandShare, binomialRange } from './bandShare.ts';

const visit = (clock: number) => ({
  forecastSeconds: 3600,
  p10Seconds: 3000,
  p90Seconds: 4400,
  clockSeconds: clock,
});
const visits = (inside: number, outside: number) => [
  ...Array.from({ length: inside }, () => visit(3600)),
  ...Array.from({ length: outside }, () => visit(5000)),
];

describe('binomialRange', () => {
  it('agrees with sums worked out by hand', () => {
    // n = 2, p = 0.8: chances 0.04, 0.32, 0.64. Cutting 0.05 off the left loses the 0 only.
    expect(binomialRange(2, 0.8, 0.05)).toEqual([1, 2]);
    expect(binomialRange(2, 0.8, 0.03)).toEqual([0, 2]);
    // p = 0.5, n = 10: P(≤1) = 11/1024 = 0.0107, P(≤2) = 56/1024 = 0.0547.
    expect(binomialRange(10, 0.5, 0.025)).toEqual([2, 8]);
    // For many visits the normal's 800 ± 1.96 √160 = 775.2–824.8 is close.
    expect(binomialRange(1000, 0.8, 0.025)).toEqual([775, 824]);
  });
});

describe('bandShare', () => {
  it('calls a band honest when chance explains the share', () => {
    expect(bandShare(visits(79, 21))).toMatchObject({ percent: 79, verdict: 'honest' });
    expect(bandShare(visits(60, 40)).verdict).toBe('tooNarrow');
    expect(bandShare(visits(99, 1)).verdict).toBe('tooWide');
  });
  it('says nothing of a handful, and knows no visits', () => {
    expect(bandShare(visits(1, 4)).verdict).toBe('tooFew');
    expect(bandShare([])).toMatchObject({ percent: null, verdict: 'tooFew' });
  });
  it('counts the edges as inside', () => {
    expect(bandShare([visit(3000), visit(4400), visit(4401)]).inside).toBe(2);
  });
});
