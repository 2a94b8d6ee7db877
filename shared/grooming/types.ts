/**
 * Words of the groom-minute model. Everything is plain JSON and every number a whole number:
 * `…Seconds`, `…Grams`, `…Ml`, `…Cm2`, `…TenthsMm` (15 = 1.5 mm), `…Permille` (1000 = as usual).
 */

export type Species = 'dog' | 'cat';

export type CoatType =
  | 'smooth'
  | 'double'
  | 'curly'
  | 'drop'
  | 'wire'
  | 'combination'
  | 'corded'
  | 'hairless'
  | 'catShort'
  | 'catLong';

/** For pets without a weight and breeds without a standard: about 5, 15, 30 and 50 kg in a dog. */
export type SizeClass = 'small' | 'medium' | 'large' | 'giant';

/** Parts of the body a style speaks about; pairs of legs, ears and feet count as one region. */
export type Region =
  | 'head'
  | 'ears'
  | 'neck'
  | 'back'
  | 'belly'
  | 'foreLegs'
  | 'hindLegs'
  | 'feet'
  | 'tail'
  | 'sanitary';

/** `with` growth a blade leaves about twice what it leaves `against` it, a guide comb a little more. */
export type Direction = 'with' | 'against';

/**
 * What happens to one region. Blade and comb lengths are what is left cutting *against* growth,
 * because that is what makers print; `scissor` carries the length aimed at, null = by eye.
 */
export type RegionCut =
  | { tool: 'leave' }
  | { tool: 'blade' | 'comb'; lengthTenthsMm: number; direction: Direction }
  | { tool: 'scissor'; lengthTenthsMm: number | null }
  | { tool: 'strip' };

export type Service = 'bath' | 'deshed' | 'nails' | 'ears' | 'sanitary' | 'pads' | 'teeth';

/** `tidy`: neat, quick · `pet`: the usual good finish · `full`: every surface finished by hand. */
export type FinishLevel = 'tidy' | 'pet' | 'full';

/**
 * What stays of a style when the pet has had enough: `must` is done in any case, `ifAllowed` while
 * the pet bears it, `leave` goes first.
 */
export type PlanBWord = 'must' | 'ifAllowed' | 'leave';

/** A style's plan B. Services and regions not named are `ifAllowed`. */
export interface PlanB {
  services: Partial<Record<Service, PlanBWord>>;
  regions: Partial<Record<Region, PlanBWord>>;
}

/** How a pet is groomed: a cut plan by region, a finish and services. Names are our own. */
export interface Style {
  id: string;
  name: string;
  species: Species;
  /** Coats it suits; others may be asked for, and may raise a caution. */
  coats: readonly CoatType[];
  /** Regions not named are not touched; `leave` says that the region is kept long on purpose. */
  cuts: Partial<Record<Region, RegionCut>>;
  finish: FinishLevel;
  services: readonly Service[];
  /** What to keep when the pet's time on the table runs out; left out = the usual order, `planBOf`. */
  planB?: PlanB;
}

/** `short` is short-nosed (brachycephalic): heat and dryers are a danger. */
export type HeadShape = 'short' | 'medium' | 'long';

/** A breed or variety. Facts only; sources in `breeds.ts`. */
export interface BreedFacts {
  id: string;
  name: string;
  species: Species;
  /** Number in the FCI nomenclature; null for crosses, cats and breeds the FCI does not list. */
  fciNumber: number | null;
  /** Usual adult weights. */
  minGrams: number;
  maxGrams: number;
  coatType: CoatType;
  undercoat: boolean;
  /** A cross: its litter-mates differ by twice and more, so ask the weight or a size class. */
  cross: boolean;
  headShape: HeadShape;
  /** The same as `headShape` being `short`. */
  shortNosed: boolean;
  /** Regions with more (or less) coat-bearing surface than the plain body; 1000 = plain. */
  regionPermille: Partial<Record<Region, number>>;
  /** Most usual first. */
  usualStyleIds: readonly string[];
}

/** 0 none · 1 light · 2 moderate · 3 heavy · 4 pelted (felted to the skin). */
export type MattingLevel = 0 | 1 | 2 | 3 | 4;

