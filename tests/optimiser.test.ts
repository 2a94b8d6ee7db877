import { describe, expect, it } from 'vitest';
import { optimise } from '#shared/optimiser/optimise.ts';
import { applyMove } from '#shared/schedule/applyMove.ts';
import { emptyPlan } from '#shared/schedule/emptyPlan.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { settleRun } from '#shared/schedule/settleRun.ts';
import type { DayProblem, Plan, Stop } from '#shared/schedule/types.ts';
import { judge } from './referee/referee.ts';
import { begin, randomDay } from './support/randomDay.ts';
import { smallDay, smallVan, smallVisit } from './support/smallDay.ts';

const at = (hours: number, minutes = 0) => hours * 3600 + minutes * 60;

/** Where evaluator and referee part: rules, times to the second, every part of the cost. */
function disagreements(problem: DayProblem, plan: Plan, name: string): string[] {
  const times = evaluateDay(problem, plan);
  const verdict = judge(problem, plan);
  const apart: string[] = [];
  // Work under way is the one place where the table's last digit shows: its end may be a second off,
  // and all that follows with it.
  const off = times.runs.some((run) => run.stops.some((stop) => stop.state === 'working')) ? 1 : 0;
  const amountless = (rules: string[]) =>
    off ? rules.map((rule) => rule.slice(0, rule.lastIndexOf(' '))) : rules;
  const broken = times.runs
    .flatMap((run) => run.broken)
    .filter(({ hard, inherited }) => hard && !inherited)
    .map(({ rule, vanId, stopId, byAmount }) => `${rule} ${vanId} ${stopId} ${byAmount}`)
    .sort();
  if (amountless(broken).join() !== amountless(verdict.broken).join())
    apart.push(`${name}: ${broken.join()} against ${verdict.broken.join()}`);
  for (const run of times.runs) {
    if (Math.abs(run.finishSeconds - verdict.finish.get(run.vanId)!) > off)
      apart.push(`${name} ${run.vanId}: finish`);
    for (const stop of run.stops) {
      const [arrive, start, end] = verdict.times.get(stop.stopId)!;
      const by = [stop.arriveSeconds - arrive, stop.startSeconds - start, stop.endSeconds - end];
      if (Math.max(...by.map(Math.abs)) > off) apart.push(`${name} ${stop.stopId}: off by ${by}`);
    }
  }
  const { lateFactor, overtimeFactor } = problem.weights;
  const stops = times.runs.reduce((sum, run) => sum + run.stops.length, 0);
  // Expected lateness is rounded at every stop in both, from different normals: a second a stop.
  const slack: Record<string, number> = {
    lateSeconds: lateFactor * stops,
    overtimeSeconds: overtimeFactor * off * stops,
  };
  for (const part of Object.keys(times.cost) as (keyof typeof times.cost)[])
    if (Math.abs(times.cost[part] - verdict.cost[part]) > (slack[part] ?? off * stops))
      apart.push(`${name} ${part}: ${times.cost[part]} against ${verdict.cost[part]}`);
  return apart;
}

/** What the referee finds broken in a plan; the evaluator must agree with everything it says. */
function judged(problem: DayProblem, plan: Plan, name: string): string[] {
  expect(disagreements(problem, plan, name)).toEqual([]);
  return judge(problem, plan).broken.map((rule) => `${name}: ${rule}`);
}

