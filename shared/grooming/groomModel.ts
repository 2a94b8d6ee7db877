import type {
  CautionKey,
  CoatType,
  FinishLevel,
  Region,
  Species,
  StepFamily,
  StepKey,
  Temperament,
} from './types.ts';
import type { AgeBand } from './age.ts';

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

/** How a coat grows back. Regions named reach another length than the rest. */
export interface CoatGrowth {
  /** Length the coat reaches when nobody cuts it. */
  naturalTenthsMm: number;
  byRegionTenthsMm: Partial<Record<Region, number>>;
  tenthsMmPerWeek: number;
  /** How much of the coat stands off the body, where a guide comb can take it: 1000 = all. */
  standsOffPermille: number;
}

/** How a temper slows steps: by family, but for steps named; feet apart from other scissor work. */
export interface Temper {
  byFamily: Partial<Record<StepFamily, number>>;
  byStep: Partial<Record<StepKey, number>>;
  feet: number;
}

/** A rest on the soft mat after every so many seconds of work. */
export interface RestRule {
  everySeconds: number;
  restSeconds: number;
}

/** Every number the forecast uses. Whole seconds and permille; a learned model is another of these. */
export interface GroomModel {
  version: string;
  plain: Record<PlainStep, FixedAndArea>;
  clip: RegionWork & { combPermille: number };
  /** `perM2Seconds` is finish; bulk comes on top and is what guide-comb passes take. */
  scissor: RegionWork & {
    bulkPerM2Seconds: number;
    finishPermille: Record<FinishLevel, number>;
  };
  guideComb: {
    passFixedSeconds: number;
    passPerM2Seconds: number;
    /** Bulk left by each pass. */
    leftPermille: number;
    mostPasses: number;
    /** More bulk for each blade step of coat past what this many weeks grow. */
    bulkPerStepPermille: number;
    referenceWeeks: number;
  };
  blend: {
    perMetreStepSeconds: number;
    mostSteps: number;
    finishPermille: Record<FinishLevel, number>;
  };
  growth: {
    byCoat: Record<CoatType, CoatGrowth>;
    /** Weeks since the last groom where nobody knows. */
    assumedWeeks: number;
    strippedTenthsMm: number;
    /** What scissoring by eye aims at. */
    byEyeTenthsMm: Record<Region, number>;
    /** Usual coat of a growing coat in order, and how drying and brushing follow its length. */
    usualTenthsMm: number;
    perStepPermille: number;
  };
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
  temperamentPermille: Record<Temperament, Temper>;
  firstVisit: { checkInSeconds: number; byFamilyPermille: Record<StepFamily, number> };
  /** Rests by caution; of several that apply, the one that asks for most. */
  rests: Partial<Record<CautionKey, RestRule>>;
  tableLimit: {
    bySpeciesAge: Record<Species, Record<AgeBand, number>>;
    byCaution: Partial<Record<CautionKey, number>>;
  };
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
  spread: {
    stepPermille: Record<StepKey, number>;
    dayPermille: number;
    firstDayPermille: number;
    /** How far minutes follow a weight that is only guessed: per log of weight. */
    perLogWeightPermille: number;
  };
  attentionPermille: Record<StepKey, number>;
}

/** Steps whose time needs no cut plan. */
export type PlainStep =
  'checkIn' | 'nails' | 'ears' | 'tidy' | 'teeth' | 'bath' | 'dry' | 'brush' | 'wrap';

/**
 * Starting values: an experienced groomer's medians, guesses fitted by eye to published minutes at
 * 5, 15, 30 and 50 kg (body surface 0.29, 0.61, 0.98, 1.37 m²): check-in 3/4/4/5 min, nails + ears +
 * tidy 8/10/12/14, bath 8/12/17/25, dry 8/14/22/32, brush 6/9/14/20, clip 8/10/14/18, scissor
 * 20/27/32/38, blend 4/6/8/10, strip 75/95/120/150. To be overwritten by a business's own records.
 * The scissor minutes are those left after the guide-comb passes that pay; blending is the same
 * minutes spread over borders (it grows with the root of the surface, as borders do). Rates of the
 * comb, coat growth (half an inch a month is common practice; the rest from memory), rests and table
 * limits are our own guesses.
 *
 * One departure: the same guesses put smooth coats at bath ×1, dry ×0.4 and also call drying their
 * long step, which cannot both be. A short coat wets and rinses fast, so here bath ×0.65, dry ×0.62;
 * the two together come out as before.
 */
