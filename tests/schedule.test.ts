import { describe, expect, it } from 'vitest';
import { applyMove } from '#shared/schedule/applyMove.ts';
import { diffDay } from '#shared/schedule/diffDay.ts';
import { driveTime } from '#shared/schedule/driveTime.ts';
import { emptyPlan } from '#shared/schedule/emptyPlan.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { inverseMove } from '#shared/schedule/inverseMove.ts';
import { settleRun } from '#shared/schedule/settleRun.ts';
import type { DayProblem, Plan, Stop, StopFact } from '#shared/schedule/types.ts';
import { smallDay, smallVan, smallVisit } from './support/smallDay.ts';

const at = (hours: number, minutes = 0) => hours * 3600 + minutes * 60;

/** A plan of visits by id per van, in the order of the problem's vans. */
function planOf(problem: DayProblem, ...runs: (string | Stop)[][]): Plan {
  const placed = new Set(runs.flat().filter((stop) => typeof stop === 'string'));
  return {
    runs: problem.vans.map((van, i) => ({
      vanId: van.vanId,
      stops: (runs[i] ?? []).map((stop): Stop =>
        typeof stop === 'string' ? { kind: 'visit', id: stop, visitId: stop } : stop,
      ),
    })),
    notPlaced: problem.visits.filter(({ id }) => !placed.has(id)).map(({ id }) => id),
  };
}

function tapped(stopId: string, parts: Partial<StopFact>): StopFact {
  return {
    stopId,
    vanId: 'otter',
    drivingSinceSeconds: null,
    arrivedSeconds: null,
    workingSinceSeconds: null,
    leftSeconds: null,
    failedReason: null,
    ...parts,
  };
}

describe('driving by time', () => {
  const bands = [
    { fromSeconds: 0, permille: 1000 },
    { fromSeconds: at(8), permille: 2000 },
    { fromSeconds: at(9), permille: 1000 },
  ];

  it('splits a leg at the edges of its bands', () => {
    expect(driveTime(bands, 600, at(7))).toBe(600);
    expect(driveTime(bands, 600, at(7, 55))).toBe(300 + 600);
    expect(driveTime(bands, 600, at(8, 30))).toBe(1200);
    // 10 minutes in the slow band cover 5, the other 5 after it.
    expect(driveTime(bands, 600, at(8, 50))).toBe(600 + 300);
    expect(driveTime(bands, 6000, at(7, 50))).toBe(600 + 3600 + 3600);
    expect(driveTime([{ fromSeconds: 0, permille: 1250 }], 601, 0)).toBe(751);
  });

  it('never arrives earlier for leaving later', () => {
    for (let base = 1; base < 5000; base += 371)
      for (let depart = at(7); depart < at(10); depart += 13)
        expect(depart + 13 + driveTime(bands, base, depart + 13)).toBeGreaterThanOrEqual(
          depart + driveTime(bands, base, depart),
        );
  });
});

