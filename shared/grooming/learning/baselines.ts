import type { GroomRecord } from './groomRecord.ts';
import { toldPermille, type ToldSeconds } from './pinballLoss.ts';

/** What a groomer without a model would say: fitted to past records, asked for a coming one. */
export interface Baseline {
  tell: (record: GroomRecord) => ToldSeconds;
}

/**
 * The mean of past visits of that breed, all past visits for a breed not met. Its quantiles are those
 * of past actual / mean, so the baseline is as well spread as it can be. Records under five minutes
 * and over five hours are left out, as anybody would.
 */
export function breedMean(past: readonly GroomRecord[]): Baseline {
  const good = past.filter(plausible);
  const whole = mean(good.map(workOf));
  const byBreed = new Map<string | null, number[]>();
  for (const record of good)
    byBreed.set(record.breedId, [...(byBreed.get(record.breedId) ?? []), workOf(record)]);
  const means = new Map([...byBreed].map(([breedId, seconds]) => [breedId, mean(seconds)]));
  const centre = (record: GroomRecord) => means.get(record.breedId) ?? whole;
  const ratios = quantiles(good.map((record) => workOf(record) / centre(record)));
  return { tell: (record) => spread(centre(record), ratios) };
}

/**
 * The pet's last visit in the same style, else its last visit, else the breed's mean. `past` is in
 * order of time; quantiles are those of past actual / last, so they hold what a repeat varies by.
 */
export function lastVisit(past: readonly GroomRecord[]): Baseline {
  const fallback = breedMean(past);
  const last = new Map<string, number>();
  const repeats: number[] = [];
  const find = (record: GroomRecord) =>
    last.get(`${record.petId} ${record.styleId}`) ?? last.get(record.petId);
  for (const record of past.filter(plausible)) {
    const before = find(record);
    if (before !== undefined) repeats.push(workOf(record) / before);
    last.set(record.petId, workOf(record));
    last.set(`${record.petId} ${record.styleId}`, workOf(record));
  }
  const ratios = quantiles(repeats);
  return {
    tell: (record) => {
      const before = find(record);
      return before === undefined ? fallback.tell(record) : spread(before, ratios);
    },
  };
}

function workOf({ actualSeconds, restSeconds }: GroomRecord): number {
  return actualSeconds - restSeconds;
}

function plausible(record: GroomRecord): boolean {
  return workOf(record) >= 300 && workOf(record) <= 18_000;
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / Math.max(1, values.length);
}

function quantiles(values: readonly number[]): ToldSeconds {
  const sorted = [...values].sort((a, b) => a - b);
  const at = (permille: number) =>
    sorted[Math.min(sorted.length - 1, Math.floor((permille / 1000) * sorted.length))] ?? 1;
  return toldPermille.map(at) as unknown as ToldSeconds;
}

function spread(centre: number, ratios: ToldSeconds): ToldSeconds {
  return ratios.map((ratio) => ratio * centre) as unknown as ToldSeconds;
}
