import { Worker } from 'node:worker_threads';
import type { learnFromRecords } from '#shared/grooming/learning/learnFromRecords.ts';
import type { LearningJob } from './LearningJob.ts';

type Learned = ReturnType<typeof learnFromRecords>;

/**
 * Learns on a thread of its own that ends with the job: seconds of arithmetic must not hold up
 * answers, and once a night is too seldom to keep a thread warm. Rejects when the thread dies.
 */
export function learnInWorker(job: LearningJob): Promise<Learned> {
  return new Promise((resolve, reject) => {
    const worker = new Worker(new URL('./bootWorker.mjs', import.meta.url), {
      workerData: job,
      resourceLimits: { maxOldGenerationSizeMb: 512 },
    });
    worker.once('message', (learned: Learned) => resolve(learned));
    worker.once('error', (error) => reject(new Error(`Learning failed: ${error.message}`)));
    worker.once('exit', (code) => {
      if (code !== 0) reject(new Error(`Learning stopped with code ${code}.`));
    });
  });
}
