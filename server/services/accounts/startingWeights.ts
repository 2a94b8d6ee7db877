import type { Weights } from '#shared/schedule/types.ts';

/** A new business's weights in plain units: one minute late to a promise is worth six minutes of driving. */
export const startingWeights: Weights = {
  lateFactor: 6,
  waitFactorPermille: 300,
  overtimeFactor: 2,
  otherGroomerSeconds: 600,
  disturbSeconds: 900,
};
