import { meanExcess } from '#shared/stats/normalTable.ts';

/** A duration as mean and variance, whole seconds and seconds squared. */
export interface DurationSpread {
  meanSeconds: number;
  varianceSeconds2: number;
}

/**
 * The whole length of work that has lasted `elapsedSeconds` and is not over: mean and variance given
 * that it is longer. Never shorter than what has already passed; the longer it overruns, the more is
 * still to come.
 */
export function remainingWork(work: DurationSpread, elapsedSeconds: number): DurationSpread {
  const elapsed = elapsedSeconds > 0 ? elapsedSeconds : 0;
  if (work.varianceSeconds2 === 0)
    return {
      meanSeconds: work.meanSeconds > elapsed ? work.meanSeconds : elapsed,
      varianceSeconds2: 0,
    };
  const sigma = Math.sqrt(work.varianceSeconds2);
  const z = (elapsed - work.meanSeconds) / sigma;
  if (z < -5) return { ...work };
  const excess = meanExcess(z);
  const left = 1 - excess * (z + excess);
  return {
    meanSeconds: elapsed + Math.round(sigma * excess),
    varianceSeconds2: left > 0 ? Math.round(work.varianceSeconds2 * left) : 0,
  };
}
