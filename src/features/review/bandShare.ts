export interface BandVisit {
  forecastSeconds: number;
  p10Seconds: number;
  p90Seconds: number;
  clockSeconds: number;
}

export interface BandShare {
  visits: number;
  inside: number;
  /** Whole percent inside, null without visits. */
  percent: number | null;
  /** What chance alone leaves an honest 8-in-10 band for so many visits, whole percent. */
  fromPercent: number;
  toPercent: number;
  verdict: 'honest' | 'tooNarrow' | 'tooWide' | 'tooFew';
}

/** Fewer visits say nothing about a band. */
const leastVisits = 10;

/**
 * How many visits fell inside their own 8-in-10 band. `fromPercent`–`toPercent` is the central 95 %
 * of the binomial with p = 0.8 and n visits, summed exactly.
 */
export function bandShare(visits: readonly BandVisit[]): BandShare {
  const n = visits.length;
  const inside = visits.filter(isInside).length;
  const [low, high] = binomialRange(n, 0.8, 0.025);
  const share = { visits: n, inside, percent: n === 0 ? null : Math.round((100 * inside) / n) };
  const range = {
    fromPercent: n === 0 ? 0 : Math.round((100 * low) / n),
    toPercent: n === 0 ? 100 : Math.round((100 * high) / n),
  };
  if (n < leastVisits) return { ...share, ...range, verdict: 'tooFew' };
  const verdict = inside < low ? 'tooNarrow' : inside > high ? 'tooWide' : 'honest';
  return { ...share, ...range, verdict };
}

export function isInside(visit: BandVisit): boolean {
  return visit.clockSeconds >= visit.p10Seconds && visit.clockSeconds <= visit.p90Seconds;
}

/** Counts between which all but `tail` of the chance on either side lies. */
export function binomialRange(n: number, p: number, tail: number): [number, number] {
  let low = n;
  let high = 0;
  let sum = 0;
  // In logarithms: (1 - p)ⁿ itself is 0 to a computer from a few hundred visits on.
  let logChance = n * Math.log(1 - p);
  for (let k = 0; k <= n; k += 1) {
    const before = sum;
    sum += Math.exp(logChance);
    if (before < 1 - tail && sum > tail) {
      low = Math.min(low, k);
      high = Math.max(high, k);
    }
    logChance += Math.log(((n - k) * p) / ((k + 1) * (1 - p)));
  }
  return [low, high];
}
