import { optimise } from '#shared/optimiser/optimise.ts';
import { emptyPlan } from '#shared/schedule/emptyPlan.ts';
import { townDay } from './support/townDay.ts';
const vans=+process.argv[2]!, it=+process.argv[3]!;
const problem = townDay(1, vans, 8);
const c0=process.cpuUsage();
const r = optimise(problem, emptyPlan(problem), { seed: +(process.argv[4]??1), iterations: it });
const c=process.cpuUsage(c0);
console.log(vans, r.times.totalCost, r.plan.notPlaced.length, it/((c.user+c.system)/1e6)|0, 'it/cpu-s', (c.user+c.system)/1e6, JSON.stringify(r.times.cost));
