export type WeightUnit = 'kg' | 'lb';
export type DistanceUnit = 'km' | 'mi';

/** Exact by definition (international avoirdupois pound, 1959). */
const gramsPerPound = 453.59237;
const metresPerMile = 1609.344;

/** Whole grams of a weight a person typed. */
export function toGrams(amount: number, unit: WeightUnit): number {
  return Math.round(unit === 'kg' ? amount * 1000 : amount * gramsPerPound);
}

/** A weight to show or to edit: one decimal. */
export function fromGrams(grams: number, unit: WeightUnit): number {
  const amount = unit === 'kg' ? grams / 1000 : grams / gramsPerPound;
  return Math.round(amount * 10) / 10;
}

export function writeWeight(grams: number, unit: WeightUnit): string {
  return `${fromGrams(grams, unit)} ${unit}`;
}

export function writeDistance(metres: number, unit: DistanceUnit): string {
  const amount = metres / (unit === 'km' ? 1000 : metresPerMile);
  return `${amount < 10 ? Math.round(amount * 10) / 10 : Math.round(amount)} ${unit}`;
}