describe('the referee', () => {
  it('accepts every plan of 200 random days, fresh and repaired', () => {
    for (let seed = 1000; seed < 1200; seed += 1) {
      const fresh = randomDay(seed);
      const planned = optimise(fresh, emptyPlan(fresh), { seed, iterations: 120 });
      expect(judged(fresh, planned.plan, `fresh ${seed}`)).toEqual([]);
      expect(planned.times).toEqual(evaluateDay(fresh, planned.plan));
      if (seed % 2 === 0) continue;
      const begun = begin(fresh, planned.plan, seed);
      judged(begun, planned.plan, `begun ${seed}`);
      const repaired = optimise(begun, planned.plan, { seed, iterations: 120 });
      expect(judged(begun, repaired.plan, `repaired ${seed}`)).toEqual([]);
      for (const fact of begun.facts) {
        const run = repaired.plan.runs.find(({ vanId }) => vanId === fact.vanId)!;
        expect(run.stops.some(({ id }) => id === fact.stopId)).toBe(true);
      }
    }
  }, 30_000);

  it('complains like the evaluator about plans thrown together', () => {
    for (let seed = 0; seed < 150; seed += 1) {
      const problem = randomDay(seed);
      const plan = {
        runs: problem.vans.map((van, i) => ({
          vanId: van.vanId,
          stops: problem.visits
            .filter((_, v) => v % problem.vans.length === i)
            .map(({ id }): Stop => ({ kind: 'visit', id, visitId: id })),
        })),
        notPlaced: [],
      };
      judged(problem, plan, `thrown ${seed}`);
      const runs = plan.runs.map((run) => settleRun(problem, run));
      judged(problem, { runs, notPlaced: [] }, `settled ${seed}`);
      for (const [i, run] of runs.entries()) expect(settleRun(problem, run)).toEqual(runs[i]);
    }
  });
});

describe('the optimum', () => {
  it('is found for one van with up to five visits, against every order of every choice', () => {
    for (let seed = 0; seed < 40; seed += 1) {
      const problem = randomDay(seed, { vans: 1, visits: 1 + (seed % 5) });
      const found = optimise(problem, emptyPlan(problem), { seed, iterations: 600 });
      expect(found.times.totalCost).toBe(leastCost(problem));
    }
  });

  it('is found where meal and refills are put, against every place', () => {
    for (let seed = 0; seed < 60; seed += 1) {
      const problem = randomDay(seed, { vans: 1, visits: 4, promises: seed % 2 === 0 });
      const van = problem.vans[0]!;
      const visits = problem.visits.map(({ id }): Stop => ({ kind: 'visit', id, visitId: id }));
      const settled = settleRun(problem, { vanId: van.vanId, stops: visits });
      const bare = evaluateDay(problem, {
        runs: [{ vanId: van.vanId, stops: visits }],
        notPlaced: [],
      });
      if (bare.feasible) {
        expect(settled.stops).toEqual(visits);
        continue;
      }
      const mine = evaluateDay(problem, { runs: [settled], notPlaced: [] });
      const best = leastFilled(problem, visits, van.meal ? 1 : 0, 2);
      if (best === Infinity) expect(mine.feasible).toBe(false);
      else expect(mine.totalCost).toBe(best);
    }
  });
});

