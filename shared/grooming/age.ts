import type { Body } from './body.ts';

export type AgeBand = 'young' | 'grown' | 'old';

/**
 * Young: under one year. Old: dogs from 10, heavy dogs (over 30 kg) from 8, cats from 12 (common
 * practice; heavy dogs age sooner). Age not known counts as grown.
 */
export function ageBand(ageYears: number | null | undefined, body: Body): AgeBand {
  if (ageYears == null) return 'grown';
  if (!Number.isInteger(ageYears) || ageYears < 0 || ageYears > 40) {
    throw new RangeError(`ageYears must be whole years from 0 to 40, got ${ageYears}.`);
  }
  if (ageYears < 1) return 'young';
  const oldFrom = body.species === 'cat' ? 12 : body.weightGrams > 30_000 ? 8 : 10;
  return ageYears >= oldFrom ? 'old' : 'grown';
}