export const groomModel: GroomModel = {
  version: 'prior-2',
  plain: {
    checkIn: { fixedSeconds: 156, perM2Seconds: 102 },
    nails: { fixedSeconds: 156, perM2Seconds: 132 },
    ears: { fixedSeconds: 96, perM2Seconds: 84 },
    tidy: { fixedSeconds: 132, perM2Seconds: 120 },
    teeth: { fixedSeconds: 150, perM2Seconds: 30 },
    bath: { fixedSeconds: 144, perM2Seconds: 936 },
    dry: { fixedSeconds: 120, perM2Seconds: 1260 },
    brush: { fixedSeconds: 120, perM2Seconds: 768 },
    wrap: { fixedSeconds: 150, perM2Seconds: 60 },
  },
  // Body only (neck, back, belly) comes to 5 min + 9.3 min/m².
  clip: {
    fixedByRegionSeconds: byRegion([120, 60, 60, 120, 120, 60, 60, 120, 30]),
    perM2Seconds: 1420,
    combPermille: 1300,
  },
  // Legs, feet, head, ears, tail of a curly dog after one pass: 15.5 min + 16.7 min/m².
  scissor: {
    fixedByRegionSeconds: byRegion([360, 90, 60, 180, 120, 90, 120, 210, 60]),
    perM2Seconds: 950,
    bulkPerM2Seconds: 1500,
    finishPermille: { tidy: 850, pet: 1000, full: 1600 },
  },
  guideComb: {
    passFixedSeconds: 15,
    passPerM2Seconds: 330,
    leftPermille: 400,
    mostPasses: 4,
    bulkPerStepPermille: 150,
    referenceWeeks: 6,
  },
  // Short body and full legs, 15 kg: 7.2 metres × steps come to 6 min.
  blend: {
    perMetreStepSeconds: 50,
    mostSteps: 6,
    finishPermille: { tidy: 500, pet: 1000, full: 1150 },
  },
  growth: {
    byCoat: {
      smooth: growth(150, 10, 0, { head: 80, ears: 80, feet: 80 }),
      double: growth(500, 25, 250, { head: 150, ears: 250, foreLegs: 250, feet: 150, tail: 900 }),
      curly: growth(1500, 29, 1000),
      drop: growth(2200, 29, 900),
      wire: growth(600, 20, 600, { head: 500, ears: 200 }),
      combination: growth(800, 22, 250, { head: 150, neck: 400, back: 300, feet: 400 }),
      corded: growth(2500, 25, 0),
      hairless: growth(2, 0, 0),
      catShort: growth(200, 15, 0, { head: 100, ears: 50, feet: 100 }),
      catLong: growth(700, 25, 100, { head: 250, ears: 150, foreLegs: 300, feet: 200 }),
    },
    assumedWeeks: 8,
    strippedTenthsMm: 120,
    byEyeTenthsMm: byRegion([350, 450, 300, 250, 300, 400, 400, 400, 500], 150),
    usualTenthsMm: 440,
    perStepPermille: 60,
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
    smooth: { bath: 650, dry: 620, brush: 350, clip: 900, comb: 900 },
    double: { bath: 1300, dry: 1400, clip: 1200, comb: 1200, clipOff: 1200 },
    curly: { dry: 1200 },
    drop: { dry: 1200 },
    wire: { bath: 900, dry: 800, brush: 750 },
    combination: {},
    corded: { bath: 1800, dry: 3000 },
    hairless: { bath: 850, dry: 300 },
    catShort: { bath: 800, dry: 900, brush: 800, clip: 1400, comb: 1400 },
    catLong: { bath: 1100, dry: 1600, brush: 1800, clip: 1500, comb: 1500, clipOff: 1300 },
  },
  temperamentPermille: {
    calm: { byFamily: {}, byStep: {}, feet: 1000 },
    // Moves: dangerous with scissors near eyes and pads.
    restless: {
      byFamily: { prep: 1130, wash: 1050, dry: 1100, clip: 1150, scissor: 1180 },
      byStep: { head: 1350, blend: 1100 },
      feet: 1400,
    },
    // Fears noise and held feet.
    anxious: {
      byFamily: { prep: 1150, wash: 1100, dry: 1150, clip: 1100, scissor: 1080 },
      byStep: { dry: 1320, nails: 1300, blend: 1000 },
      feet: 1250,
    },
    nippy: {
      byFamily: { prep: 1300, wash: 1150, dry: 1150, clip: 1200, scissor: 1200 },
      byStep: { nails: 1400, head: 1350, blend: 1100 },
      feet: 1300,
    },
  },
  firstVisit: {
    checkInSeconds: 300,
    byFamilyPermille: { prep: 1200, wash: 1080, dry: 1120, clip: 1100, scissor: 1130, wrap: 1100 },
  },
  rests: {
    senior: { everySeconds: 2_400, restSeconds: 180 },
    young: { everySeconds: 1_800, restSeconds: 180 },
    heart: { everySeconds: 1_800, restSeconds: 300 },
    weakJoints: { everySeconds: 2_400, restSeconds: 180 },
    pregnant: { everySeconds: 2_400, restSeconds: 180 },
    shortNosed: { everySeconds: 3_600, restSeconds: 180 },
  },
  tableLimit: {
    bySpeciesAge: {
      dog: { young: 4_500, grown: 10_800, old: 7_200 },
      cat: { young: 1_800, grown: 3_600, old: 2_400 },
    },
    byCaution: {
      heart: 3_600,
      seizures: 4_500,
      pregnant: 3_600,
      weakJoints: 5_400,
      sedated: 3_600,
    },
  },
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
      comb: 220,
      scissor: 200,
      head: 250,
      blend: 250,
      rest: 300,
      wrap: 300,
    },
    dayPermille: 220,
    firstDayPermille: 270,
    // A teddy takes 74 min at 5 kg and 181 at 50: ln(181/74) / ln(10).
    perLogWeightPermille: 390,
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
    comb: 600,
    scissor: 1000,
    head: 1000,
    blend: 800,
    rest: 150,
    wrap: 250,
  },
};

/** In the order head, ears, neck, back, belly, front legs, back legs, feet, tail; sanitary is a service. */
function byRegion(values: readonly number[], sanitary = 0): Record<Region, number> {
  const [head, ears, neck, back, belly, foreLegs, hindLegs, feet, tail] = values.map(Number);
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
    sanitary,
  };
}

function growth(
  naturalTenthsMm: number,
  tenthsMmPerWeek: number,
  standsOffPermille: number,
  byRegionTenthsMm: CoatGrowth['byRegionTenthsMm'] = {},
): CoatGrowth {
  return { naturalTenthsMm, byRegionTenthsMm, tenthsMmPerWeek, standsOffPermille };
}
