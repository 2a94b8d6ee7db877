import { createContext, useContext, useId } from 'react';
import type { StepFamily } from '#shared/grooming/types.ts';
import { stepFamily } from './stepFamilies.ts';

/**
 * The patterns of one drawing. Ids are the drawing's own: a hidden drawing's patterns would
 * otherwise leave another one unpainted.
 */
export function StripPatterns({ id }: { id: string }) {
  return (
    <defs>
      <pattern id={`${id}-wash`} width="5" height="5" patternUnits="userSpaceOnUse">
        <rect width="5" height="5" fill="var(--mint)" />
        <circle cx="1.4" cy="1.4" r="0.65" fill="#3f8478" />
        <circle cx="3.9" cy="3.9" r="0.65" fill="#3f8478" />
      </pattern>
      <pattern id={`${id}-dry`} width="4" height="4" patternUnits="userSpaceOnUse">
        <rect width="4" height="4" fill="var(--honey)" />
        <rect width="0.8" height="4" x="1.5" fill="#a87d22" />
      </pattern>
      <pattern
        id={`${id}-scissor`}
        width="6"
        height="6"
        patternUnits="userSpaceOnUse"
        patternTransform="rotate(35)"
      >
        <rect width="6" height="6" fill="var(--apricot)" />
        <rect width="2" height="6" fill="#f7c9a6" />
      </pattern>
      <pattern id={`${id}-wrap`} width="6" height="6" patternUnits="userSpaceOnUse">
        <rect width="6" height="6" fill="var(--liver)" />
        <path d="M3 1.6v2.8M1.6 3h2.8" stroke="#c9a894" strokeWidth="0.8" />
      </pattern>
      <pattern
        id={`${id}-over`}
        width="5"
        height="5"
        patternUnits="userSpaceOnUse"
        patternTransform="rotate(-45)"
      >
        <rect width="1.4" height="5" fill="var(--rosette)" opacity="0.55" />
      </pattern>
    </defs>
  );
}

const PatternId = createContext('');

/** Gives the drawing's pattern id to the towers inside. */
export const PatternScope = PatternId.Provider;

/** An id that may stand in `url(#…)`. */
export function usePatternId(): string {
  return `strip${useId().replace(/[^a-zA-Z0-9]/g, '')}`;
}

/** The paint of a family: its pattern, or its plain colour (prep, clip). */
export function useStepPaint(): (family: StepFamily) => string {
  const id = useContext(PatternId);
  return (family) =>
    family === 'prep' || family === 'clip' ? stepFamily(family).color : `url(#${id}-${family})`;
}

export function useOvertimePaint(): string {
  return `url(#${useContext(PatternId)}-over)`;
}
