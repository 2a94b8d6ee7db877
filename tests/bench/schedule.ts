/**
 * Times of the day's hot paths: `npx tsx tests/bench/schedule.ts`. Prints one line a measure in CPU
 * time of the process (just-in-time compiling and garbage collection included).
 */
import { optimise } from '#shared/optimiser/optimise.ts';
import { applyMove } from '#shared/schedule/applyMove.ts';
import { diffDay } from '#shared/schedule/diffDay.ts';
import { emptyPlan } from '#shared/schedule/emptyPlan.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { explainNotPlaced } from '#shared/schedule/explainNotPlaced.ts';
import { townDay } from '../support/townDay.ts';

for (const [vans, visits] of [
  [3, 24],
  [10, 80],
  [50, 400],
] as const) {
  const name = `${vans} vans × ${visits / vans}`;
  const problem = townDay(1, vans, visits / vans);
  const started = cpuMs();
  let first = 0;
  let firstCost = 0;
  const found = optimise(problem, emptyPlan(problem), {
    seed: 1,
    stop: () => cpuMs() - started > 4000,
    fractionDone: () => (cpuMs() - started) / 4000,
    onBest: (_, times) => {
      if (first > 0) return;
      first = cpuMs() - started;
      firstCost = times.totalCost;
    },
  });
  const spent = (cpuMs() - started) / 1000;
  const { plan, times } = found;
  print(name, 'first answer', `${first.toFixed(0)} ms, cost ${firstCost}`);
  print(
    name,
    `after ${spent.toFixed(1)} s`,
    `cost ${times.totalCost}, not placed ${plan.notPlaced.length}, ${Math.round(found.iterations / spent)} iterations/s`,
  );
  print(name, 'evaluateDay', `${time(200, () => evaluateDay(problem, plan)).toFixed(3)} ms`);
  const run = plan.runs.find((each) => each.stops.some((stop) => stop.kind === 'visit'))!;
  const visitId = run.stops.find((stop) => stop.kind === 'visit')!.id;
  let index = 0;
  print(
    name,
    'applyMove + evaluateDay + diffDay',
    `${time(100, () => {
      index = (index + 1) % 6;
      const vanId = problem.vans[index % vans]!.vanId;
      const moved = applyMove(problem, plan, { kind: 'placeVisit', visitId, vanId, index });
      diffDay(problem, times, evaluateDay(problem, moved.plan));
    }).toFixed(3)} ms`,
  );
  if (vans <= 10)
    print(
      name,
      'explainNotPlaced',
      `${time(1, () => explainNotPlaced(problem, plan)).toFixed(0)} ms for ${plan.notPlaced.length} visits`,
    );
}

/** CPU time of this process: the machine is shared, wall time lies. */
function cpuMs(): number {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1000;
}

function time(times: number, work: () => void): number {
  for (let i = 0; i < times; i += 1) work();
  const from = cpuMs();
  for (let i = 0; i < times; i += 1) work();
  return (cpuMs() - from) / times;
}

function print(name: string, what: string, value: string): void {
  console.log(`${name.padEnd(12)} ${what.padEnd(34)} ${value}`);
}
