import { parentPort, workerData } from 'node:worker_threads';
import { learnFromRecords } from '#shared/grooming/learning/learnFromRecords.ts';
import type { LearningJob } from './LearningJob.ts';

const { records, kept } = workerData as LearningJob;
parentPort!.postMessage(learnFromRecords(records, kept));
