import { bladeSteps } from './blades.ts';
import { regions, type Body } from './body.ts';
import type { Lengths } from './coatLengths.ts';
import type { GroomModel } from './groomModel.ts';
import type { BlendBorder, Region, Style } from './types.ts';

/**
 * Borders that must be blended: neighbours of which at least one was cut and whose lengths then
 * differ by more than one blade step. Seconds grow with the border's length and with the steps past
 * the first; a jump past `mostSteps` is a set line, made no softer. Longest work first.
 */
export function blendBorders(
  cuts: Style['cuts'],
  after: Lengths,
  body: Body,
  model: GroomModel,
): BlendBorder[] {
  const { perMetreStepSeconds, mostSteps } = model.blend;
  const acrossMm = Math.sqrt(body.surfaceCm2) * 10;
  const cut = (region: Region) => (cuts[region]?.tool ?? 'leave') !== 'leave';
  return borders
    .filter(({ between: [one, other] }) => cut(one) || cut(other))
    .map(({ between, permille }) => {
      const steps = bladeSteps(after[between[0]], after[between[1]]);
      const lengthMm = Math.round((acrossMm * permille * bodyFactor(between, body)) / 1000);
      const jump = Math.min(steps, mostSteps) - 1;
      const seconds = Math.round((lengthMm / 1000) * perMetreStepSeconds * Math.max(0, jump));
      return { between, lengthMm, steps: Math.round(steps * 10) / 10, seconds };
    })
    .filter(({ seconds }) => seconds > 0)
    .sort((a, b) => b.seconds - a.seconds);
}

/**
 * Which regions touch, and how long their border is in permille of the square root of the body's
 * surface: both sides of the pet together, so a shoulder counts twice. Our own estimate from a dog
 * of 15 kg (surface 0.61 m², its root 0.78 m) with a trunk of 0.5 m, a neck of 0.4 m round and legs
 * of 0.25 m round; no source found. Sanitary trimming is a service and has no border.
 */
export const borders: readonly { between: [Region, Region]; permille: number }[] = [
  { between: ['head', 'neck'], permille: 400 },
  { between: ['head', 'ears'], permille: 250 },
  { between: ['ears', 'neck'], permille: 100 },
  { between: ['neck', 'back'], permille: 350 },
  { between: ['neck', 'belly'], permille: 200 },
  { between: ['neck', 'foreLegs'], permille: 150 },
  { between: ['back', 'belly'], permille: 1250 },
  { between: ['back', 'foreLegs'], permille: 400 },
  { between: ['back', 'hindLegs'], permille: 500 },
  { between: ['belly', 'foreLegs'], permille: 350 },
  { between: ['belly', 'hindLegs'], permille: 500 },
  { between: ['foreLegs', 'feet'], permille: 300 },
  { between: ['hindLegs', 'feet'], permille: 300 },
  { between: ['back', 'tail'], permille: 120 },
  { between: ['hindLegs', 'tail'], permille: 80 },
];

/** A large ear has a longer root; a plume hangs from the same root as a thin tail. */
function bodyFactor(between: readonly [Region, Region], body: Body): number {
  if (!between.includes('ears')) return 1;
  return Math.sqrt((body.breed?.regionPermille.ears ?? 1000) / 1000);
}

/** Neighbours of a region, for a body diagram. */
export function neighbours(region: Region): Region[] {
  return regions.filter((other) =>
    borders.some(
      ({ between }) => between.includes(region) && between.includes(other) && other !== region,
    ),
  );
}
