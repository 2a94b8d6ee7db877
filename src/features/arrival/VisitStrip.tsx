import type { Arrival } from '#shared/api/arrival.ts';
import { PetStrip } from '#src/strips/PetStrip.tsx';
import { stepFamilies } from '#src/strips/stepFamilies.ts';
import type { TowerStep } from '#src/strips/towersOf.ts';

/** The visit's minutes as towers. Only families and lengths are known here, and only those drawn. */
export function VisitStrip({ steps }: { steps: Arrival['steps'] }) {
  const known = new Set<string>(stepFamilies.map(({ family }) => family));
  return (
    <PetStrip
      label="What will be done"
      widthPx={330}
      steps={steps
        .filter(({ family }) => known.has(family))
        .map((step, index) => ({
          petId: '',
          key: String(index),
          family: step.family as TowerStep['family'],
          label: step.family,
          meanSeconds: step.seconds,
          attentionPermille: step.attentionPermille,
          reasons: [],
        }))}
    />
  );
}
