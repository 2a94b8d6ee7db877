/** The referee's own normal: density by Math.exp, tail by Simpson's rule, no table. */

export interface Risk {
  mean: number;
  variance: number;
  third: number;
}

/** Risk of max(arrival, until), first-order in skewness. */
export function truncated(risk: Risk, until: number): Risk {
  if (risk.variance === 0) return { ...risk, mean: Math.max(risk.mean, until) };
  const sigma = Math.sqrt(risk.variance);
  const z = (until - risk.mean) / sigma;
  if (z < -5) return risk;
  if (z > 5) return { mean: until, variance: 0, third: 0 };
  const skew = Math.min(1.5, risk.third / sigma ** 3);
  const phi = density(z);
  const q = tail(z);
  const one = Math.max(0, phi - z * q + (skew / 6) * z * phi);
  const two = (1 + z * z) * q - z * phi + (skew / 3) * phi;
  const three = (z * z + 2) * phi - z * (z * z + 3) * q + skew * q;
  const variance = Math.max(0, Math.round(risk.variance * (two - one * one)));
  const third = Math.round(sigma ** 3 * (three - 3 * one * two + 2 * one ** 3));
  return {
    mean: until + Math.round(sigma * one),
    variance,
    third: variance > 0 ? Math.max(0, third) : 0,
  };
}

/** E[max(0, arrival − end)]. */
export function skewedLoss(risk: Risk, end: number): number {
  if (risk.variance === 0) return Math.max(0, risk.mean - end);
  const sigma = Math.sqrt(risk.variance);
  const z = (end - risk.mean) / sigma;
  if (z > 5) return 0;
  if (z < -5) return risk.mean - end;
  const skew = Math.min(1.5, risk.third / sigma ** 3);
  return Math.max(0, sigma * (density(z) - z * tail(z) + (skew / 6) * z * density(z)));
}

/** Mean of work that has already lasted `passed`. */
export function meanGivenLonger(mean: number, variance: number, passed: number): number {
  if (variance === 0) return Math.max(mean, passed);
  const sigma = Math.sqrt(variance);
  const z = (passed - mean) / sigma;
  if (z < -5) return mean;
  return passed + Math.round(sigma * (hazard(z) - z));
}

export function varianceGivenLonger(mean: number, variance: number, passed: number): number {
  if (variance === 0) return 0;
  const sigma = Math.sqrt(variance);
  const z = (passed - mean) / sigma;
  if (z < -5) return variance;
  return Math.max(0, Math.round(variance * (1 + z * hazard(z) - hazard(z) ** 2)));
}

function hazard(z: number): number {
  return density(z) / tail(z);
}

function density(x: number): number {
  return Math.exp((-x * x) / 2) / Math.sqrt(2 * Math.PI);
}

function tail(z: number): number {
  const steps = 400;
  const h = 10 / steps;
  let sum = density(z) + density(z + 10);
  for (let i = 1; i < steps; i += 1) sum += (i % 2 === 1 ? 4 : 2) * density(z + i * h);
  return (sum * h) / 3;
}
