import type { OptimiseProgress, OptimiseResult } from '#shared/optimiser/optimise.ts';
import type { DayProblem, DayTimes, Plan } from '#shared/schedule/types.ts';

/** What the main thread asks of the worker. */
export interface PlanJob {
  job: number;
  problem: DayProblem;
  plan: Plan;
  seed: number;
  seconds: number;
}

/** What the worker tells while and after it works on a job. */
export type PlanNews =
  | { job: number; kind: 'progress'; progress: OptimiseProgress }
  | { job: number; kind: 'best'; plan: Plan; times: DayTimes }
  | { job: number; kind: 'done'; result: OptimiseResult }
  | { job: number; kind: 'failed'; message: string };
