import type { CoatType, FinishLevel, Region, StepFamily, StepKey, Temperament } from './types.ts';

/** Seconds of a step: a fixed part and a part that grows with body surface. */
export interface FixedAndArea {
  fixedSeconds: number;
  perM2Seconds: number;
}

/** Work done region by region: each region starts anew, then grows with its own surface. */
export interface RegionWork {
  fixedByRegionSeconds: Record<Region, number>;
  perM2Seconds: number;
}

/** Every number the forecast uses. Whole seconds and permille; a learned model is another of these. */
export interface GroomModel {
  version: string;
  plain: Record<PlainStep, FixedAndArea>;
  clip: RegionWork & { combPermille: number };
  scissor: RegionWork & { finishPermille: Record<FinishLevel, number> };
  strip: RegionWork & { rolledPermille: number; rolledWithinWeeks: number };
  mats: {
    /** Most mat minutes a pet bears in one visit, and for young or old pets. */
    limitSeconds: number;
    gentleLimitSeconds: number;
    light: FixedAndArea;
    moderate: FixedAndArea;
    clipOff: FixedAndArea;
  };
  coatPermille: Record<CoatType, Partial<Record<StepKey, number>>>;
  temperamentPermille: Record<Temperament, Partial<Record<StepFamily, number>>>;
  firstVisit: { checkInSeconds: number; permille: number };
  /** Coat and nails grown past their time, first match from the longest. */
  overdue: readonly { pastWeeks: number; stepPermille: Partial<Record<StepKey, number>> }[];
  deshedPermille: number;
  undercoatLoadPermille: readonly Partial<Record<StepKey, number>>[];
  soilBathPermille: readonly number[];
  water: {
    fixedMl: number;
    perM2Ml: number;
    coatPermille: Record<CoatType, number>;
    soilPermille: readonly number[];
  };
  /** SD of log seconds × 1000: each step's own, and what all steps of a pet share on a day. */
  spread: { stepPermille: Record<StepKey, number>; dayPermille: number; firstDayPermille: number };
  attentionPermille: Record<StepKey, number>;
}

/** Steps whose time needs no cut plan. */
export type PlainStep =
  'checkIn' | 'nails' | 'ears' | 'tidy' | 'teeth' | 'bath' | 'dry' | 'brush' | 'blend' | 'wrap';

/**
 * Starting values: an experienced groomer's medians, guesses fitted by eye to published minutes at
 * 5, 15, 30 and 50 kg (body surface 0.29, 0.61, 0.98, 1.37 m²): check-in 3/4/4/5 min, nails + ears +
 * tidy 8/10/12/14, bath 8/12/17/25, dry 8/14/22/32, brush 6/9/14/20, clip 8/10/14/18, scissor
 * 20/27/32/38, blend 4/6/8/10, strip 75/95/120/150. To be overwritten by a business's own records.
 *
 * One departure: the same guesses put smooth coats at bath ×1, dry ×0.4 and also call drying their
 * long step, which cannot both be. A short coat wets and rinses fast, so here bath ×0.65, dry ×0.62;
 * the two together come out as before.
 */
