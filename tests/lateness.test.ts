import { expect, it } from 'vitest';
import { optimise } from '#shared/optimiser/optimise.ts';
import { emptyPlan } from '#shared/schedule/emptyPlan.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import type { DayProblem } from '#shared/schedule/types.ts';
import { randomDay } from './support/randomDay.ts';
import { simulateRun } from './support/simulateRun.ts';
import { townDay } from './support/townDay.ts';

it('gives chances of being late within 2 points of simulation, and late minutes within one', () => {
  const days = [
    townDay(1, 2, 7),
    townDay(2, 2, 7),
    ...[3, 4, 5, 6, 7, 8, 9, 10].map((seed) => spreadDay(seed)),
  ];
  let promises = 0;
  let unsure = 0;
  const apart: string[] = [];
  for (const [i, day] of days.entries()) {
    const { plan } = optimise(day, emptyPlan(day), { seed: i, iterations: 300 });
    for (const run of evaluateDay(day, plan).runs) {
      const seen = simulateRun(day, run, 20_000, 100 + i);
      for (const stop of run.stops) {
        if (stop.onTimePermille === null) continue;
        const { onTime, lateSeconds } = seen.get(stop.stopId)!;
        promises += 1;
        if (onTime < 0.95) unsure += 1;
        const chance = stop.onTimePermille / 1000 - onTime;
        const late = stop.expectedLateSeconds - lateSeconds;
        if (Math.abs(chance) >= 0.02 || Math.abs(late) >= 60)
          apart.push(`day ${i} ${stop.stopId}: chance off by ${chance}, late by ${late} s`);
      }
    }
  }
  expect(apart).toEqual([]);
  // Enough of them, and enough that are not simply safe, for the comparison to mean something.
  expect(promises).toBeGreaterThan(30);
  expect(unsure).toBeGreaterThan(8);
});

/** A random day in which all work and driving has a spread, as real ones have. */
function spreadDay(seed: number): DayProblem {
  const day = randomDay(seed, { vans: 2, visits: 12, rules: false });
  return {
    ...day,
    drive: { ...day.drive, cvPermille: 200 },
    visits: day.visits.map((visit) => ({
      ...visit,
      work: {
        ...visit.work,
        varianceSeconds2: Math.round((visit.work.meanSeconds * 0.25) ** 2),
      },
    })),
  };
}
