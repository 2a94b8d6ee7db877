/** Writes the golden days anew: `npx tsx tests/support/writeGolden.ts`. Only for a meant new version. */
import { writeFileSync } from 'node:fs';
import { optimise } from '#shared/optimiser/optimise.ts';
import { emptyPlan } from '#shared/schedule/emptyPlan.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import type { DayProblem, Plan } from '#shared/schedule/types.ts';
import { begin, randomDay } from './randomDay.ts';
import { townDay } from './townDay.ts';

const fresh = townDay(3, 2, 6);
const planned = plan(fresh);
write('fresh', fresh, planned);
const traffic = firstTrafficDay();
write('traffic', traffic, plan(traffic));
const begun = begin(fresh, planned, 3);
write('begun', begun, optimise(begun, planned, { seed: 1, iterations: 400 }).plan);

function plan(problem: DayProblem): Plan {
  return optimise(problem, emptyPlan(problem), { seed: 1, iterations: 400 }).plan;
}

function firstTrafficDay(): DayProblem {
  for (let seed = 0; ; seed += 1) {
    const day = randomDay(seed, { vans: 2, visits: 12 });
    if (day.drive.bands.length > 1 && day.drive.cvPermille > 0 && day.refills.length > 0)
      return day;
  }
}

function write(name: string, problem: DayProblem, made: Plan): void {
  const times = evaluateDay(problem, made);
  const text = JSON.stringify({ problem, plan: made, times });
  writeFileSync(new URL(`../fixtures/golden/${name}.json`, import.meta.url), `${text}\n`);
}
