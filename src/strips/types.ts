import type { StepFamily } from '#shared/grooming/types.ts';
import type { StopTimes } from '#shared/schedule/types.ts';

/** Drawn data of the day strips: seconds of the day, not yet pixels. Made by `stripOf`. */

/** One step (or several tiny neighbours of one family) of one pet: width is time, height attention. */
export interface Tower {
  key: string;
  petId: string;
  petName: string;
  family: StepFamily;
  fromSeconds: number;
  toSeconds: number;
  attentionPermille: number;
  steps: { label: string; seconds: number; reasons: { text: string; deltaSeconds: number }[] }[];
}

export interface Drive {
  fromSeconds: number;
  toSeconds: number;
  metres: number;
  rough: boolean;
}

export interface StripStop {
  stopId: string;
  /** null for refill, meal, rest and errand. */
  visitId: string | null;
  kind: StopTimes['kind'];
  label: string;
  /** "westie, pet trim"; the place of a refill. */
  words: string;
  state: StopTimes['state'];
  /** Place among the run's visits, 0 first; -1 for what is not a visit. */
  visitIndex: number;
  fromSeconds: number;
  toSeconds: number;
  drive: Drive | null;
  wait: { fromSeconds: number; toSeconds: number } | null;
  towers: Tower[];
  promise: { startSeconds: number; endSeconds: number; level: number } | null;
  arrival: { earlySeconds: number; meanSeconds: number; lateSeconds: number } | null;
  onTimePermille: number | null;
  atRisk: boolean;
  pinned: boolean;
  failedReason: string | null;
}

export interface Strip {
  vanId: string;
  vanName: string;
  groomerName: string;
  shiftStartSeconds: number;
  shiftEndSeconds: number;
  /** Loading before the first drive and wash-down after the last; null when none. */
  load: { fromSeconds: number; toSeconds: number } | null;
  washDown: { fromSeconds: number; toSeconds: number } | null;
  stops: StripStop[];
  home: Drive | null;
  finishSeconds: number;
  overtimeSeconds: number;
  driveMetres: number;
  /** How many rows of promise brackets overlap: 0, 1 or 2. */
  bracketLevels: number;
  /** The fresh tank at its fullest use; null when the van has none. */
  water: { usedMl: number; capacityMl: number; refills: number } | null;
}
