import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  logNormal,
  logNormalQuantile,
  momentsFromMedian,
  standardNormalQuantile,
  sumWithSharedFactor,
} from './logNormal.ts';

describe('standardNormalQuantile', () => {
  // Printed in every table of the normal distribution (e.g. Abramowitz & Stegun, table 26.5).
  it.each([
    [0.5, 0],
    [0.8, 0.8416212336],
    [0.9, 1.2815515655],
    [0.95, 1.644853627],
    [0.975, 1.9599639845],
    [0.99, 2.326347874],
    [0.999, 3.0902323062],
  ])('p = %f gives %f, and its mirror the negative', (p, z) => {
    expect(standardNormalQuantile(p)).toBeCloseTo(z, 7);
    expect(standardNormalQuantile(1 - p)).toBeCloseTo(-z, 7);
  });

  it('refuses chances that no value has', () => {
    expect(() => standardNormalQuantile(0)).toThrow(/strictly between 0 and 1/);
    expect(() => standardNormalQuantile(1)).toThrow(RangeError);
  });
});

describe('logNormal', () => {
  // Closed form: σ = √ln(1+CV²), P90/median = e^{1.28155σ}; ratios worked out apart from the code.
  it.each([
    [0.1, 0.0998, 0.88, 1.136, 1.005],
    [0.15, 0.1492, 0.826, 1.211, 1.011],
    [0.2, 0.198, 0.776, 1.289, 1.02],
    [0.25, 0.2462, 0.729, 1.371, 1.031],
    [0.3, 0.2936, 0.686, 1.457, 1.044],
    [0.4, 0.3853, 0.61, 1.638, 1.077],
  ])('CV %f', (cv, sigma, p10, p90, mean) => {
    const it = logNormal({ meanSeconds: 1000, varianceSeconds2: (cv * 1000) ** 2 });
    const median = logNormalQuantile(it, 500);
    expect(it.sigma).toBeCloseTo(sigma, 4);
    expect(logNormalQuantile(it, 100) / median).toBeCloseTo(p10, 3);
    expect(logNormalQuantile(it, 900) / median).toBeCloseTo(p90, 3);
    expect(1000 / median).toBeCloseTo(mean, 3);
  });

  it('median 90, sigma 0.2: P10 69.651, P90 116.294, mean 91.818, SD 18.549', () => {
    const moments = momentsFromMedian(90, 0.2);
    expect(moments.meanSeconds).toBeCloseTo(91.818, 3);
    expect(Math.sqrt(moments.varianceSeconds2)).toBeCloseTo(18.549, 3);
    const back = logNormal(moments);
    expect(logNormalQuantile(back, 100)).toBeCloseTo(69.651, 3);
    expect(logNormalQuantile(back, 500)).toBeCloseTo(90, 6);
    expect(logNormalQuantile(back, 900)).toBeCloseTo(116.294, 3);
  });

  it('names the field that is wrong', () => {
    expect(() => logNormal({ meanSeconds: 0, varianceSeconds2: 1 })).toThrow(/meanSeconds/);
    expect(() => logNormal({ meanSeconds: 5, varianceSeconds2: -1 })).toThrow(/varianceSeconds2/);
  });
});

describe('sumWithSharedFactor', () => {
  it('adds means and variances of independent parts', () => {
    const parts = [
      { meanSeconds: 900, varianceSeconds2: 50_625 },
      { meanSeconds: 4500, varianceSeconds2: 810_000 },
    ];
    expect(sumWithSharedFactor(parts, 0)).toEqual({
      meanSeconds: 5400,
      varianceSeconds2: 860_625,
    });
  });

  // The published two-million-draw simulation of legs (mean 15 min, CV .25) and stops (75 min,
  // CV .20): arrival at stop 4 lies between 251.5 and 320.4 min with 283.6 in the middle.
  it('reproduces a simulated day within 0.3 min', () => {
    const leg = { meanSeconds: 15, varianceSeconds2: 3.75 ** 2 };
    const stop = { meanSeconds: 75, varianceSeconds2: 15 ** 2 };
    const arrival = logNormal(sumWithSharedFactor([leg, stop, leg, stop, leg, stop, leg], 0));
    expect(Math.abs(logNormalQuantile(arrival, 100) - 251.5)).toBeLessThan(0.3);
    expect(Math.abs(logNormalQuantile(arrival, 500) - 283.6)).toBeLessThan(0.3);
    expect(Math.abs(logNormalQuantile(arrival, 900) - 320.4)).toBeLessThan(0.3);
  });

  it('is exactly a scaled log-normal when the shared factor is all there is', () => {
    // Two parts moving together: 30 + 60 min with one sigma of 0.2 is 90 min with sigma 0.2.
    const parts = [momentsFromMedian(30, 0.2), momentsFromMedian(60, 0.2)];
    const sum = sumWithSharedFactor(parts, 0.2);
    const whole = momentsFromMedian(90, 0.2);
    expect(sum.meanSeconds).toBeCloseTo(whole.meanSeconds, 9);
    expect(sum.varianceSeconds2).toBeCloseTo(whole.varianceSeconds2, 9);
  });

  it('never spreads less than its parts alone, and quantiles stay in order', () => {
    const part = fc.record({
      meanSeconds: fc.integer({ min: 1, max: 20_000 }),
      varianceSeconds2: fc.integer({ min: 0, max: 10_000_000 }),
    });
    fc.assert(
      fc.property(
        fc.array(part, { minLength: 1, maxLength: 15 }),
        fc.integer({ min: 0, max: 400 }),
        (parts, sharedPermille) => {
          const sum = sumWithSharedFactor(parts, sharedPermille / 1000);
          const alone = parts.reduce((total, each) => total + each.varianceSeconds2, 0);
          expect(sum.varianceSeconds2).toBeGreaterThanOrEqual(alone);
          const it = logNormal(sum);
          const values = [100, 500, 800, 900].map((q) => logNormalQuantile(it, q));
          expect(values).toEqual([...values].sort((a, b) => a - b));
        },
      ),
    );
  });
});
