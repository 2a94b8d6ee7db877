import { leftTenthsMm } from './blades.ts';
import type { Body } from './body.ts';
import type { CoatGrowth, GroomModel } from './groomModel.ts';
import type { CoatType, PetFacts, Region, RegionCut, Style } from './types.ts';

export type Lengths = Record<Region, number>;

/**
 * The coat on arrival by region, in tenths of a millimetre: as measured on the region, else on the
 * whole pet, else grown. Grown means from the last cut plan (the style asked for where none is
 * known) at the coat's rate for the weeks since, never past the coat's natural length. A region the
 * plan says to leave is kept long; of a growing coat's region it does not name nobody knows when it
 * was cut, so it is taken to be of the usual length.
 */
export function coatLengths(pet: PetFacts, style: Style, body: Body, model: GroomModel): Lengths {
  const { lengthTenthsMm, lengthByRegionTenthsMm } = pet.coatState;
  const weeks = pet.weeksSinceLast ?? model.growth.assumedWeeks;
  const grown = grownLengths(pet.lastCuts ?? style.cuts, weeks, body, model);
  return each((region) => lengthByRegionTenthsMm?.[region] ?? lengthTenthsMm ?? grown[region]);
}

/** The coat so many weeks after this cut plan. */
export function grownLengths(
  cuts: Style['cuts'],
  weeks: number,
  body: Body,
  model: GroomModel,
): Lengths {
  const growth = model.growth.byCoat[body.coatType];
  return each((region) => {
    const natural = naturalTenthsMm(growth, region);
    const cut = cutTenthsMm(cuts, region, model) ?? startTenthsMm(cuts, region, body, model);
    return cut === null ? natural : Math.min(natural, cut + growth.tenthsMmPerWeek * weeks);
  });
}

/** What this cut plan leaves of a coat: a cut never lengthens it. */
export function lengthsAfter(cuts: Style['cuts'], arrival: Lengths, model: GroomModel): Lengths {
  const after = each((region) =>
    Math.min(arrival[region], cutTenthsMm(cuts, region, model) ?? Infinity),
  );
  // Feet cut by eye end where the legs end: nobody leaves a boot on a short leg.
  const feet = cuts.feet;
  if (feet?.tool === 'scissor' && feet.lengthTenthsMm === null) {
    after.feet = Math.min(arrival.feet, Math.max(after.foreLegs, after.hindLegs));
  }
  return after;
}

/** What a cut aims at; null where the region is left. */
export function cutTenthsMm(cuts: Style['cuts'], region: Region, model: GroomModel): number | null {
  const cut: RegionCut | undefined = cuts[region];
  if (!cut || cut.tool === 'leave') return null;
  if (cut.tool === 'strip') return model.growth.strippedTenthsMm;
  if (cut.tool === 'scissor') return cut.lengthTenthsMm ?? model.growth.byEyeTenthsMm[region];
  return leftTenthsMm(cut);
}

/** Coats that keep growing: somebody cuts them, whatever this style does. */
export const growingCoats: readonly CoatType[] = ['curly', 'drop'];

function startTenthsMm(
  cuts: Style['cuts'],
  region: Region,
  body: Body,
  model: GroomModel,
): number | null {
  if (!growingCoats.includes(body.coatType) || cuts[region]?.tool === 'leave') return null;
  if (region === 'sanitary') return model.growth.byEyeTenthsMm.sanitary;
  const { tenthsMmPerWeek } = model.growth.byCoat[body.coatType];
  return model.growth.usualTenthsMm - tenthsMmPerWeek * model.guideComb.referenceWeeks;
}

function naturalTenthsMm(growth: CoatGrowth, region: Region): number {
  return growth.byRegionTenthsMm[region] ?? growth.naturalTenthsMm;
}

/** A plain literal: this runs for every keystroke in the style editor, in every plan B. */
function each(length: (region: Region) => number): Lengths {
  return {
    head: length('head'),
    ears: length('ears'),
    neck: length('neck'),
    back: length('back'),
    belly: length('belly'),
    foreLegs: length('foreLegs'),
    hindLegs: length('hindLegs'),
    feet: length('feet'),
    tail: length('tail'),
    sanitary: length('sanitary'),
  };
}
