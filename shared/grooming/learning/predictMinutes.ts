import { logNormalQuantile } from '#shared/stats/logNormal.ts';
import type { StepFamily } from '../types.ts';
import { logVarianceOf, medianOf } from './goodSeconds.ts';
import { effectKey, familyLean, type GroomFit, type LearnedGroup, mixLean } from './groomFit.ts';
import { toldPermille, type ToldSeconds } from './pinballLoss.ts';

/** Whose visit is forecast. `groomerId` null: nobody is chosen yet. */
export interface PredictFor {
  groomerId: string | null;
  petId: string;
  coatStyle: string;
}

/** The plain model's word, as a `PetForecast` or a `GroomRecord` holds it. */
export interface PlainForecast {
  forecast: { meanSeconds: number; varianceSeconds2: number };
  steps: readonly { family: StepFamily; medianSeconds: number }[];
}

/** What learning does to the whole pet. */
export interface WholePrediction {
  medianSeconds: number;
  /** SD of log seconds: the day's spread and what is not yet known of pet and groomer. */
  sigma: number;
  /** log of learned ÷ plain median, and the SD of its error. */
  lean: number;
  leanSe: number;
  /** 0 nothing learned of this pet with this groomer, 1000 everything there is. */
  learnedPermille: number;
}

/** Learned median and spread of one whole pet; the plain forecast when nothing was learned. */
export function predictMinutes(
  fit: GroomFit,
  who: PredictFor,
  { forecast, steps }: PlainForecast,
): WholePrediction {
  const plainVariance = logVarianceOf(forecast);
  if (fit.records === 0) {
    const medianSeconds = medianOf(forecast);
    const sigma = Math.sqrt(plainVariance);
    return { medianSeconds, sigma, lean: 0, leanSe: 0, learnedPermille: 0 };
  }
  const { value, variance, unlearned } = addEffects(fit, who);
  const lean = mixLean(fit, steps, who.groomerId, who.coatStyle) + value;
  return {
    medianSeconds: medianOf(forecast) * Math.exp(lean),
    sigma: Math.sqrt(fit.spread ** 2 * plainVariance + variance),
    lean,
    leanSe: Math.sqrt(variance),
    learnedPermille: Math.round(1000 * Math.max(0, 1 - variance / unlearned)),
  };
}

/** P10, P50, P80 and P90 in unrounded seconds. */
export function toldOf({ medianSeconds, sigma }: WholePrediction): ToldSeconds {
  const mu = Math.log(medianSeconds);
  return toldPermille.map((permille) =>
    logNormalQuantile({ mu, sigma }, permille),
  ) as unknown as ToldSeconds;
}

/** The family's part of the lean, for one step. */
export function stepLean(fit: GroomFit, who: PredictFor, family: StepFamily): number {
  return familyLean(fit, family, who.groomerId, who.coatStyle);
}

function addEffects(fit: GroomFit, who: PredictFor) {
  const levels: [LearnedGroup, string | null][] = [
    ['business', ''],
    ['groomer', who.groomerId],
    ['coatStyle', who.coatStyle],
    ['pet', who.petId],
  ];
  let value = 0;
  let variance = 0;
  let unlearned = 0;
  const met: string[] = [];
  for (const [group, level] of levels) {
    const key = effectKey(group, level ?? '');
    const effect = level === null ? undefined : fit.effects[key];
    unlearned += fit.sd[group] ** 2;
    if (!effect) {
      // Not met yet: it borrows the group's mean, and its spread.
      variance += fit.sd[group] ** 2;
      continue;
    }
    value += effect.value;
    variance += effect.se ** 2;
    for (const other of met) variance += 2 * (effect.with?.[other] ?? 0);
    met.push(key);
  }
  return { value, variance: Math.max(variance, 1e-6), unlearned };
}