describe('evaluateDay', () => {
  it('times a plain run with loading, set-up, waiting and wash-down', () => {
    const problem = smallDay([0, 10, 25], {
      vans: [smallVan('otter', { loadSeconds: 600, washDownSeconds: 900 })],
      visits: [
        smallVisit('a', 1, { setUpSeconds: 300, cleanDownSeconds: 120 }),
        smallVisit('b', 2, {
          promise: { startSeconds: at(10), endSeconds: at(11), version: 1 },
        }),
      ],
    });
    const times = evaluateDay(problem, planOf(problem, ['a', 'b']));
    const [run] = times.runs;
    expect(run!.leaveSeconds).toBe(at(8, 10));
    expect(
      run!.stops.map((stop) => [stop.arriveSeconds, stop.startSeconds, stop.endSeconds]),
    ).toEqual([
      [at(8, 20), at(8, 20), at(8, 20) + 300 + 3600 + 120],
      [at(9, 27) + 15 * 60, at(10), at(11)],
    ]);
    expect(run!.waitSeconds).toBe(18 * 60);
    expect(run!.finishSeconds).toBe(at(11, 25) + 900);
    expect(times.driveSeconds).toBe(50 * 60);
    expect(times.driveMetres).toBe(25_000);
    expect(times.cost).toEqual({
      driveSeconds: 3000,
      lateSeconds: 0,
      waitSeconds: 540,
      overtimeSeconds: 0,
      notPlacedSeconds: 0,
      otherGroomerSeconds: 0,
      disturbSeconds: 0,
    });
    expect(times.totalCost).toBe(3540);
    expect([times.promisesSafe, times.promisesAtRisk, times.feasible]).toEqual([1, 0, true]);
    expect(run!.stops[1]!.onTimePermille).toBe(1000);
  });

  it('gives the chance of being late and what it is expected to cost', () => {
    // Arrival 9:10 ± 10 min (the work's spread, scarcely skewed): on time by 9:20 with Φ(1) = 0.841.
    const problem = smallDay([0, 0, 10], {
      visits: [
        smallVisit('a', 1, { work: { meanSeconds: 3600, varianceSeconds2: 360_000 } }),
        smallVisit('b', 2, {
          promise: { startSeconds: at(9), endSeconds: at(9, 20), version: 1 },
        }),
      ],
    });
    const times = evaluateDay(problem, planOf(problem, ['a', 'b']));
    const b = times.runs[0]!.stops[1]!;
    expect(Math.abs(b.onTimePermille! - 841)).toBeLessThan(6);
    expect(b.arriveSeconds).toBe(at(9, 10));
    expect(b.arriveEarlySeconds).toBeLessThan(at(8, 59));
    expect(b.arriveLateSeconds).toBeGreaterThan(at(9, 22));
    // σ × L(1) = 600 × 0.0833.
    expect(Math.abs(b.expectedLateSeconds - 55)).toBeLessThan(8);
    expect(times.cost.lateSeconds).toBe(6 * b.expectedLateSeconds);
    expect(times.promisesAtRisk).toBe(1);
  });

  it('pays set-up once and drives nowhere inside a site', () => {
    const visits = ['a', 'b', 'c'].map((id, i) =>
      smallVisit(id, i + 1, { siteId: id === 'c' ? null : 'gate', setUpSeconds: 600 }),
    );
    const problem = smallDay([0, 10, 12, 14], { visits });
    const stops = evaluateDay(problem, planOf(problem, ['a', 'b', 'c'])).runs[0]!.stops;
    expect(stops.map((stop) => [stop.driveSeconds, stop.setUpSeconds])).toEqual([
      [600, 600],
      [0, 0],
      [120, 600],
    ]);
  });

  it('holds visits to their windows, arrival or stay', () => {
    const allowed = [
      { startSeconds: at(12), endSeconds: at(13), binds: 'stay' as const },
      { startSeconds: at(8), endSeconds: at(8, 30), binds: 'arrival' as const },
    ];
    const early = smallDay([0, 10], { visits: [smallVisit('a', 1, { allowed })] });
    expect(evaluateDay(early, planOf(early, ['a'])).runs[0]!.stops[0]!.startSeconds).toBe(
      at(8, 10),
    );
    const late = { ...early, vans: [smallVan('otter', { startSeconds: at(9) })] };
    expect(evaluateDay(late, planOf(late, ['a'])).runs[0]!.stops[0]!.startSeconds).toBe(at(12));
    const missed = { ...early, vans: [smallVan('otter', { startSeconds: at(12, 5) })] };
    const times = evaluateDay(missed, planOf(missed, ['a']));
    expect(times.runs[0]!.broken).toEqual([
      {
        rule: 'window',
        hard: true,
        vanId: 'otter',
        stopId: 'a',
        byAmount: 15 * 60,
        inherited: false,
      },
    ]);
    expect(times.feasible).toBe(false);
  });

  it('names every broken rule', () => {
    const problem = smallDay([0, 10], {
      vans: [
        smallVan('otter', {
          endSeconds: at(9),
          mostOvertimeSeconds: 0,
          mostDriveSeconds: 1000,
          tableLimitGrams: 20_000,
          tanks: [{ kind: 'fresh', capacityMl: 50_000, usedAtStartMl: 30_000 }],
          meal: {
            lengthSeconds: 1800,
            earliestStartSeconds: at(8, 30),
            latestStartSeconds: at(13),
            dueAfterSeconds: 3600,
          },
        }),
        smallVan('plover'),
      ],
      visits: [
        smallVisit('a', 1, {
          needs: ['cats'],
          heaviestGrams: 32_000,
          barredGroomerIds: ['g-otter'],
          pin: { vanId: 'plover', position: 'first' },
          tankUse: [{ kind: 'fresh', ml: 40_000 }],
          promise: { startSeconds: at(7), endSeconds: at(8), version: 1 },
        }),
      ],
    });
    const broken = evaluateDay(problem, planOf(problem, ['a'])).runs[0]!.broken;
    expect(Object.fromEntries(broken.map(({ rule, byAmount }) => [rule, byAmount]))).toEqual({
      skill: 0,
      tableLimit: 12_000,
      barredGroomer: 0,
      pin: 0,
      promise: 600,
      tank: 20_000,
      overtime: 1200,
      driveLimit: 200,
      meal: 1200,
    });
    expect(broken.filter(({ hard }) => !hard).map(({ rule }) => rule)).toEqual(['promise']);
  });

  it('says what in a problem or plan is wrong', () => {
    const problem = smallDay([0, 1], { visits: [smallVisit('a', 1)] });
    expect(() => evaluateDay(problem, planOf(problem, ['x']))).toThrow(/visitId: 'x'/);
    expect(() => evaluateDay(problem, planOf(problem, ['a', 'a']))).toThrow(/'a' is in it twice/);
    const short = { ...problem, drive: { ...problem.drive, metres: [1] } };
    expect(() => evaluateDay(short, emptyPlan(short))).toThrow(/drive.metres: has 1/);
  });
});

