import { useRef } from 'react';
import { writeSpan } from '#src/lib/words.ts';
import { stepFamily } from './stepFamilies.ts';
import { StepTowers } from './StepTowers.tsx';
import { PatternScope, StripPatterns, usePatternId } from './StripPatterns.tsx';
import { towersOf, type TowerStep } from './towersOf.ts';
import type { Tower } from './types.ts';
import { useBoxWidth } from './useBoxWidth.ts';

/**
 * One visit's minutes on their own: towers by family with their words below. For the pet page, the
 * phone and the visit's dialog. It fills its box, `widthPx` wide at most.
 */
export function PetStrip({
  steps,
  petNames,
  widthPx = 480,
  label = 'Steps of the visit',
}: {
  steps: readonly TowerStep[];
  petNames?: ReadonlyMap<string, string>;
  widthPx?: number;
  label?: string;
}) {
  const id = usePatternId();
  const box = useRef<HTMLDivElement>(null);
  const drawnPx = Math.min(widthPx, useBoxWidth(box) || widthPx);
  const seconds = steps.reduce((sum, step) => sum + step.meanSeconds, 0);
  if (seconds <= 0) return null;
  const towers = towersOf(steps, petNames ?? new Map(), 0, seconds);
  const xOf = (at: number) => 2 + (at / seconds) * (drawnPx - 4);
  return (
    // Its own width must not hold the page open: a phone is narrower than the widest strip.
    <div ref={box} className="[contain:inline-size]">
      <svg
        width={drawnPx}
        height={84}
        className="block"
        role="img"
        aria-label={`${label}: ${familyRuns(towers)
          .map((run) => `${stepFamily(run.family).words} ${writeSpan(run.seconds)}`)
          .join(', ')}`}
      >
        <StripPatterns id={id} />
        <PatternScope value={id}>
          <StepTowers
            towers={towers}
            baseline={60}
            xOf={xOf}
            heightOf={(permille) => 8 + (46 * Math.min(1000, permille)) / 1000}
          />
        </PatternScope>
        <line x1={1} x2={drawnPx - 1} y1={60.5} y2={60.5} stroke="var(--ink)" strokeWidth={1.5} />
        {familyRuns(towers).map((run) => {
          const words = `${stepFamily(run.family).words} ${Math.round(run.seconds / 60)}`;
          const room = xOf(run.toSeconds) - xOf(run.fromSeconds);
          if (room < words.length * 6.2) return null;
          return (
            <text
              key={run.fromSeconds}
              x={xOf(run.fromSeconds)}
              y={76}
              fontSize={11.5}
              fontWeight={run.family === 'scissor' ? 600 : 400}
              fill={run.family === 'scissor' ? 'var(--ink)' : 'var(--slate)'}
            >
              {words}
            </text>
          );
        })}
      </svg>
    </div>
  );
}

/** Neighbouring towers of one pet and family, summed. */
function familyRuns(towers: readonly Tower[]) {
  const runs: {
    petId: string;
    family: Tower['family'];
    fromSeconds: number;
    toSeconds: number;
    seconds: number;
  }[] = [];
  for (const tower of towers) {
    const { petId, family, fromSeconds, toSeconds } = tower;
    const seconds = toSeconds - fromSeconds;
    const last = runs.at(-1);
    if (last && last.petId === petId && last.family === family) {
      last.toSeconds = toSeconds;
      last.seconds += seconds;
    } else runs.push({ petId, family, fromSeconds, toSeconds, seconds });
  }
  return runs;
}
