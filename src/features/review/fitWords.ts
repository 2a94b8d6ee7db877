import type { GroomFit } from '#shared/api/learning.ts';
import { leastHeldOut } from '#shared/grooming/learning/keepsBetter.ts';
import { writeCount } from '#src/lib/words.ts';

type Judged = Pick<
  GroomFit,
  'state' | 'records' | 'leftOut' | 'heldOut' | 'beforeSeconds' | 'afterSeconds'
>;

/** What came of one learning and why, in a sentence or two. */
export function fitWords(fit: Judged): string {
  switch (fit.state) {
    case 'working':
      return 'Learning now.';
    case 'failed':
      return 'The last learning broke off. Nothing changed.';
    case 'kept':
      return `Kept: ${gainWords(fit)} on ${writeCount(fit.heldOut, 'visit')} it had not seen.`;
    case 'notKept':
      return fit.heldOut < leastHeldOut
        ? `Not kept: too few visits to judge it by, ${fit.heldOut} of ${leastHeldOut}.`
        : `Not kept: no better than before on ${writeCount(fit.heldOut, 'visit')} it had not seen.`;
  }
}

/** "misses 31 % smaller than before": pinball loss, which counts misses of the middle and the band. */
export function gainWords({ beforeSeconds, afterSeconds }: Judged): string {
  if (beforeSeconds <= 0) return 'misses as before';
  const percent = Math.round(100 * (1 - afterSeconds / beforeSeconds));
  return percent < 1 ? 'misses a little smaller' : `misses ${percent} % smaller`;
}

/** "From 412 visits, 9 left out." */
export function recordsWords({ records, leftOut }: Judged): string {
  const from = `From ${writeCount(records, 'pet visit')}`;
  return leftOut > 0 ? `${from}; ${leftOut} with odd clocks left out.` : `${from}.`;
}
