import type { GroomRecord } from './groomRecord.ts';

/**
 * Seconds of work to learn from, or null when the record teaches nothing: visits ended for the pet's
 * sake, two-person shifts, and clocks nobody believes. Rests for the pet are taken off first.
 *
 * A clock is believed between a quarter and four times the forecast's median: a forgotten timer
 * leaves 0 minutes or 9 hours, while a bad day seldom doubles the work. When the pet's own clock is
 * not believed but every step was timed, the steps' sum stands in. What slips through is pulled in
 * by the fit's Huber weights.
 */
export function goodSeconds(record: GroomRecord): number | null {
  if (record.ended || record.people !== 1 || record.steps.length === 0) return null;
  const own = record.actualSeconds - record.restSeconds;
  if (believable(own, medianOf(record.forecast), 4)) return own;
  let sum = 0;
  for (const step of record.steps) {
    if (!goodStep(step)) return null;
    sum += step.actualSeconds!;
  }
  return believable(sum, medianOf(record.forecast), 4) ? sum : null;
}

/** Single steps vary more: a sixth to six times. */
export function goodStep(step: GroomRecord['steps'][number]): boolean {
  return step.actualSeconds !== null && believable(step.actualSeconds, step.medianSeconds, 6);
}

/** Median of the log-normal with these moments. */
export function medianOf(moments: { meanSeconds: number; varianceSeconds2: number }): number {
  return moments.meanSeconds * Math.exp(-logVarianceOf(moments) / 2);
}

/** Variance of log seconds of the log-normal with these moments. */
export function logVarianceOf({
  meanSeconds,
  varianceSeconds2,
}: {
  meanSeconds: number;
  varianceSeconds2: number;
}): number {
  return Math.log1p(varianceSeconds2 / (meanSeconds * meanSeconds));
}

function believable(seconds: number, median: number, times: number): boolean {
  return seconds >= median / times && seconds <= median * times;
}