describe('meal and refills', () => {
  const meal = {
    lengthSeconds: 1800,
    earliestStartSeconds: at(11, 30),
    latestStartSeconds: at(13, 30),
    dueAfterSeconds: at(6),
  };

  it('never drags a short day to a meal', () => {
    const problem = smallDay([0, 10, 20], {
      vans: [smallVan('otter', { meal })],
      visits: [smallVisit('a', 1), smallVisit('b', 2)],
    });
    expect(settleRun(problem, planOf(problem, ['a', 'b']).runs[0]!).stops).toHaveLength(2);
  });

  it('puts the meal into waiting, driving on first when it is too early to eat', () => {
    const problem = smallDay([0, 10, 20, 30], {
      vans: [smallVan('otter', { meal })],
      visits: [
        smallVisit('a', 1, { work: { meanSeconds: at(2), varianceSeconds2: 0 } }),
        smallVisit('b', 2, {
          allowed: [{ startSeconds: at(12), endSeconds: at(13), binds: 'arrival' }],
        }),
        smallVisit('c', 3, { work: { meanSeconds: at(2), varianceSeconds2: 0 } }),
      ],
    });
    const run = settleRun(problem, planOf(problem, ['a', 'b', 'c']).runs[0]!);
    expect(run.stops.map((stop) => stop.kind)).toEqual(['visit', 'meal', 'visit', 'visit']);
    const times = evaluateDay(problem, { runs: [run], notPlaced: [] });
    const [, eaten, b] = times.runs[0]!.stops;
    expect([eaten!.point, eaten!.startSeconds, eaten!.driveSeconds]).toEqual([2, at(11, 30), 600]);
    expect([b!.startSeconds, b!.driveSeconds, b!.waitSeconds]).toEqual([at(12), 0, 0]);
    expect(times.feasible).toBe(true);
  });

  it('refills where the detour is least, as often as needed, and takes needless calls out', () => {
    const use = [{ kind: 'fresh' as const, ml: 40_000 }];
    const problem = smallDay([0, 10, 20, 30, 40, 21, 100], {
      vans: [
        smallVan('otter', {
          tanks: [{ kind: 'fresh', capacityMl: 100_000, usedAtStartMl: 0 }],
        }),
      ],
      visits: [1, 2, 3, 4].map((point) => smallVisit(`v${point}`, point, { tankUse: use })),
      refills: [
        {
          id: 'far',
          name: 'Far tap',
          point: 6,
          kinds: ['fresh'],
          lengthSeconds: 600,
          opensSeconds: 0,
          closesSeconds: 86_400,
        },
        {
          id: 'near',
          name: 'Near tap',
          point: 5,
          kinds: ['fresh', 'grey'],
          lengthSeconds: 600,
          opensSeconds: 0,
          closesSeconds: 86_400,
        },
      ],
    });
    const run = settleRun(problem, planOf(problem, ['v1', 'v2', 'v3', 'v4']).runs[0]!);
    expect(run.stops.map((stop) => stop.id)).toEqual(['v1', 'v2', 'refill:otter:1', 'v3', 'v4']);
    expect(run.stops[2]).toMatchObject({ placeId: 'near' });
    expect(settleRun(problem, run)).toEqual(run);
    const times = evaluateDay(problem, { runs: [run], notPlaced: [] });
    expect(times.feasible).toBe(true);
    expect(times.runs[0]!.stops.map((stop) => stop.tanksUsedMl[0]!.usedMl)).toEqual([
      40_000, 80_000, 0, 40_000, 80_000,
    ]);
    const shorter = applyMove(
      problem,
      { runs: [run], notPlaced: [] },
      { kind: 'unplaceVisit', visitId: 'v2' },
    );
    const knockOn = diffDay(
      problem,
      evaluateDay(problem, { runs: [run], notPlaced: [] }),
      evaluateDay(problem, shorter.plan),
    );
    // Three visits of 40 l still need one fill; two do not.
    expect(knockOn.refillsRemoved).toEqual([]);
    const two = applyMove(problem, shorter.plan, { kind: 'unplaceVisit', visitId: 'v4' });
    expect(two.plan.runs[0]!.stops.map((stop) => stop.id)).toEqual(['v1', 'v3']);
  });

  it('keeps to the hours of a place', () => {
    const problem = smallDay([0, 10, 20, 15], {
      vans: [
        smallVan('otter', {
          tanks: [{ kind: 'grey', capacityMl: 50_000, usedAtStartMl: 0 }],
        }),
      ],
      visits: [1, 2].map((point) =>
        smallVisit(`v${point}`, point, { tankUse: [{ kind: 'grey', ml: 40_000 }] }),
      ),
      refills: [
        {
          id: 'dump',
          name: 'Dump',
          point: 3,
          kinds: ['grey'],
          lengthSeconds: 600,
          opensSeconds: at(12),
          closesSeconds: at(13),
        },
      ],
    });
    const run = settleRun(problem, planOf(problem, ['v1', 'v2']).runs[0]!);
    const times = evaluateDay(problem, { runs: [run], notPlaced: [] });
    expect(times.runs[0]!.stops[1]!.startSeconds).toBe(at(12));
    const shut = {
      ...problem,
      refills: [{ ...problem.refills[0]!, opensSeconds: 0, closesSeconds: at(9) }],
    };
    const late = settleRun(shut, planOf(shut, ['v1', 'v2']).runs[0]!);
    expect(evaluateDay(shut, { runs: [late], notPlaced: [] }).feasible).toBe(false);
  });
});

