import { distribution } from '../distribution.ts';
import type { Distribution, StepForecast } from '../types.ts';
import { logVarianceOf } from './goodSeconds.ts';
import type { GroomFit } from './groomFit.ts';
import { type LearnedNames, learnedWords } from './learnedWords.ts';
import { predictMinutes, type PredictFor, stepLean } from './predictMinutes.ts';

/** What a forecast says about its learning. */
export interface LearnedNote {
  version: string;
  /** Finished visits of this pet; of this groomer (0 when none is chosen); of this coat and style. */
  petVisits: number;
  groomerVisits: number;
  coatStyleVisits: number;
  learnedPermille: number;
  /** SD of the learned lean's own error, permille of the minutes: 50 = ±5 %. */
  leanSePermille: number;
  words: string[];
}

/**
 * A plain pet forecast with what was learned put in: every step's median, mean and variance, the
 * whole pet's quantiles, and a reason per step. Returned as it was, with a note, when the business has
 * no records. Invariants hold: median = base + Σ reasons, mean = Σ steps' means.
 */
export function learnForecast<T extends Distribution & { steps: StepForecast[] }>(
  forecast: T,
  fit: GroomFit,
  who: PredictFor,
  names: LearnedNames = {},
): T & { learned: LearnedNote } {
  const whole = predictMinutes(fit, who, { forecast, steps: forecast.steps });
  const visitsOf = (key: string) => fit.effects[key]?.records ?? 0;
  const learned: LearnedNote = {
    version: fit.version,
    petVisits: visitsOf(`pet ${who.petId}`),
    groomerVisits: who.groomerId === null ? 0 : visitsOf(`groomer ${who.groomerId}`),
    coatStyleVisits: visitsOf(`coatStyle ${who.coatStyle}`),
    learnedPermille: whole.learnedPermille,
    leanSePermille: Math.round(1000 * whole.leanSe),
    words: learnedWords(fit, who, names, forecast.steps),
  };
  if (fit.records === 0) return { ...forecast, learned };

  const meanSeconds = whole.medianSeconds * Math.exp(whole.sigma ** 2 / 2);
  const leaned = forecast.steps.map(
    (step) => step.meanSeconds * Math.exp(stepLean(fit, who, step.family)),
  );
  const scale = meanSeconds / leaned.reduce((sum, seconds) => sum + seconds, 0);
  const widen = whole.sigma ** 2 / logVarianceOf(forecast);
  const steps = forecast.steps.map((step, index) =>
    leanStep(step, leaned[index]! * scale, widen, reasonText(learned)),
  );
  const stepsMean = steps.reduce((sum, step) => sum + step.meanSeconds, 0);
  const moments = {
    meanSeconds: stepsMean,
    varianceSeconds2: stepsMean ** 2 * Math.expm1(whole.sigma ** 2),
  };
  return { ...forecast, ...distribution(moments), steps, learned };
}

function leanStep(step: StepForecast, mean: number, widen: number, text: string): StepForecast {
  const meanSeconds = Math.max(1, Math.round(mean));
  const sigma2 = logVarianceOf(step) * widen;
  const medianSeconds = Math.max(1, Math.round(meanSeconds * Math.exp(-sigma2 / 2)));
  const deltaSeconds = medianSeconds - step.medianSeconds;
  return {
    ...step,
    medianSeconds,
    meanSeconds,
    varianceSeconds2: Math.round(meanSeconds ** 2 * Math.expm1(sigma2)),
    reasons: deltaSeconds === 0 ? step.reasons : [...step.reasons, { text, deltaSeconds }],
  };
}

function reasonText({ petVisits, groomerVisits }: LearnedNote): string {
  if (petVisits > 0) return `learned from ${visits(petVisits)} of this pet`;
  if (groomerVisits > 0) return `learned from ${visits(groomerVisits)} with this groomer`;
  return 'learned from this business’s visits';
}

function visits(count: number): string {
  return count === 1 ? '1 visit' : `${count} visits`;
}
