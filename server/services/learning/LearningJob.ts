import type { GroomRecord } from '#shared/grooming/learning/groomRecord.ts';
import type { LearnedPair } from '#shared/grooming/learning/learnFromRecords.ts';

/** What the main thread hands to the learning thread. */
export interface LearningJob {
  records: GroomRecord[];
  kept: LearnedPair | null;
}