/** The coat as last seen or told. */
export interface CoatState {
  /** Whole pet; the worst that is common, not one knot. */
  matting: MattingLevel;
  /** Where it is known better; these regions override `matting`, the others are then clear. */
  mattingByRegion?: Partial<Record<Region, MattingLevel>>;
  /** Loose undercoat: 0 usual · 1 shedding · 2 blowing coat. */
  undercoatLoad: 0 | 1 | 2;
  /** Where it differs; regions not named are as the whole pet. The same for soil and length. */
  undercoatLoadByRegion?: Partial<Record<Region, 0 | 1 | 2>>;
  /** 0 usual · 1 dirty · 2 greasy, muddy or skunked. */
  soil: 0 | 1 | 2;
  soilByRegion?: Partial<Record<Region, 0 | 1 | 2>>;
  /** As measured; null = grown from the last style (see `coatLengths`). */
  lengthTenthsMm: number | null;
  lengthByRegionTenthsMm?: Partial<Record<Region, number>>;
}

export type Temperament = 'calm' | 'restless' | 'anxious' | 'nippy';

/** Keys of the cautions table in `cautions.ts`. */
export type CautionKey =
  // Noted on the pet
  | 'bites'
  | 'feetShy'
  | 'dryerShy'
  | 'heart'
  | 'seizures'
  | 'breathing'
  | 'sedated'
  | 'stitches'
  | 'inSeason'
  | 'pregnant'
  | 'weakJoints'
  | 'thinSkin'
  | 'skinSore'
  | 'earTrouble'
  | 'allergy'
  | 'deafOrBlind'
  | 'fleas'
  | 'ringworm'
  // Follow from breed, age, coat or style
  | 'shortNosed'
  | 'senior'
  | 'young'
  | 'doubleCoatShort'
  | 'matLimit'
  | 'skinAfterMats'
  | 'catHandling'
  // Seen on the day
  | 'openMouthCat'
  | 'panting'
  | 'vomiting'
  | 'heat'
  // Always
  | 'neverAlone'
  | 'dryerFace'
  | 'dryerNoise'
  | 'hotBlade'
  | 'skipTooth'
  | 'shortestBlade'
  | 'earPlucking'
  | 'shampooFresh'
  | 'carbonMonoxide'
  | 'lukewarm'
  | 'catBite';

/** What the forecast needs to know about a pet. */
export interface PetFacts {
  species: Species;
  breedId: string | null;
  /** Beats the breed. null: the breed's middle weight, else `sizeClass`. */
  weightGrams: number | null;
  sizeClass?: SizeClass | null;
  /** Whole years; 0 = under one year. */
  ageYears?: number | null;
  /** Beats the breed: crosses differ within a litter. */
  coatType?: CoatType | null;
  coatState: CoatState;
  temperament: Temperament;
  cautions: readonly CautionKey[];
  /** First time with this business. */
  firstVisit: boolean;
  /** Whole weeks since the last groom; null = not known. */
  weeksSinceLast: number | null;
  /** Cut plan of the last groom, which the coat has grown from; left out = the style asked for. */
  lastCuts?: Style['cuts'] | null;
  /** Most seconds this pet bears on the table; null or left out = by age and health. */
  tableLimitSeconds?: number | null;
}

/** Groups of steps: what a groomer has a pace for, and what a tower on the day strip is filled with. */
export type StepFamily = 'prep' | 'wash' | 'dry' | 'clip' | 'scissor' | 'wrap';

/** Steps in their usual order of work; not every visit has each. */
export type StepKey =
  | 'checkIn'
  | 'nails'
  | 'ears'
  | 'tidy'
  | 'teeth'
  | 'mats'
  | 'clipOff'
  | 'strip'
  | 'bath'
  | 'dry'
  | 'brush'
  | 'clip'
  | 'comb'
  | 'scissor'
  | 'head'
  | 'blend'
  | 'rest'
  | 'wrap';

/** Why a step takes longer or shorter than usual for that size: short words, signed seconds. */
export interface Reason {
  text: string;
  deltaSeconds: number;
}