export const groomModel: GroomModel = {
  version: 'prior-1',
  plain: {
    checkIn: { fixedSeconds: 156, perM2Seconds: 102 },
    nails: { fixedSeconds: 156, perM2Seconds: 132 },
    ears: { fixedSeconds: 96, perM2Seconds: 84 },
    tidy: { fixedSeconds: 132, perM2Seconds: 120 },
    teeth: { fixedSeconds: 150, perM2Seconds: 30 },
    bath: { fixedSeconds: 144, perM2Seconds: 936 },
    dry: { fixedSeconds: 120, perM2Seconds: 1260 },
    brush: { fixedSeconds: 120, perM2Seconds: 768 },
    blend: { fixedSeconds: 138, perM2Seconds: 336 },
    wrap: { fixedSeconds: 150, perM2Seconds: 60 },
  },
  // Body only (neck, back, belly) comes to 5 min + 9.3 min/m².
  clip: {
    fixedByRegionSeconds: byRegion([120, 60, 60, 120, 120, 60, 60, 120, 30]),
    perM2Seconds: 1420,
    combPermille: 1300,
  },
  // Legs, feet, head, ears, tail come to 15.5 min + 16.8 min/m².
  scissor: {
    fixedByRegionSeconds: byRegion([360, 90, 60, 180, 120, 90, 120, 210, 60]),
    perM2Seconds: 1668,
    finishPermille: { tidy: 850, pet: 1000, full: 1500 },
  },
  // A jacket (neck, back, belly, tail) comes to 54 min + 70 min/m²; a coat kept rolled takes 0.6.
  strip: {
    fixedByRegionSeconds: byRegion([360, 180, 480, 1680, 960, 600, 600, 120, 120]),
    perM2Seconds: 10_500,
    rolledPermille: 600,
    rolledWithinWeeks: 6,
  },
  mats: {
    limitSeconds: 900,
    gentleLimitSeconds: 600,
    light: { fixedSeconds: 204, perM2Seconds: 156 },
    moderate: { fixedSeconds: 480, perM2Seconds: 390 },
    clipOff: { fixedSeconds: 660, perM2Seconds: 840 },
  },
  coatPermille: {
    smooth: { bath: 650, dry: 620, brush: 350, clip: 900 },
    double: { bath: 1300, dry: 1400, clip: 1200, clipOff: 1200 },
    curly: { dry: 1200 },
    drop: { dry: 1200 },
    wire: { bath: 900, dry: 800, brush: 750 },
    combination: {},
    corded: { bath: 1800, dry: 3000 },
    hairless: { bath: 850, dry: 300 },
    catShort: { bath: 800, dry: 900, brush: 800, clip: 1400 },
    catLong: { bath: 1100, dry: 1600, brush: 1800, clip: 1500, clipOff: 1300 },
  },
  temperamentPermille: {
    calm: {},
    restless: { prep: 1150, wash: 1050, dry: 1100, clip: 1150, scissor: 1250 },
    anxious: { prep: 1200, wash: 1100, dry: 1250, clip: 1100, scissor: 1100 },
    nippy: { prep: 1350, wash: 1150, dry: 1150, clip: 1200, scissor: 1250 },
  },
  firstVisit: { checkInSeconds: 300, permille: 1120 },
  overdue: [
    {
      pastWeeks: 16,
      stepPermille: { nails: 1400, ears: 1400, tidy: 1400, brush: 1300, clip: 1100 },
    },
    {
      pastWeeks: 8,
      stepPermille: { nails: 1200, ears: 1200, tidy: 1200, brush: 1150, clip: 1050 },
    },
  ],
  deshedPermille: 1400,
  undercoatLoadPermille: [{}, { dry: 1100, brush: 1200 }, { dry: 1200, brush: 1500 }],
  soilBathPermille: [1000, 1250, 1600],
  // Van practice from memory: about 11–19 l for a small dog, 23–38 l for a large one.
  water: {
    fixedMl: 6_000,
    perM2Ml: 28_000,
    coatPermille: {
      smooth: 750,
      double: 1250,
      curly: 1000,
      drop: 1000,
      wire: 900,
      combination: 1000,
      corded: 1600,
      hairless: 700,
      catShort: 700,
      catLong: 900,
    },
    soilPermille: [1000, 1150, 1350],
  },
  spread: {
    stepPermille: {
      checkIn: 350,
      nails: 280,
      ears: 280,
      tidy: 250,
      teeth: 300,
      mats: 350,
      clipOff: 350,
      strip: 200,
      bath: 200,
      dry: 200,
      brush: 250,
      clip: 200,
      scissor: 200,
      blend: 250,
      wrap: 300,
    },
    dayPermille: 220,
    firstDayPermille: 270,
  },
  attentionPermille: {
    checkIn: 350,
    nails: 550,
    ears: 450,
    tidy: 500,
    teeth: 450,
    mats: 650,
    clipOff: 650,
    strip: 850,
    bath: 400,
    dry: 450,
    brush: 500,
    clip: 650,
    scissor: 1000,
    blend: 800,
    wrap: 250,
  },
};

/** In the order head, ears, neck, back, belly, front legs, back legs, feet, tail; sanitary is a service. */
function byRegion(seconds: readonly number[]): Record<Region, number> {
  const [head, ears, neck, back, belly, foreLegs, hindLegs, feet, tail] = seconds.map(Number);
  return {
    head: head!,
    ears: ears!,
    neck: neck!,
    back: back!,
    belly: belly!,
    foreLegs: foreLegs!,
    hindLegs: hindLegs!,
    feet: feet!,
    tail: tail!,
    sanitary: 0,
  };
}
