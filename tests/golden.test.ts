import { readdirSync, readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { settleRun } from '#shared/schedule/settleRun.ts';
import type { DayProblem, DayTimes, Plan } from '#shared/schedule/types.ts';
import { judge } from './referee/referee.ts';

interface Golden {
  problem: DayProblem;
  plan: Plan;
  times: DayTimes;
}

const folder = new URL('./fixtures/golden/', import.meta.url);
const names = readdirSync(folder).filter((name) => name.endsWith('.json'));
const read = (name: string) => JSON.parse(readFileSync(new URL(name, folder), 'utf8')) as Golden;

/**
 * Days whose evaluation is kept to the last integer: the same files are read in Node, the browser and
 * by the referee. A change here is a new version of the evaluator and must be meant
 * (`npx tsx tests/support/writeGolden.ts` writes them anew).
 */
it.each(names)('evaluates %s as it always did', (name) => {
  const { problem, plan, times } = read(name);
  expect(evaluateDay(problem, plan)).toEqual(times);
  expect(plan.runs.map((run) => settleRun(problem, run))).toEqual(plan.runs);
});

it.each(names)('has the referee agree on %s', (name) => {
  const { problem, plan, times } = read(name);
  const verdict = judge(problem, plan);
  expect(verdict.cost.driveSeconds).toBe(times.cost.driveSeconds);
  expect(verdict.cost.waitSeconds).toBe(times.cost.waitSeconds);
  expect(verdict.broken.length === 0).toBe(times.feasible);
});

it('keeps a fresh day, one under way and one with traffic by the hour', () => {
  expect(names).toEqual(['begun.json', 'fresh.json', 'traffic.json']);
  expect(read('begun.json').problem.facts.length).toBeGreaterThan(0);
  expect(read('traffic.json').problem.drive.bands.length).toBeGreaterThan(1);
});
