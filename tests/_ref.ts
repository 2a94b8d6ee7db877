import { optimise } from '#shared/optimiser/optimise.ts';
import { emptyPlan } from '#shared/schedule/emptyPlan.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { judge } from './referee/referee.ts';
import { begin, randomDay } from './support/randomDay.ts';
const from = +process.argv[2]!,
  to = +process.argv[3]!,
  its = +process.argv[4]!;
let bad = 0,
  maxd = 0;
function check(name: string, problem: any, plan: any, mustFit = true) {
  const t = evaluateDay(problem, plan);
  const v = judge(problem, plan);
  const mine = t.runs
    .flatMap((r) =>
      r.broken
        .filter((b) => b.hard && !b.inherited)
        .map((b) => `${b.rule} ${b.vanId} ${b.stopId} ${b.byAmount}`),
    )
    .sort();
  const d = Object.keys(t.cost)
    .map((k) => [k, (t.cost as any)[k] - (v.cost as any)[k]])
    .filter((x) => x[1] !== 0);
  const dd = Math.max(0, ...d.map((x) => Math.abs(x[1] as number)));
  maxd = Math.max(maxd, dd);
  let tm = 0;
  for (const r of t.runs)
    for (const s of r.stops) {
      const o = v.times.get(s.stopId)!;
      if (o[0] !== s.arriveSeconds || o[1] !== s.startSeconds || o[2] !== s.endSeconds) {
        tm++;
        if (bad < 3)
          console.log(
            name,
            s.stopId,
            s.state,
            [s.arriveSeconds, s.startSeconds, s.endSeconds],
            o,
            JSON.stringify(problem.facts.find((f: any) => f.stopId === s.stopId)),
          );
      }
    }
  if (
    mine.join() !== v.broken.join() ||
    d.some((x) => x[0] !== 'lateSeconds') ||
    tm ||
    dd > 60 ||
    (mustFit && v.broken.length)
  ) {
    bad++;
    if (bad < 8) console.log(name, mine, v.broken, d, 'times', tm);
  }
}
const c0 = process.cpuUsage();
let un = 0,
  tot = 0;
for (let s = from; s < to; s++) {
  const p = randomDay(s);
  const r = optimise(p, emptyPlan(p), { seed: s, iterations: its });
  check('fresh' + s, p, r.plan);
  un += r.plan.notPlaced.length;
  tot += p.visits.length;
  const q = begin(p, r.plan, s);
  check('begun' + s, q, r.plan, false);
  const rr = optimise(q, r.plan, { seed: s, iterations: its });
  check('repaired' + s, q, rr.plan);
}
const c = process.cpuUsage(c0);
console.log('bad', bad, 'maxd', maxd, 'cpu', (c.user + c.system) / 1e6, 'unplaced', un, tot);
