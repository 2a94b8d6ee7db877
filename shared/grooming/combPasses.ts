import { bladeSteps } from './blades.ts';
import type { Body } from './body.ts';
import { cutTenthsMm, grownLengths, type Lengths } from './coatLengths.ts';
import type { GroomModel } from './groomModel.ts';
import { regionWords } from './regionWords.ts';
import type { CombPlan, Region, Style } from './types.ts';

/** Scissor seconds of one region before and after the comb, and the passes that pay. */
export interface ScissorWork {
  region: Region;
  fixedSeconds: number;
  /** Scissors alone on a coat of the usual six weeks. */
  usualSeconds: number;
  /** Scissors alone on this coat. */
  aloneSeconds: number;
  /** Scissors after the passes. */
  afterSeconds: number;
  passes: number;
  passSeconds: number;
}

/**
 * One region's scissor work and the number of guide-comb passes with the least total. Scissor
 * seconds per area are finish + bulk: passes take bulk only, and each leaves `leftPermille` of what
 * the one before left, so returns fall while every pass costs the same. Bulk grows with the blade
 * steps the coat has grown past the length aimed at; a coat that does not stand off holds little.
 *
 * `finishTimes` is what the style's finish and the coat make of scissor seconds, `passTimes` the
 * same for clipper seconds; both count when the passes are weighed. Our own estimate throughout.
 */
export function scissorWork(
  region: Region,
  style: Style,
  arrival: Lengths,
  body: Body,
  model: GroomModel,
  finishTimes: number,
  passTimes: number,
): ScissorWork {
  const { scissor, guideComb, growth } = model;
  const m2 = (body.surfaceCm2 * body.shares[region]) / 10_000;
  const target = cutTenthsMm(style.cuts, region, model)!;
  const reference = grownLengths(style.cuts, guideComb.referenceWeeks, body, model)[region];
  const stands = growth.byCoat[body.coatType].standsOffPermille / 1000;
  const over = (length: number) => (length > target ? bladeSteps(length, target) : 0);
  const bulk = bulkTimes(over(arrival[region]), over(reference), guideComb.bulkPerStepPermille);
  const bulkSeconds = (times: number) => m2 * scissor.bulkPerM2Seconds * stands * times;
  const fixedSeconds = scissor.fixedByRegionSeconds[region];
  const after = (passes: number, times = bulk) =>
    fixedSeconds +
    m2 * scissor.perM2Seconds +
    bulkSeconds(times) * (guideComb.leftPermille / 1000) ** passes;
  const passSeconds = guideComb.passFixedSeconds + m2 * guideComb.passPerM2Seconds;

  // A comb needs an even surface to run on: trunk and legs, not face, feet or tail.
  const combable = COMBED.includes(region);
  let passes = 0;
  while (
    combable &&
    passes < guideComb.mostPasses &&
    (after(passes) - after(passes + 1)) * finishTimes > passSeconds * passTimes
  ) {
    passes += 1;
  }
  return {
    region,
    fixedSeconds,
    usualSeconds: after(0, 1),
    aloneSeconds: after(0),
    afterSeconds: after(passes),
    passes,
    passSeconds,
  };
}

/** The whole plan in data and words; null when no region is worth a pass. */
export function combPlanOf(
  works: readonly ScissorWork[],
  finishTimes: number,
  passTimes: number,
): CombPlan | null {
  const byRegion = works
    .filter(({ passes }) => passes > 0)
    .map(({ region, passes }) => ({ region, passes }));
  if (byRegion.length === 0) return null;
  const saved = works.reduce(
    (sum, { aloneSeconds, afterSeconds, passes, passSeconds }) =>
      sum + (aloneSeconds - afterSeconds) * finishTimes - passes * passSeconds * passTimes,
    0,
  );
  const savedSeconds = Math.round(saved);
  const passes = Math.max(...byRegion.map((each) => each.passes));
  const minutes = Math.round(savedSeconds / 60);
  const save = passes === 1 ? 'saves' : 'save';
  const saves = `${save} ${minutes > 0 ? `${minutes} min` : 'under a minute'}`;
  const where = regionWords(byRegion.map(({ region }) => region));
  return { passes, byRegion, savedSeconds, words: `${passWords(byRegion)} over ${where} ${saves}` };
}

/** "one guide-comb pass", "one to two guide-comb passes" */
export function passWords(byRegion: CombPlan['byRegion']): string {
  const counts = byRegion.map(({ passes }) => passes);
  const [least, most] = [Math.min(...counts), Math.max(...counts)];
  if (most === 1) return 'one guide-comb pass';
  const said = least === most ? NUMBERS[most] : `${NUMBERS[least]} to ${NUMBERS[most]}`;
  return `${said} guide-comb passes`;
}

const COMBED: readonly Region[] = ['neck', 'back', 'belly', 'foreLegs', 'hindLegs'];

const NUMBERS = ['no', 'one', 'two', 'three', 'four', 'five', 'six'];

/**
 * Bulk against the usual: a tenth (tips) where nothing has grown past the length aimed at, all of it
 * at the usual growth, then more with every blade step on top.
 */
function bulkTimes(steps: number, usualSteps: number, perStepPermille: number): number {
  if (usualSteps <= 0) return 1;
  if (steps <= usualSteps) return 0.1 + (0.9 * steps) / usualSteps;
  return Math.min(1.8, 1 + (perStepPermille * (steps - usualSteps)) / 1000);
}
