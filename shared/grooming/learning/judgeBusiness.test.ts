import { describe, expect, it } from 'vitest';
import { businessSettings } from './businessSettings.ts';
import { coverageBand, judgeBusiness } from './judgeBusiness.ts';
import { meanPinball, pinballLoss } from './pinballLoss.ts';

describe('pinballLoss', () => {
  // Worked example of scikit-learn's and sktime's documentation, recomputed: means over five.
  it.each([
    [50, [1.25, 0, 1, 4, 0.625], 0.16625],
    [500, [2.5, 0, 2, 8, 1.25], 0.275],
    [950, [3.75, 0, 3, 12, 1.875], 0.09625],
  ])('quantile %d', (permille, told, loss) => {
    const seen = [3, -0.5, 2, 7, 2];
    const sum = seen.reduce((total, y, i) => total + pinballLoss(y, told[i]!, permille), 0);
    expect(sum / 5).toBeCloseTo(loss, 10);
  });

  it('is least, over many draws, where the quantiles are true', () => {
    const values = Array.from({ length: 1000 }, (_, i) => i + 0.5);
    const loss = (told: [number, number, number, number]) =>
      values.reduce((sum, value) => sum + meanPinball(value, told), 0);
    const best = loss([100, 500, 800, 900]);
    expect(loss([150, 500, 800, 900])).toBeGreaterThan(best);
    expect(loss([100, 500, 750, 950])).toBeGreaterThan(best);
  });
});

describe('simulated businesses, small: the full count is tests/bench/learning.ts', () => {
  it('learning beats the breed’s mean and the last visit, and covers what it says', () => {
    const small = { ...businessSettings, visits: 700, heldOutVisits: 200, pets: 100 };
    const judged = [1, 2, 3].map((seed) => judgeBusiness(small, seeded(seed), 100));
    const middle = (values: number[]) => values.sort((a, b) => a - b)[1]!;
    expect(middle(judged.map((j) => j.learnedSeconds / j.breedMeanSeconds))).toBeLessThan(0.75);
    expect(middle(judged.map((j) => j.learnedSeconds / j.lastVisitSeconds))).toBeLessThan(0.9);
    expect(middle(judged.map((j) => j.learnedSeconds / j.plainSeconds))).toBeLessThan(0.9);
    const [low, high] = coverageBand(200);
    const covered = middle(judged.map((j) => j.covered));
    expect(covered).toBeGreaterThanOrEqual(low);
    expect(covered).toBeLessThanOrEqual(high);
  });

  it('the band of 400 is the binomial one', () => {
    // Exact binomial 95 % band of n = 400, p = 0.8 is 304–335; the normal one is as good as that.
    expect(coverageBand(400)).toEqual([305, 335]);
  });
});

function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}