/** One step of one pet. `medianSeconds = baseSeconds + Σ reasons.deltaSeconds`. */
export interface StepForecast {
  key: StepKey;
  family: StepFamily;
  /** "scissor legs, head, tail" */
  label: string;
  /** For a pet of this size in good order, before any reason. */
  baseSeconds: number;
  medianSeconds: number;
  meanSeconds: number;
  varianceSeconds2: number;
  /** Height of the tower on the day strip: how much attention it takes. Scissor work is 1000. */
  attentionPermille: number;
  reasons: Reason[];
  /** Scissor work region by region, in order: one is finished before the next is begun. */
  sections?: ScissorSection[];
}

/** One region's part of the scissor step. The sections' medians add to the step's. */
export interface ScissorSection {
  region: Region;
  medianSeconds: number;
}

/** Guide-comb passes ahead of the scissors, each leaving less for them with falling returns. */
export interface CombPlan {
  /** The most passes over any region. */
  passes: number;
  /** Regions worth a pass, and how many; the others are scissored straight away. */
  byRegion: { region: Region; passes: number }[];
  /** Usual seconds saved against scissors alone, the passes paid: before handling and pace. */
  savedSeconds: number;
  /** "2 guide-comb passes over legs save 6 min" */
  words: string;
}

/** A border between two lengths that must be melted into each other. */
export interface BlendBorder {
  between: [Region, Region];
  lengthMm: number;
  /** Blade steps between the two lengths. */
  steps: number;
  seconds: number;
}

/** The style asks for more time on the table than the pet should bear. */
export interface OverTable {
  overSeconds: number;
  /** What is left out, in words, and for the screens. */
  words: string;
  leftServices: Service[];
  leftRegions: Region[];
  /** Time on the table under plan B. */
  tableSeconds: number;
  /** Plan B keeps within the limit; if not, split the work over two visits. */
  fits: boolean;
}

/** A log-normal by its moments and usual quantiles. `p50Seconds` equals `medianSeconds`. */
export interface Distribution {
  medianSeconds: number;
  meanSeconds: number;
  varianceSeconds2: number;
  p10Seconds: number;
  p50Seconds: number;
  p80Seconds: number;
  p90Seconds: number;
}

/** A caution that applies, ready to show. `stop`: do not start or carry on until it is cleared. */
export interface CautionNote {
  key: CautionKey;
  words: string;
  stop: boolean;
}

/** Skills a groomer must have: matched against the names in Setup. */
export type Skill = 'cats' | 'hand-stripping' | 'large';

/** Set when the coat does not allow the style: mats come off short, and the household must agree first. */
export interface PlanChange {
  kind: 'clipShort';
  words: string;
  regions: Region[];
  needsConsent: true;
}

/** `given` · `breed` middle of the breed's range · `cross` the same of a cross · `size` a size class. */
export type WeightFrom = 'given' | 'breed' | 'cross' | 'size';

/** One pet's groom minutes. `meanSeconds` is the sum of the steps' means. */
export interface PetForecast extends Distribution {
  steps: StepForecast[];
  planChange: PlanChange | null;
  /** null: nothing for a guide comb to take before the scissors. */
  combPlan: CombPlan | null;
  /** Borders that need blending, longest work first. */
  borders: BlendBorder[];
  /** Coat on arrival by region, measured or grown, in tenths of a millimetre. */
  coatTenthsMm: Record<Region, number>;
  /** Usual seconds in tub and on table, without check-in, rests and wrap-up. */
  tableSeconds: number;
  tableLimitSeconds: number;
  overTable: OverTable | null;
  waterMl: number;
  heaviestGrams: number;
  /** Where the weight came from; a guess widens the spread, and a cross's should be asked for. */
  weightFrom: WeightFrom;
  needs: Skill[];
  cautions: CautionNote[];
  /** Cleaning this pet leaves behind beyond the usual (fleas: contact time of the disinfectant). */
  extraCleanSeconds: number;
  modelVersion: string;
}

/**
 * A groomer's pace: 1000 = usual, 900 = a tenth faster. Families not named are at 1000. Pace is about
 * hands, never about the pet: rests, mat work (bound by what the pet bears), refused dematting and
 * visits ended for the pet are never scaled by it and never count against it (`pacelessSteps`).
 */
export type PaceByFamily = Partial<Record<StepFamily, number>>;
