import { unitLoss, upperTail } from '#shared/stats/normalTable.ts';

/**
 * When a van gets somewhere: mean, variance and third central moment in whole seconds to the first,
 * second and third power. The third moment carries the long right tail of grooming minutes: without
 * it the chance of being late is up to 5 points off after one stop (see the simulation test).
 *
 * The functions below CHANGE the spread they are given: one is walked down a run, without garbage.
 * Only + − × ÷, floor and the square root (exact by IEEE 754) are used, and everything is rounded
 * at each step, so that every machine gets the same integers.
 */
export interface ArrivalSpread {
  meanSeconds: number;
  varianceSeconds2: number;
  thirdSeconds3: number;
}

/** A moment known for sure. */
export function certainAt(seconds: number): ArrivalSpread {
  return { meanSeconds: seconds, varianceSeconds2: 0, thirdSeconds3: 0 };
}

/** Adds an independent log-normal duration given by its first two moments. */
export function addDuration(
  spread: ArrivalSpread,
  meanSeconds: number,
  varianceSeconds2: number,
): void {
  spread.meanSeconds += meanSeconds;
  if (varianceSeconds2 <= 0 || meanSeconds <= 0) return;
  spread.varianceSeconds2 += varianceSeconds2;
  // Log-normal skewness is 3c + c³ with c = σ/m, so μ₃ = (σ⁴/m)(3 + σ²/m²): no root, no power.
  const ratio = varianceSeconds2 / meanSeconds;
  spread.thirdSeconds3 += Math.round(ratio * varianceSeconds2 * (3 + ratio / meanSeconds));
}

/** Whoever is there before `seconds` waits: the spread becomes that of max(arrival, seconds). */
export function waitUntil(spread: ArrivalSpread, seconds: number): void {
  const variance = spread.varianceSeconds2;
  if (variance === 0) {
    if (spread.meanSeconds < seconds) spread.meanSeconds = seconds;
    return;
  }
  const sigma = Math.sqrt(variance);
  const z = (seconds - spread.meanSeconds) / sigma;
  if (z < -5) return;
  if (z > 5) {
    spread.meanSeconds = seconds;
    spread.varianceSeconds2 = 0;
    spread.thirdSeconds3 = 0;
    return;
  }
  // Moments of the part beyond z, normal with a first-order skewness term (Edgeworth).
  const skew = skewness(spread, sigma);
  const tail = upperTail(z);
  const loss = unitLoss(z);
  const density = loss + z * tail;
  const first = loss + (skew / 6) * z * density;
  const second = tail - z * loss + (skew / 3) * density;
  const third = (z * z + 2) * density - z * (z * z + 3) * tail + skew * tail;
  const mean = first > 0 ? first : 0;
  const spare = second - mean * mean;
  spread.meanSeconds = seconds + Math.round(sigma * mean);
  spread.varianceSeconds2 = spare > 0 ? Math.round(variance * spare) : 0;
  const cubed = variance * sigma * (third - 3 * mean * second + 2 * mean * mean * mean);
  spread.thirdSeconds3 = spread.varianceSeconds2 > 0 && cubed > 0 ? Math.round(cubed) : 0;
}

/** Chance (permille) of being there by `seconds`. */
export function chanceByPermille(spread: ArrivalSpread, seconds: number): number {
  if (spread.varianceSeconds2 === 0) return spread.meanSeconds <= seconds ? 1000 : 0;
  const sigma = Math.sqrt(spread.varianceSeconds2);
  const z = (seconds - spread.meanSeconds) / sigma;
  if (z > 5) return 1000;
  if (z < -5) return 0;
  const tail = upperTail(z);
  const density = unitLoss(z) + z * tail;
  const skew = skewness(spread, sigma);
  const z2 = z * z;
  // Edgeworth to the second order, a log-normal's excess kurtosis being close to 16/9 of its skewness².
  // The second term is right for sums and too much after a wait: half of it keeps both within a point.
  const second = (2 / 27) * (z2 - 3) + (z2 * z2 - 10 * z2 + 15) / 72;
  const bend = (skew / 6) * (z2 - 1) + 0.5 * skew * skew * z * second;
  const chance = 1 - tail - bend * density;
  return Math.round(1000 * (chance < 0 ? 0 : chance > 1 ? 1 : chance));
}

/** Mean seconds past `seconds`, counting only late arrivals: E[max(0, arrival − seconds)]. */
export function expectedLateSeconds(spread: ArrivalSpread, seconds: number): number {
  const ahead = spread.meanSeconds - seconds;
  if (spread.varianceSeconds2 === 0) return ahead > 0 ? ahead : 0;
  const sigma = Math.sqrt(spread.varianceSeconds2);
  const z = -ahead / sigma;
  if (z > 5) return 0;
  if (z < -5) return ahead;
  const loss = unitLoss(z);
  const density = loss + z * upperTail(z);
  const late = loss + (skewness(spread, sigma) / 6) * z * density;
  return late > 0 ? Math.round(sigma * late) : 0;
}

/** The moment one arrival in ten comes before. */
export function earlySeconds(spread: ArrivalSpread): number {
  return quantileSeconds(spread, -1.2816);
}

/** The moment one arrival in ten comes after. */
export function lateSeconds(spread: ArrivalSpread): number {
  return quantileSeconds(spread, 1.2816);
}

function quantileSeconds(spread: ArrivalSpread, z: number): number {
  if (spread.varianceSeconds2 === 0) return spread.meanSeconds;
  const sigma = Math.sqrt(spread.varianceSeconds2);
  // Cornish–Fisher, first term.
  const shifted = z + (skewness(spread, sigma) / 6) * (z * z - 1);
  return spread.meanSeconds + Math.round(sigma * shifted);
}

function skewness(spread: ArrivalSpread, sigma: number): number {
  const skew = spread.thirdSeconds3 / (spread.varianceSeconds2 * sigma);
  // Past 1.5 the first-order term would make chances below 0; such tails are left a little short.
  return skew > 1.5 ? 1.5 : skew;
}
