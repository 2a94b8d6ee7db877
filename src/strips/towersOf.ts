import type { Tower } from './types.ts';

/** The part of a visit's step a tower is made from; `VisitStep` of the contract fits. */
export interface TowerStep {
  petId: string;
  key: string;
  family: Tower['family'];
  label: string;
  meanSeconds: number;
  attentionPermille: number;
  reasons: { text: string; deltaSeconds: number }[];
}

/**
 * A visit's steps as towers from `fromSeconds` on, in order of work, filling `workSeconds` exactly:
 * a groomer with a pace of her own stretches or shrinks every step alike.
 */
export function towersOf(
  steps: readonly TowerStep[],
  petNames: ReadonlyMap<string, string>,
  fromSeconds: number,
  workSeconds: number,
): Tower[] {
  const forecastSeconds = steps.reduce((sum, step) => sum + step.meanSeconds, 0);
  if (forecastSeconds <= 0 || workSeconds <= 0) return [];
  let forecastSoFar = 0;
  const at = () => fromSeconds + (forecastSoFar * workSeconds) / forecastSeconds;
  return steps
    .filter((step) => step.meanSeconds > 0)
    .map((step, index) => {
      const start = at();
      forecastSoFar += step.meanSeconds;
      const end = at();
      return {
        key: `${step.petId}/${step.key}/${index}`,
        petId: step.petId,
        petName: petNames.get(step.petId) ?? '',
        family: step.family,
        fromSeconds: start,
        toSeconds: end,
        attentionPermille: step.attentionPermille,
        steps: [{ label: step.label, seconds: end - start, reasons: step.reasons }],
      };
    });
}
