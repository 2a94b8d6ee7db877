import type { AgeBand } from './age.ts';
import { regions, type Body } from './body.ts';
import type { GroomModel } from './groomModel.ts';
import type { MattingLevel, PetFacts, PlanChange, Region, RegionCut, Style } from './types.ts';

/** What the coat leaves of the style, and the mat work before the bath. */
export interface CoatPlan {
  /** Cuts after a change of plan; regions not named are left. */
  cuts: Partial<Record<Region, RegionCut>>;
  matSeconds: number;
  matRegions: Region[];
  /** Clipping matted coat off before the bath; 0 unless the plan changed. */
  clipOffSeconds: number;
  clippedShare: number;
  change: PlanChange | null;
}

/**
 * Mats come off before water, and only within one humane limit per pet and visit. Heavy and pelted
 * regions are never dematted; when lighter mats would go past the limit, the worst of them are
 * clipped short as well, until the rest fits. Clipping short always needs the household's consent.
 * `meanPerMedian` (≥ 1) turns the step's median into its mean, which is what the limit binds.
 * `usedSeconds` is mat work already done today: the limit is summed over regions and taps.
 */
export function planCoat(
  pet: PetFacts,
  style: Style,
  body: Body,
  age: AgeBand,
  model: GroomModel,
  meanPerMedian: number,
  usedSeconds = 0,
): CoatPlan {
  const levels = matLevels(pet, body);
  const whole = pet.coatState.mattingByRegion === undefined;
  const perVisit = age === 'grown' ? model.mats.limitSeconds : model.mats.gentleLimitSeconds;
  const limit = Math.max(0, perVisit - usedSeconds);
  const short = regions.filter((region) => levels[region] >= 3);
  let worst = 2;
  let work = matWork(levels, short, body, model, whole);
  while (work.seconds * meanPerMedian > limit && worst > 0) {
    short.push(...regions.filter((region) => levels[region] === worst));
    work = matWork(levels, short, body, model, whole);
    worst -= 1;
  }
  // Face, feet and tail hold little coat: even on a matted pet they can usually be kept.
  const clipped = whole ? short.filter((region) => !KEPT.includes(region)) : short;
  if (clipped.length === 0) {
    return {
      cuts: style.cuts,
      matSeconds: work.seconds,
      matRegions: work.regions,
      clipOffSeconds: 0,
      clippedShare: 0,
      change: null,
    };
  }
  const clippedShare = clipped.reduce((sum, region) => sum + body.shares[region], 0);
  const { fixedSeconds, perM2Seconds } = model.mats.clipOff;
  const clipOff =
    fixedSeconds * Math.min(1, 0.3 + clippedShare) +
    (perM2Seconds * body.surfaceCm2 * clippedShare) / 10_000;
  return {
    cuts: { ...style.cuts, ...Object.fromEntries(clipped.map((region) => [region, SHORT])) },
    matSeconds: work.seconds,
    matRegions: work.regions,
    clipOffSeconds: Math.round(clipOff),
    clippedShare,
    change: {
      kind: 'clipShort',
      words:
        usedSeconds > 0
          ? `Clip short with consent: the ${perVisit / 60} min of mat work a visit are used up.`
          : `Clip short with consent: mats need more than ${limit / 60} min of brushing out.`,
      regions: clipped,
      needsConsent: true,
    },
  };
}

/** #7F with growth: short, and still off the skin. */
const SHORT: RegionCut = { tool: 'blade', lengthTenthsMm: 32, direction: 'with' };

const KEPT: readonly Region[] = ['head', 'feet', 'tail', 'sanitary'];

/** Coats that do not mat, or are meant to be felted. */
const MATLESS = ['smooth', 'hairless', 'corded'];

function matLevels(pet: PetFacts, body: Body): Record<Region, MattingLevel> {
  const { matting, mattingByRegion } = pet.coatState;
  const level = (region: Region): MattingLevel =>
    MATLESS.includes(body.coatType)
      ? 0
      : mattingByRegion
        ? (mattingByRegion[region] ?? 0)
        : matting;
  return Object.fromEntries(regions.map((region) => [region, level(region)])) as Record<
    Region,
    MattingLevel
  >;
}

function matWork(
  levels: Record<Region, MattingLevel>,
  short: readonly Region[],
  body: Body,
  model: GroomModel,
  whole: boolean,
): { seconds: number; regions: Region[] } {
  let seconds = 0;
  const matted: Region[] = [];
  for (const [level, rate] of [
    [1, model.mats.light],
    [2, model.mats.moderate],
  ] as const) {
    const here = regions.filter((region) => levels[region] === level && !short.includes(region));
    if (here.length === 0) continue;
    matted.push(...here);
    const share = here.reduce((sum, region) => sum + body.shares[region], 0);
    // A knot or two behind the ears is not a whole pet: a region alone costs a quarter of the start.
    const start = whole ? 1 : Math.min(1, here.length / 4);
    seconds += rate.fixedSeconds * start + (rate.perM2Seconds * body.surfaceCm2 * share) / 10_000;
  }
  return { seconds: Math.round(seconds), regions: whole ? [] : matted };
}
