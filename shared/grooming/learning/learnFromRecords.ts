import { fitGroomModel } from './fitGroomModel.ts';
import { type GroomFit, groomPrior, type GroomPrior } from './groomFit.ts';
import type { GroomRecord } from './groomRecord.ts';
import { type FitTrial, keepsBetter } from './keepsBetter.ts';

/** A kept fit and its twin that never saw the held-out visits, so that the next fit can be judged. */
export interface LearnedPair {
  fit: GroomFit;
  trial: GroomFit;
}

/** Visits older than this no longer judge: the business has moved on. */
const JUDGE_DAYS = 365;

/**
 * One night's learning. One visit in ten, chosen by its id for ever, is held out of the trial twins;
 * the new twin must forecast those better than the old one (or than the plain model) for the new pair
 * to be kept. The fit that is used learns from every visit.
 */
export function learnFromRecords(
  records: readonly GroomRecord[],
  kept: LearnedPair | null,
  prior: GroomPrior = groomPrior,
): { pair: LearnedPair; trial: FitTrial } {
  const lastDay = records.reduce((last, { day }) => Math.max(last, day), -Infinity);
  const heldOut = records.filter(({ visitId }) => isHeldOut(visitId));
  const pair = {
    fit: fitGroomModel(records, prior),
    trial: fitGroomModel(
      records.filter(({ visitId }) => !isHeldOut(visitId)),
      prior,
    ),
  };
  const judges = heldOut.filter(({ day }) => lastDay - day <= JUDGE_DAYS);
  return { pair, trial: keepsBetter(kept?.trial ?? null, pair.trial, judges) };
}

/** FNV-1a of the id, one in ten. */
export function isHeldOut(visitId: string): boolean {
  let hash = 0x811c9dc5;
  for (let i = 0; i < visitId.length; i += 1)
    hash = Math.imul(hash ^ visitId.charCodeAt(i), 0x01000193) >>> 0;
  return hash % 10 === 0;
}
