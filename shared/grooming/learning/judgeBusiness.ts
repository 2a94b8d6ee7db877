import { breedMean, lastVisit } from './baselines.ts';
import type { BusinessSettings } from './businessSettings.ts';
import { fitGroomModel } from './fitGroomModel.ts';
import { meanPinball, type ToldSeconds } from './pinballLoss.ts';
import { predictMinutes, toldOf } from './predictMinutes.ts';
import { simulateBusiness } from './simulateBusiness.ts';

/** How forecasts did on one simulated business's held-out visits. */
export interface BusinessJudgement {
  /** Mean pinball loss over the told quantiles, seconds. */
  learnedSeconds: number;
  plainSeconds: number;
  breedMeanSeconds: number;
  lastVisitSeconds: number;
  heldOut: number;
  /** Held-out visits whose true minutes lay between the learned P10 and P90. */
  covered: number;
}

/**
 * Runs one simulated business. Held-out visits are told in blocks of `block`; before each block the
 * fit and both baselines learn from every visit before it, as a nightly job would.
 */
export function judgeBusiness(
  settings: BusinessSettings,
  random: () => number,
  block: number,
): BusinessJudgement {
  const all = simulateBusiness(settings, random);
  const sums = { learned: 0, plain: 0, breed: 0, last: 0 };
  const none = fitGroomModel([]);
  let covered = 0;
  for (let from = all.length - settings.heldOutVisits; from < all.length; from += block) {
    const past = all.slice(0, from).map(({ record }) => record);
    const fit = fitGroomModel(past);
    const breed = breedMean(past);
    const last = lastVisit(past);
    for (const { record, trueSeconds } of all.slice(from, from + block)) {
      const loss = (told: ToldSeconds) => meanPinball(trueSeconds, told);
      const told = toldOf(predictMinutes(fit, record, record));
      sums.learned += loss(told);
      sums.plain += loss(toldOf(predictMinutes(none, record, record)));
      sums.breed += loss(breed.tell(record));
      sums.last += loss(last.tell(record));
      if (trueSeconds >= told[0] && trueSeconds <= told[3]) covered += 1;
    }
  }
  const heldOut = settings.heldOutVisits;
  return {
    learnedSeconds: sums.learned / heldOut,
    plainSeconds: sums.plain / heldOut,
    breedMeanSeconds: sums.breed / heldOut,
    lastVisitSeconds: sums.last / heldOut,
    heldOut,
    covered,
  };
}

/** The acceptance band of an honest 80 % interval: binomial, 95 %, normal approximation. */
export function coverageBand(n: number): [number, number] {
  const half = 1.96 * Math.sqrt(n * 0.8 * 0.2);
  return [Math.ceil(0.8 * n - half), Math.floor(0.8 * n + half)];
}
