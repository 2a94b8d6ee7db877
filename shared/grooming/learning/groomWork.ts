import type { StepForecast } from '../types.ts';

/** What is learned about and leaned: the forecast without the pet's rests. */
export interface GroomWork<S> {
  forecast: { meanSeconds: number; varianceSeconds2: number };
  steps: S[];
}

/**
 * Takes the rests out of a pet's forecast. A rest belongs to the pet, is not work, and must never
 * count against a pace; without rests the forecast is as it was.
 */
export function groomWork<
  S extends Pick<StepForecast, 'key' | 'meanSeconds' | 'varianceSeconds2'>,
>({
  steps,
  meanSeconds,
  varianceSeconds2,
}: {
  steps: readonly S[];
  meanSeconds: number;
  varianceSeconds2: number;
}): GroomWork<S> {
  const rests = steps.filter(({ key }) => key === 'rest');
  const sum = (of: (step: S) => number) => rests.reduce((total, step) => total + of(step), 0);
  return {
    forecast: {
      meanSeconds: meanSeconds - sum((step) => step.meanSeconds),
      varianceSeconds2: Math.max(0, varianceSeconds2 - sum((step) => step.varianceSeconds2)),
    },
    steps: steps.filter(({ key }) => key !== 'rest'),
  };
}
