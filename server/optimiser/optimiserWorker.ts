import { parentPort, workerData } from 'node:worker_threads';
import { optimise } from '#shared/optimiser/optimise.ts';
import type { PlanJob, PlanNews } from './workerMessages.ts';

/** Told at most this often: five times a second. */
const tellEveryMs = 200;
/** Holds the number of the job to give up. */
const cancelled = new Int32Array((workerData as { cancel: SharedArrayBuffer }).cancel);

parentPort!.on('message', (job: PlanJob) => {
  try {
    tell({ job: job.job, kind: 'done', result: work(job) });
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error);
    tell({ job: job.job, kind: 'failed', message });
  }
});

function work({ job, problem, plan, seed, seconds }: PlanJob) {
  const started = performance.now();
  const spent = () => (performance.now() - started) / 1000;
  const isCancelled = () => Atomics.load(cancelled, 0) === job;
  let toldProgress = -Infinity;
  let toldBest = -Infinity;
  return optimise(problem, plan, {
    seed,
    stop: () => isCancelled() || spent() >= seconds,
    fractionDone: () => Math.min(1, spent() / seconds),
    onProgress: (progress) => {
      const now = performance.now();
      if (now - toldProgress < tellEveryMs) return;
      toldProgress = now;
      tell({ job, kind: 'progress', progress });
    },
    onBest: (best, times) => {
      const now = performance.now();
      if (now - toldBest < tellEveryMs) return;
      toldBest = now;
      tell({ job, kind: 'best', plan: best, times });
    },
  });
}

function tell(news: PlanNews): void {
  parentPort!.postMessage(news);
}
