import { goodSeconds } from './goodSeconds.ts';
import type { GroomFit } from './groomFit.ts';
import type { GroomRecord } from './groomRecord.ts';
import { meanPinball } from './pinballLoss.ts';
import { predictMinutes, toldOf } from './predictMinutes.ts';

export interface FitTrial {
  keep: boolean;
  /** Mean pinball loss on the held-out visits, in seconds; the plain model's when nothing is kept yet. */
  beforeSeconds: number;
  afterSeconds: number;
  records: number;
}

/** Fewer held-out visits than this say nothing: the old fit stays. */
export const leastHeldOut = 20;

/**
 * Whether the new fit forecasts visits better that neither fit has seen. `oldFit` null: the plain
 * model. Records that teach nothing (`goodSeconds`) judge nothing either.
 */
export function keepsBetter(
  oldFit: GroomFit | null,
  newFit: GroomFit,
  heldOut: readonly GroomRecord[],
): FitTrial {
  const before: number[] = [];
  const after: number[] = [];
  for (const record of heldOut) {
    const seconds = goodSeconds(record);
    if (seconds === null) continue;
    before.push(lossOf(oldFit ?? { ...newFit, records: 0 }, record, seconds));
    after.push(lossOf(newFit, record, seconds));
  }
  const mean = (losses: number[]) =>
    losses.reduce((sum, loss) => sum + loss, 0) / Math.max(1, losses.length);
  const [beforeSeconds, afterSeconds] = [mean(before), mean(after)];
  const keep = after.length >= leastHeldOut && afterSeconds < beforeSeconds;
  return { keep, beforeSeconds, afterSeconds, records: after.length };
}

function lossOf(fit: GroomFit, record: GroomRecord, seconds: number): number {
  return meanPinball(seconds, toldOf(predictMinutes(fit, record, record)));
}