describe('a day under way', () => {
  const visits = [1, 2, 3].map((point) =>
    smallVisit(`v${point}`, point, { work: { meanSeconds: 3600, varianceSeconds2: 360_000 } }),
  );

  it('keeps what happened and follows from now', () => {
    const problem = smallDay([0, 10, 20, 30], {
      visits,
      nowSeconds: at(10),
      facts: [
        tapped('v1', {
          drivingSinceSeconds: at(8),
          arrivedSeconds: at(8, 15),
          workingSinceSeconds: at(8, 20),
          leftSeconds: at(9, 30),
        }),
        tapped('v2', {
          drivingSinceSeconds: at(9, 31),
          arrivedSeconds: at(9, 45),
          workingSinceSeconds: at(9, 50),
        }),
      ],
    });
    const [one, two, three] = evaluateDay(problem, planOf(problem, ['v1', 'v2', 'v3'])).runs[0]!
      .stops;
    expect(one).toMatchObject({
      state: 'done',
      driveSeconds: 900,
      arriveSeconds: at(8, 15),
      startSeconds: at(8, 20),
      workSeconds: 4200,
      endSeconds: at(9, 30),
    });
    expect(two!.state).toBe('working');
    expect(Math.abs(two!.endSeconds - at(10, 50))).toBeLessThan(10);
    expect(three).toMatchObject({ state: 'ahead', arriveSeconds: two!.endSeconds + 600 });
    // An hour over: what is left is not nothing, and never lies before now.
    const over = { ...problem, nowSeconds: at(11, 50) };
    const late = evaluateDay(over, planOf(over, ['v1', 'v2', 'v3'])).runs[0]!.stops;
    expect(late[1]!.endSeconds).toBeGreaterThan(at(11, 50));
    expect(late[1]!.endSeconds).toBeLessThan(at(12));
  });

  it('arrives no earlier than now where the van is driving', () => {
    const problem = smallDay([0, 10, 20, 30], {
      visits,
      nowSeconds: at(8, 25),
      facts: [tapped('v1', { drivingSinceSeconds: at(8) })],
    });
    const [one] = evaluateDay(problem, planOf(problem, ['v1'])).runs[0]!.stops;
    expect(one).toMatchObject({ state: 'driving', arriveSeconds: at(8, 25), driveSeconds: 1500 });
  });

  it('reports a stop given up before setting out without time or driving', () => {
    const problem = smallDay([0, 10, 20, 30], {
      visits,
      nowSeconds: at(8),
      facts: [tapped('v2', { leftSeconds: at(8), failedReason: 'owner called' })],
    });
    const stops = evaluateDay(problem, planOf(problem, ['v1', 'v2', 'v3'])).runs[0]!.stops;
    expect(stops[1]).toMatchObject({ state: 'failed', driveSeconds: 0 });
    expect(stops[2]!.driveSeconds).toBe(1200);
    expect(evaluateDay(problem, planOf(problem, ['v1', 'v2', 'v3'])).feasible).toBe(true);
  });

  it('inherits what the facts broke and nothing worse', () => {
    const problem = smallDay([0, 10, 20, 30], {
      vans: [smallVan('otter', { endSeconds: at(10), mostOvertimeSeconds: 0 })],
      visits: [
        ...visits.slice(0, 2),
        smallVisit('v3', 3, {
          work: { meanSeconds: 60, varianceSeconds2: 0 },
          allowed: [{ startSeconds: at(8), endSeconds: at(9), binds: 'arrival' }],
        }),
      ],
      nowSeconds: at(11),
      facts: [tapped('v1', { arrivedSeconds: at(8, 10), leftSeconds: at(11) })],
    });
    const home = evaluateDay(problem, planOf(problem, ['v1']));
    expect(home.runs[0]!.broken).toMatchObject([
      { rule: 'overtime', byAmount: 4200, inherited: true },
    ]);
    expect(home.feasible).toBe(true);
    const more = evaluateDay(problem, planOf(problem, ['v1', 'v3']));
    const rules = more.runs[0]!.broken.map(({ rule, inherited }) => [rule, inherited]);
    expect(rules).toEqual([
      ['window', true],
      ['overtime', false],
    ]);
    expect(more.feasible).toBe(false);
  });
});

