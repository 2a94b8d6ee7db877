import { distribution } from '../distribution.ts';
import { pacelessSteps } from '../handling.ts';
import type { Distribution, StepForecast } from '../types.ts';
import { logVarianceOf } from './goodSeconds.ts';
import type { GroomFit } from './groomFit.ts';
import { groomWork } from './groomWork.ts';
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
  const work = groomWork(forecast);
  const whole = predictMinutes(fit, who, work);
  const visitsOf = (key: string) => fit.effects[key]?.records ?? 0;
  const learned: LearnedNote = {
    version: fit.version,
    petVisits: visitsOf(`pet ${who.petId}`),
    groomerVisits: who.groomerId === null ? 0 : visitsOf(`groomer ${who.groomerId}`),
    coatStyleVisits: visitsOf(`coatStyle ${who.coatStyle}`),
    learnedPermille: whole.learnedPermille,
    leanSePermille: Math.round(1000 * whole.leanSe),
    words: learnedWords(fit, who, names, work.steps),
  };
  if (fit.records === 0 || work.steps.length === 0) return { ...forecast, learned };

  const lean = ({ family, meanSeconds }: StepForecast) =>
    meanSeconds * Math.exp(stepLean(fit, who, family));
  const workMean = whole.medianSeconds * Math.exp(whole.sigma ** 2 / 2);
  const scale = workMean / work.steps.reduce((sum, step) => sum + lean(step), 0);
  const widen = whole.sigma ** 2 / logVarianceOf(work.forecast);
  const steps = forecast.steps.map((step) =>
    // What the pet bears stays what it bears, however slow the hands.
    pacelessSteps.includes(step.key)
      ? step
      : leanStep(step, lean(step) * scale, widen, reasonText(learned)),
  );
  const restVariance = forecast.varianceSeconds2 - work.forecast.varianceSeconds2;
  const workSeconds = steps.reduce(
    (sum, { key, meanSeconds }) => (key === 'rest' ? sum : sum + meanSeconds),
    0,
  );
  const moments = {
    meanSeconds: steps.reduce((sum, step) => sum + step.meanSeconds, 0),
    varianceSeconds2: workSeconds ** 2 * Math.expm1(whole.sigma ** 2) + restVariance,
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
