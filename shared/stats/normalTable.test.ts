import { expect, it } from 'vitest';
import { meanExcess, unitLoss, upperTail } from './normalTable.ts';

const density = (x: number) => Math.exp((-x * x) / 2) / Math.sqrt(2 * Math.PI);

/** Simpson's rule from z to z + 12, apart from the table's erfc. */
function integrate(f: (x: number) => number, from: number): number {
  const steps = 4000;
  const h = 12 / steps;
  let sum = f(from) + f(from + 12);
  for (let i = 1; i < steps; i += 1) sum += (i % 2 === 1 ? 4 : 2) * f(from + i * h);
  return (sum * h) / 3;
}

it('agrees with a numeric integral of the density', () => {
  for (let z = -5.5; z <= 5.5; z += 0.113) {
    const tail = integrate(density, z);
    const loss = integrate((x) => (x - z) * density(x), z);
    expect(Math.abs(upperTail(z) - tail)).toBeLessThan(2e-5);
    expect(Math.abs(unitLoss(z) - loss)).toBeLessThan(2.5e-5);
    expect(Math.abs(meanExcess(z) / (loss / tail) - 1)).toBeLessThan(2e-3);
  }
});

it('knows the published values', () => {
  // NIST/SEMATECH e-Handbook table 1.3.6.7.1: Φ(1.28) = 0.89973, Φ(1.96) = 0.97500.
  expect(upperTail(1.28)).toBeCloseTo(1 - 0.89973, 4);
  expect(upperTail(1.96)).toBeCloseTo(0.025, 4);
  expect(upperTail(-1.96)).toBeCloseTo(0.975, 4);
  expect(unitLoss(0)).toBeCloseTo(0.39894, 4);
});

it('stays monotone and ends in nothing and everything', () => {
  for (let z = -7; z < 7; z += 0.003)
    expect(upperTail(z + 0.003)).toBeLessThanOrEqual(upperTail(z));
  expect([upperTail(9), upperTail(-9), unitLoss(9), unitLoss(-9)]).toEqual([0, 1, 0, 9]);
});