describe('moves', () => {
  const problem = smallDay([0, 10, 20, 30], {
    vans: [smallVan('otter'), smallVan('plover')],
    visits: [1, 2, 3].map((point) => smallVisit(`v${point}`, point)),
  });
  const order = (plan: Plan) => plan.runs.map((run) => run.stops.map((stop) => stop.id).join(' '));

  it('places, moves, takes out and undoes', () => {
    const start = planOf(problem, ['v1', 'v2', 'v3'], []);
    const cases = [
      [{ kind: 'placeVisit', visitId: 'v1', vanId: 'otter', index: 2 }, ['v2 v3 v1', '']],
      [{ kind: 'placeVisit', visitId: 'v3', vanId: 'otter', index: 0 }, ['v3 v1 v2', '']],
      [{ kind: 'placeVisit', visitId: 'v2', vanId: 'plover', index: 9 }, ['v1 v3', 'v2']],
      [{ kind: 'unplaceVisit', visitId: 'v2' }, ['v1 v3', '']],
      [{ kind: 'swapRuns', vanId: 'otter', otherVanId: 'plover' }, ['', 'v1 v2 v3']],
      [{ kind: 'replacePlan', plan: emptyPlan(problem) }, ['', '']],
    ] as const;
    for (const [move, wanted] of cases) {
      const made = applyMove(problem, start, move);
      expect(made.moved).toBe(true);
      expect(order(made.plan)).toEqual(wanted);
      const back = applyMove(problem, made.plan, inverseMove(start, made.plan, move));
      expect(order(back.plan)).toEqual(order(start));
      expect([...back.plan.notPlaced].sort()).toEqual([]);
    }
    const nothing = applyMove(problem, start, {
      kind: 'placeVisit',
      visitId: 'v2',
      vanId: 'otter',
      index: 1,
    });
    expect(nothing).toEqual({ plan: start, moved: false });
    expect(nothing.plan).toBe(start);
  });

  it('refuses to move what has started, with words', () => {
    const going = {
      ...problem,
      nowSeconds: at(9),
      facts: [
        tapped('v1', { arrivedSeconds: at(8, 10), leftSeconds: at(8, 50) }),
        tapped('v2', { drivingSinceSeconds: at(8, 51) }),
      ],
    };
    const plan = planOf(going, ['v1', 'v2', 'v3'], []);
    const refused = (move: Parameters<typeof applyMove>[2]) =>
      applyMove(going, plan, move).refusedBecause;
    expect(refused({ kind: 'unplaceVisit', visitId: 'v1' })).toMatch(/v1 is already done/);
    expect(refused({ kind: 'placeVisit', visitId: 'v2', vanId: 'plover', index: 0 })).toMatch(
      /already driving to v2/,
    );
    expect(refused({ kind: 'placeVisit', visitId: 'v3', vanId: 'otter', index: 0 })).toMatch(
      /Otter has already started/,
    );
    expect(refused({ kind: 'replacePlan', plan: emptyPlan(going) })).toMatch(/started since/);
    const swapped = applyMove(going, plan, {
      kind: 'swapRuns',
      vanId: 'otter',
      otherVanId: 'plover',
    });
    expect(order(swapped.plan)).toEqual(['v1 v2', 'v3']);
  });

  it('tells the whole knock-on', () => {
    const promised = {
      ...problem,
      visits: problem.visits.map((visit) => ({
        ...visit,
        work: { meanSeconds: 3600, varianceSeconds2: 90_000 },
        promise: { startSeconds: at(9), endSeconds: at(11), version: 1 },
      })),
    };
    const before = planOf(promised, ['v1', 'v2'], ['v3']);
    const { plan } = applyMove(promised, before, {
      kind: 'placeVisit',
      visitId: 'v3',
      vanId: 'otter',
      index: 2,
    });
    const knockOn = diffDay(promised, evaluateDay(promised, before), evaluateDay(promised, plan));
    expect(knockOn.driveSeconds).toBe(-40 * 60);
    expect(knockOn.runs.map(({ vanName }) => vanName)).toEqual(['Otter', 'Plover']);
    expect(knockOn.arrivals).toEqual([
      {
        visitId: 'v3',
        label: 'v3',
        vanBeforeId: 'plover',
        vanAfterId: 'otter',
        arriveBeforeSeconds: at(8, 30),
        arriveAfterSeconds: at(11, 20),
      },
    ]);
    expect(knockOn.promises[0]).toMatchObject({ visitId: 'v3', beforePermille: 1000 });
    expect(knockOn.promises[0]!.afterPermille).toBeLessThan(100);
    expect(knockOn.newlyBroken).toMatchObject([{ rule: 'promise', byAmount: 1200 }]);
  });
});
