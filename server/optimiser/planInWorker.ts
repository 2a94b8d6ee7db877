import { AsyncResource } from 'node:async_hooks';
import { Worker } from 'node:worker_threads';
import type { OptimiseProgress, OptimiseResult } from '#shared/optimiser/optimise.ts';
import type { DayProblem, DayTimes, Plan } from '#shared/schedule/types.ts';
import type { PlanNews } from './workerMessages.ts';

export interface PlanInWorkerOptions {
  seed: number;
  /** How long to search, wall seconds. */
  seconds: number;
  /** At most five times a second each. */
  onProgress?: (progress: OptimiseProgress) => void;
  onBest?: (plan: Plan, times: DayTimes) => void;
  signal?: AbortSignal;
}

interface Waiting {
  job: number;
  problem: DayProblem;
  plan: Plan;
  options: PlanInWorkerOptions;
  resolve: (result: OptimiseResult) => void;
  reject: (reason: Error) => void;
}

const cancel = new SharedArrayBuffer(4);
const cancelled = new Int32Array(cancel);
const queue: Waiting[] = [];
let worker: Worker | null = null;
let current: Waiting | null = null;
let jobs = 0;

/**
 * Plans a day on the one warm worker thread; jobs wait for each other. Rejects with a PlanCancelled
 * when the signal aborts, and with a message when the search fails or the thread dies (the next job
 * gets a new thread).
 */
export function planInWorker(
  problem: DayProblem,
  plan: Plan,
  options: PlanInWorkerOptions,
): Promise<OptimiseResult> {
  return new Promise((resolve, reject) => {
    if (options.signal?.aborted) return reject(new PlanCancelled());
    jobs += 1;
    const waiting: Waiting = {
      job: jobs,
      problem,
      plan,
      options: inCallersContext(options),
      resolve,
      reject,
    };
    options.signal?.addEventListener('abort', () => giveUp(waiting), { once: true });
    queue.push(waiting);
    next();
  });
}

/** Starts the thread ahead of the first job, so that it is warm. */
export function warmPlanner(): void {
  worker ??= startWorker();
}

/** Ends the thread; jobs under way are rejected. For shutting down. */
export async function closePlanner(): Promise<void> {
  const ending = worker;
  worker = null;
  failCurrent('The planner is shutting down.');
  for (const waiting of queue.splice(0)) waiting.reject(new PlanCancelled());
  await ending?.terminate();
}

/** The plan was given up because its caller asked. */
export class PlanCancelled extends Error {
  override name = 'PlanCancelled';

  constructor() {
    super('Planning was cancelled.');
  }
}

/**
 * The thread's messages come in the async context of whoever woke it, another business maybe; each
 * job's callbacks belong in the context of its own caller.
 */
function inCallersContext(options: PlanInWorkerOptions): PlanInWorkerOptions {
  const { onProgress, onBest } = options;
  return {
    ...options,
    ...(onProgress && { onProgress: AsyncResource.bind(onProgress) }),
    ...(onBest && { onBest: AsyncResource.bind(onBest) }),
  };
}

function next(): void {
  if (current || queue.length === 0) return;
  current = queue.shift()!;
  worker ??= startWorker();
  worker.ref();
  const { job, problem, plan, options } = current;
  try {
    worker.postMessage({ job, problem, plan, seed: options.seed, seconds: options.seconds });
  } catch (error) {
    failCurrent(`The day could not be handed to the planner: ${String(error)}`);
  }
}

function startWorker(): Worker {
  const started = new Worker(new URL('./bootWorker.mjs', import.meta.url), {
    workerData: { cancel },
    resourceLimits: { maxOldGenerationSizeMb: 512 },
  });
  started.on('message', hear);
  started.on('error', (error) => died(started, error.message));
  started.on('exit', (code) => died(started, `it ended with code ${code}`));
  started.unref();
  return started;
}

function hear(news: PlanNews): void {
  if (!current || news.job !== current.job) return;
  const { options, resolve } = current;
  if (news.kind === 'progress') options.onProgress?.(news.progress);
  else if (news.kind === 'best') options.onBest?.(news.plan, news.times);
  else if (news.kind === 'failed') failCurrent(news.message);
  else {
    settle();
    if (options.signal?.aborted) return;
    resolve(news.result);
  }
}

function giveUp(waiting: Waiting): void {
  const at = queue.indexOf(waiting);
  if (at >= 0) queue.splice(at, 1);
  else if (current === waiting) Atomics.store(cancelled, 0, waiting.job);
  waiting.reject(new PlanCancelled());
}

function died(which: Worker, why: string): void {
  if (which !== worker) return;
  worker = null;
  failCurrent(`The planner stopped while working: ${why}. Try again.`);
}

function failCurrent(message: string): void {
  const failed = current;
  if (!failed) return;
  settle();
  failed.reject(new Error(message));
}

/** The current job is over: the thread no longer keeps the process alive, the next job starts. */
function settle(): void {
  current = null;
  worker?.unref();
  queueMicrotask(next);
}
