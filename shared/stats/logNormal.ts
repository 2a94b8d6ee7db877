/** A log-normal: `mu` and `sigma` of the natural logarithm of seconds. */
export interface LogNormal {
  mu: number;
  sigma: number;
}

/** Mean and variance, the form in which durations travel through a plan. */
export interface Moments {
  meanSeconds: number;
  varianceSeconds2: number;
}

/**
 * The log-normal with these moments (Fenton–Wilkinson moment matching).
 * @throws RangeError when the mean is not above zero or the variance is negative.
 */
export function logNormal({ meanSeconds, varianceSeconds2 }: Moments): LogNormal {
  if (!(meanSeconds > 0)) {
    throw new RangeError(`meanSeconds must be above 0, got ${meanSeconds}.`);
  }
  if (!(varianceSeconds2 >= 0)) {
    throw new RangeError(`varianceSeconds2 must be 0 or more, got ${varianceSeconds2}.`);
  }
  const logVariance = Math.log1p(varianceSeconds2 / (meanSeconds * meanSeconds));
  return { mu: Math.log(meanSeconds) - logVariance / 2, sigma: Math.sqrt(logVariance) };
}

/** Moments of a log-normal given by its median and the SD of its logarithm. Not rounded. */
export function momentsFromMedian(medianSeconds: number, sigma: number): Moments {
  const meanSeconds = medianSeconds * Math.exp((sigma * sigma) / 2);
  return { meanSeconds, varianceSeconds2: meanSeconds * meanSeconds * Math.expm1(sigma * sigma) };
}

/**
 * Moments of a sum of log-normals that share one factor: each part is
 * median × exp(own error) × exp(shared error), the shared error having SD `sharedSigma`.
 * Means add; every pair of parts covaries by meanᵢ·meanⱼ·(e^{shared²} − 1).
 * With `sharedSigma` 0 the parts are independent. Not rounded.
 */
export function sumWithSharedFactor(parts: readonly Moments[], sharedSigma: number): Moments {
  const grow = Math.expm1(sharedSigma * sharedSigma);
  let meanSeconds = 0;
  let ownVariance = 0;
  let squares = 0;
  for (const part of parts) {
    meanSeconds += part.meanSeconds;
    ownVariance += part.varianceSeconds2;
    squares += part.meanSeconds * part.meanSeconds;
  }
  const covariances = grow * (meanSeconds * meanSeconds - squares);
  return { meanSeconds, varianceSeconds2: ownVariance + Math.max(0, covariances) };
}

/** The value below which `permille` of 1000 draws fall, in unrounded seconds. */
export function logNormalQuantile({ mu, sigma }: LogNormal, permille: number): number {
  return Math.exp(mu + sigma * standardNormalQuantile(permille / 1000));
}

/**
 * Inverse of the standard normal distribution function for 0 < p < 1.
 * Rational approximation in three ranges after P. J. Acklam (coefficients from memory, checked in
 * the test against printed tables); relative error below 1.2e-9.
 * @throws RangeError when p is not strictly between 0 and 1.
 */
export function standardNormalQuantile(p: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError(`p must lie strictly between 0 and 1, got ${p}.`);
  if (p < LOW) return tail(Math.sqrt(-2 * Math.log(p)));
  if (p > 1 - LOW) return -tail(Math.sqrt(-2 * Math.log(1 - p)));
  const q = p - 0.5;
  const r = q * q;
  return (horner(CENTRE_TOP, r) * q) / horner(CENTRE_BOTTOM, r);
}

const LOW = 0.02425;

const CENTRE_TOP = [
  -39.69683028665376, 220.9460984245205, -275.9285104469687, 138.357751867269, -30.66479806614716,
  2.506628277459239,
];
const CENTRE_BOTTOM = [
  -54.47609879822406, 161.5858368580409, -155.6989798598866, 66.80131188771972, -13.28068155288572,
  1,
];
const TAIL_TOP = [
  -0.007784894002430293, -0.3223964580411365, -2.400758277161838, -2.549732539343734,
  4.374664141464968, 2.938163982698783,
];
const TAIL_BOTTOM = [
  0.007784695709041462, 0.3224671290700398, 2.445134137142996, 3.754408661907416, 1,
];

function tail(q: number): number {
  return horner(TAIL_TOP, q) / horner(TAIL_BOTTOM, q);
}

function horner(coefficients: readonly number[], x: number): number {
  return coefficients.reduce((sum, coefficient) => sum * x + coefficient, 0);
}