describe('the search', () => {
  it('gives the same plan for the same seed and iterations', () => {
    const problem = randomDay(77, { vans: 3, visits: 20 });
    const plan = () => optimise(problem, emptyPlan(problem), { seed: 5, iterations: 500 });
    expect(plan()).toEqual(plan());
  });

  it('tells better and better plans, stops when told, and never gives back worse', () => {
    const problem = randomDay(78, { vans: 3, visits: 24 });
    const costs: number[] = [];
    const iterations: number[] = [];
    const first = optimise(problem, emptyPlan(problem), {
      seed: 1,
      stop: () => iterations.length > 12,
      onBest: (plan, times) => {
        expect(times).toEqual(evaluateDay(problem, plan));
        costs.push(times.totalCost);
      },
      onProgress: (progress) => iterations.push(progress.iterations),
    });
    expect(first.iterations).toBe(13 * 256);
    expect(costs.length).toBeGreaterThan(1);
    expect(costs.toSorted((a, b) => b - a)).toEqual(costs);
    expect(first.times.totalCost).toBeLessThanOrEqual(costs.at(-1)!);
    const again = optimise(problem, first.plan, { seed: 2, iterations: 1 });
    expect(again.times.totalCost).toBeLessThanOrEqual(first.times.totalCost);
    expect(() => optimise(problem, first.plan, { seed: 1 })).toThrow(/iterations or stop/);
  });

  it('keeps pinned stops on their van in their order', () => {
    const base = randomDay(79, { vans: 2, visits: 12, rules: false });
    const stops = (ids: number[]): Stop[] =>
      ids.map((i) => ({ kind: 'visit', id: `v${i}`, visitId: `v${i}`, pinned: true }));
    const plan = {
      runs: [
        { vanId: 'van0', stops: stops([3, 1]) },
        { vanId: 'van1', stops: stops([0]) },
      ],
      notPlaced: [],
    };
    const { plan: found } = optimise(base, plan, { seed: 3, iterations: 800 });
    const pinned = found.runs.map((run) =>
      run.stops.filter((stop) => stop.pinned).map(({ id }) => id),
    );
    expect(pinned).toEqual([['v3', 'v1'], ['v0']]);
  });

  it('leaves out what costs more than it is worth, and takes out what a person overfilled', () => {
    const problem = smallDay([0, 10, 200], {
      vans: [smallVan('otter', { endSeconds: at(10), mostOvertimeSeconds: 0 })],
      visits: [
        smallVisit('near', 1),
        smallVisit('also', 1, { valueSeconds: 20_000 }),
        smallVisit('far', 2, { valueSeconds: 100 }),
      ],
    });
    const far = optimise({ ...problem, vans: [smallVan('otter')] }, emptyPlan(problem), {
      seed: 1,
      iterations: 300,
    });
    expect(far.plan.notPlaced).toEqual(['far']);
    const crammed = applyMove(problem, emptyPlan(problem), {
      kind: 'replacePlan',
      plan: {
        runs: [
          {
            vanId: 'otter',
            stops: ['also', 'near'].map((id): Stop => ({ kind: 'visit', id, visitId: id })),
          },
        ],
        notPlaced: ['far'],
      },
    }).plan;
    expect(evaluateDay(problem, crammed).feasible).toBe(false);
    const mended = optimise(problem, crammed, { seed: 1, iterations: 300 });
    expect(mended.times.feasible).toBe(true);
    expect(mended.plan.notPlaced).toEqual(['also', 'far']);
  });

  it('answers days with nothing in them', () => {
    const nobody = smallDay([0, 1], { vans: [], visits: [smallVisit('a', 1)] });
    expect(optimise(nobody, emptyPlan(nobody), { seed: 1, iterations: 10 }).plan.notPlaced).toEqual(
      ['a'],
    );
    const nothing = smallDay([0], {});
    expect(optimise(nothing, emptyPlan(nothing), { seed: 1, iterations: 10 }).times.totalCost).toBe(
      0,
    );
  });
});

/** The least cost over every choice and order of visits on one van, each settled. */
function leastCost(problem: DayProblem): number {
  const vanId = problem.vans[0]!.vanId;
  let least = Infinity;
  const grow = (order: string[]) => {
    const stops = order.map((id): Stop => ({ kind: 'visit', id, visitId: id }));
    const run = settleRun(problem, { vanId, stops });
    const times = evaluateDay(problem, { runs: [run], notPlaced: [] });
    if (times.feasible) least = Math.min(least, times.totalCost);
    for (const { id } of problem.visits) if (!order.includes(id)) grow([...order, id]);
  };
  grow([]);
  return least;
}

/** The least cost of feasible runs with at most so many meals and refills put anywhere. */
function leastFilled(problem: DayProblem, stops: Stop[], meals: number, refills: number): number {
  const vanId = problem.vans[0]!.vanId;
  const times = evaluateDay(problem, { runs: [{ vanId, stops }], notPlaced: [] });
  let least = times.feasible ? times.totalCost : Infinity;
  for (let place = 0; place <= stops.length; place += 1) {
    if (meals > 0) {
      const meal: Stop = { kind: 'meal', id: 'm' };
      least = Math.min(
        least,
        leastFilled(problem, stops.toSpliced(place, 0, meal), meals - 1, refills),
      );
    }
    if (refills > 0)
      for (const { id } of problem.refills) {
        const refill: Stop = { kind: 'refill', id: `r${refills}`, placeId: id };
        least = Math.min(
          least,
          leastFilled(problem, stops.toSpliced(place, 0, refill), 0, refills - 1),
        );
      }
  }
  return least;
}
