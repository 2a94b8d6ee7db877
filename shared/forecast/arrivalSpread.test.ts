import { describe, expect, it } from 'vitest';
import {
  addDuration,
  certainAt,
  chanceByPermille,
  earlySeconds,
  expectedLateSeconds,
  lateSeconds,
  waitUntil,
} from './arrivalSpread.ts';
import { promiseWindow } from './promiseWindow.ts';
import { remainingWork } from './remainingWork.ts';

/** Seeded dice for the simulation: mulberry32 and Box–Muller, apart from the code under test. */
function dice(seed: number): () => number {
  let a = seed;
  const uniform = () => {
    a = (a + 0x6d2b79f5) | 0;
    let t = Math.imul(a ^ (a >>> 15), 1 | a);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
  return () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform());
}

function logNormal(normal: () => number, mean: number, variance: number): number {
  const s2 = Math.log(1 + variance / (mean * mean));
  return mean * Math.exp(-s2 / 2 + Math.sqrt(s2) * normal());
}

describe('arrival spread', () => {
  it('stays certain when everything is', () => {
    const spread = certainAt(3600);
    addDuration(spread, 600, 0);
    expect(spread).toEqual({ meanSeconds: 4200, varianceSeconds2: 0, thirdSeconds3: 0 });
    waitUntil(spread, 5000);
    expect(spread.meanSeconds).toBe(5000);
    expect(chanceByPermille(spread, 5000)).toBe(1000);
    expect(chanceByPermille(spread, 4999)).toBe(0);
    expect(expectedLateSeconds(spread, 4700)).toBe(300);
    expect([earlySeconds(spread), lateSeconds(spread)]).toEqual([5000, 5000]);
  });

  it('waits by half of 0.798 sigma when the mean arrives just at the opening', () => {
    // E[max(0, Z)] = 1/√(2π) = 0.39894; Var = 1/2 − 1/(2π) = 0.34085.
    const spread = { meanSeconds: 1000, varianceSeconds2: 90_000, thirdSeconds3: 0 };
    waitUntil(spread, 1000);
    expect(spread.meanSeconds).toBe(1120);
    expect(spread.varianceSeconds2 / 90_000).toBeCloseTo(0.34085, 3);
  });

  it('stays within 2 points and half a minute of simulation down a six-stop day', () => {
    const draws = 40_000;
    const legs = [700, 500, 900, 300, 1100, 600];
    const works = [4800, 3000, 6600, 3600, 2400, 5400];
    const opens = [28_800, 36_000, 0, 45_000, 0, 54_000];
    const normal = dice(7);
    const ends = [0, 1, 2, 3, 4, 5].map(() => new Float64Array(draws));
    for (let draw = 0; draw < draws; draw += 1) {
      let t = 28_800;
      for (let stop = 0; stop < 6; stop += 1) {
        t += logNormal(normal, legs[stop]!, (0.2 * legs[stop]!) ** 2);
        ends[stop]![draw] = t;
        t = Math.max(t, opens[stop]!);
        t += logNormal(normal, works[stop]!, (0.25 * works[stop]!) ** 2);
      }
    }
    const spread = certainAt(28_800);
    for (let stop = 0; stop < 6; stop += 1) {
      addDuration(spread, legs[stop]!, Math.round((0.2 * legs[stop]!) ** 2));
      const arrivals = ends[stop]!;
      const mean = arrivals.reduce((sum, t) => sum + t, 0) / draws;
      expect(Math.abs(spread.meanSeconds - mean)).toBeLessThan(30);
      for (const shift of [-3000, -1500, -600, 0, 600, 1500, 3000, 4500]) {
        const at = Math.round(mean) + shift;
        const seen = arrivals.filter((t) => t <= at).length / draws;
        expect(Math.abs(chanceByPermille(spread, at) / 1000 - seen)).toBeLessThan(0.02);
        const late = arrivals.reduce((sum, t) => sum + Math.max(0, t - at), 0) / draws;
        expect(Math.abs(expectedLateSeconds(spread, at) - late)).toBeLessThan(30);
      }
      const before = (at: number) => arrivals.filter((t) => t < at).length / draws;
      expect(Math.abs(before(earlySeconds(spread)) - 0.1)).toBeLessThan(0.03);
      expect(Math.abs(before(lateSeconds(spread)) - 0.9)).toBeLessThan(0.02);
      waitUntil(spread, opens[stop]!);
      addDuration(spread, works[stop]!, Math.round((0.25 * works[stop]!) ** 2));
    }
  });
});

describe('work under way', () => {
  it('is never shorter than what has passed and grows with overrun', () => {
    const work = { meanSeconds: 3600, varianceSeconds2: 810_000 };
    expect(remainingWork(work, 0).meanSeconds).toBeCloseTo(3600, -1);
    const over = remainingWork(work, 5400);
    // λ(2) = φ(2)/Q(2) = 2.37322: 3600 + 900 × 2.37322.
    expect(Math.abs(over.meanSeconds - 5736)).toBeLessThanOrEqual(2);
    expect(over.varianceSeconds2).toBeLessThan(work.varianceSeconds2);
    for (let passed = 0; passed < 20_000; passed += 500)
      expect(remainingWork(work, passed).meanSeconds).toBeGreaterThan(passed);
    expect(remainingWork({ meanSeconds: 600, varianceSeconds2: 0 }, 900).meanSeconds).toBe(900);
  });
});

describe('promise window', () => {
  it('offers two hours on the quarter hour, leaning to safety', () => {
    const arrival = { meanSeconds: 36_000, varianceSeconds2: 1_000_000, thirdSeconds3: 0 };
    const window = promiseWindow(arrival);
    expect(window.endSeconds - window.startSeconds).toBe(7200);
    expect(window.startSeconds % 900).toBe(0);
    expect(window.onTimePermille).toBeGreaterThan(990);
    expect(window.startSeconds).toBeLessThan(36_000);
    const wide = promiseWindow({ ...arrival, varianceSeconds2: 25_000_000 });
    expect(wide.startSeconds + 3600).toBeGreaterThan(36_000);
  });

  it('names a bad shape', () => {
    expect(() => promiseWindow(certainAt(0), { gridSeconds: 0 })).toThrow(/gridSeconds/);
  });
});
