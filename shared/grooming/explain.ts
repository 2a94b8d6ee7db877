import { durationWords } from './durationWords.ts';
import type { Distribution, PetForecast, Reason, StepForecast } from './types.ts';

/** One step as people read it: its minutes and what made them. */
export interface StepWords {
  label: string;
  /** "44 min" */
  minutes: string;
  /** "+12 min: matting: ears", longest first; changes under half a minute are left out. */
  why: string[];
}

/** The whole pet in words for a card or a phone call. `notes`: what the plan saves, changes or leaves. */
export function explain(forecast: PetForecast): {
  summary: string;
  steps: StepWords[];
  notes: string[];
} {
  const notes = [forecast.planChange?.words, forecast.overTable?.words, forecast.combPlan?.words];
  return {
    summary: summaryWords(forecast),
    steps: forecast.steps.map(stepWords),
    notes: notes.filter((note) => note !== undefined),
  };
}

/** "2 h 14, 8 in 10 between 1 h 57 and 2 h 36" */
export function summaryWords({ medianSeconds, p10Seconds, p90Seconds }: Distribution): string {
  return `${durationWords(medianSeconds)}, 8 in 10 between ${durationWords(p10Seconds)} and ${durationWords(p90Seconds)}`;
}

/** "+12 min: matting" or "−9 min: smooth coat" */
export function reasonWords({ text, deltaSeconds }: Reason): string {
  const sign = deltaSeconds < 0 ? '−' : '+';
  return `${sign}${Math.round(Math.abs(deltaSeconds) / 60)} min: ${text}`;
}

function stepWords({ label, medianSeconds, reasons }: StepForecast): StepWords {
  const told = reasons
    .filter(({ deltaSeconds }) => Math.abs(deltaSeconds) >= 30)
    .sort((a, b) => Math.abs(b.deltaSeconds) - Math.abs(a.deltaSeconds));
  return { label, minutes: durationWords(medianSeconds), why: told.map(reasonWords) };
}
