import { afterAll, expect, it } from 'vitest';
import type { DayProblem } from '#shared/schedule/types.ts';
import { closePlanner, PlanCancelled, planInWorker } from './planInWorker.ts';

/** Six visits on a line, two vans. Built here: nobody imports tests. */
function lineDay(): DayProblem {
  const n = 7;
  const legs = Array.from({ length: n * n }, (_, i) => Math.abs(Math.floor(i / n) - (i % n)));
  const van = {
    groomerId: 'g',
    groomerName: 'Mika',
    startSeconds: 28_800,
    endSeconds: 61_200,
    mostOvertimeSeconds: 0,
    mostDriveSeconds: null,
    loadSeconds: 0,
    washDownSeconds: 0,
    startPoint: 0,
    endPoint: 0,
    skills: [],
    tableLimitGrams: 50_000,
    tanks: [],
    meal: null,
  };
  return {
    v: 1,
    date: '2026-06-01',
    dayStartUtc: '2026-05-31T22:00:00.000Z',
    timeZone: 'Europe/Vaduz',
    dayLengthSeconds: 86_400,
    points: Array.from({ length: n }, (_, i) => ({ id: `p${i}`, lat: 47, lon: 9, rough: false })),
    drive: {
      baseSeconds: legs.map((leg) => leg * 300),
      metres: legs.map((leg) => leg * 2500),
      bands: [{ fromSeconds: 0, permille: 1000 }],
      cvPermille: 150,
    },
    vans: [
      { ...van, vanId: 'otter', vanName: 'Otter' },
      { ...van, vanId: 'plover', vanName: 'Plover' },
    ],
    visits: [1, 2, 3, 4, 5, 6].map((point) => ({
      id: `v${point}`,
      householdId: `h${point}`,
      label: `Pet ${point}`,
      point,
      siteId: null,
      work: { meanSeconds: 3600, varianceSeconds2: 360_000 },
      workByGroomer: {},
      setUpSeconds: 300,
      cleanDownSeconds: 300,
      allowed: [],
      promise: null,
      tankUse: [],
      needs: [],
      heaviestGrams: 9000,
      preferredGroomerIds: [],
      barredGroomerIds: [],
      valueSeconds: 36_000,
      pin: null,
    })),
    refills: [],
    weights: {
      lateFactor: 6,
      waitFactorPermille: 500,
      overtimeFactor: 2,
      otherGroomerSeconds: 600,
      disturbSeconds: 900,
    },
    nowSeconds: null,
    facts: [],
    sent: null,
  };
}

const empty = { runs: [], notPlaced: [] };

afterAll(closePlanner);

it('plans on the worker thread and tells progress and the best so far', async () => {
  let progress = 0;
  let best = 0;
  const result = await planInWorker(lineDay(), empty, {
    seed: 1,
    seconds: 0.3,
    onProgress: () => (progress += 1),
    onBest: () => (best += 1),
  });
  // One van out and back: 6 legs of 300 s each way.
  expect(result.times.cost.notPlacedSeconds).toBe(0);
  expect(result.times.driveSeconds).toBe(3600);
  expect(result.times.feasible).toBe(true);
  expect(best).toBeGreaterThanOrEqual(1);
  expect(progress).toBeGreaterThanOrEqual(1);
  expect(progress).toBeLessThanOrEqual(4);
});

it('rejects a cancelled job, waiting or under way, and goes on with the next', async () => {
  const long = new AbortController();
  const queued = new AbortController();
  const first = planInWorker(lineDay(), empty, { seed: 1, seconds: 600, signal: long.signal });
  const second = planInWorker(lineDay(), empty, { seed: 1, seconds: 600, signal: queued.signal });
  const third = planInWorker(lineDay(), empty, { seed: 1, seconds: 0.1 });
  queued.abort();
  await expect(second).rejects.toBeInstanceOf(PlanCancelled);
  setTimeout(() => long.abort(), 50);
  await expect(first).rejects.toThrow('Planning was cancelled.');
  expect((await third).times.driveSeconds).toBe(3600);
});

it('rejects with words when the day is wrong, and with a message when the thread dies', async () => {
  const wrong = { ...lineDay(), vans: [{ ...lineDay().vans[0]!, startPoint: 99 }] };
  await expect(planInWorker(wrong, empty, { seed: 1, seconds: 0.1 })).rejects.toThrow(
    /startPoint and endPoint must be indices/,
  );
  const dying = planInWorker(lineDay(), empty, { seed: 1, seconds: 600 }).catch(String);
  await closePlanner();
  expect(await dying).toMatch(/shutting down/);
  const uncloneable = { ...lineDay(), zone: () => 0 } as unknown as DayProblem;
  await expect(planInWorker(uncloneable, empty, { seed: 1, seconds: 0.1 })).rejects.toThrow(
    /could not be handed to the planner/,
  );
  const again = await planInWorker(lineDay(), empty, { seed: 1, seconds: 0.1 });
  expect(again.plan.notPlaced).toEqual([]);
});
