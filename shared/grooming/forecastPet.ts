import { momentsFromMedian, sumWithSharedFactor } from '#shared/stats/logNormal.ts';
import { ageBand } from './age.ts';
import { bodyOf, type Body } from './body.ts';
import { cautionsFor } from './cautionsFor.ts';
import { distribution } from './distribution.ts';
import { draftSteps } from './draftSteps.ts';
import { groomModel, type GroomModel } from './groomModel.ts';
import { addHandling, familyOfStep, restStep, tableSecondsOf } from './handling.ts';
import { planCoat } from './planCoat.ts';
import { secondsOf, type StepDraft } from './stepDraft.ts';
import { overTable, tableLimitSeconds } from './tableLimit.ts';
import type {
  PaceByFamily,
  PetFacts,
  PetForecast,
  ScissorSection,
  Skill,
  StepForecast,
  StepKey,
  Style,
} from './types.ts';

export interface ForecastOptions {
  /** The groomer's pace, 1000 = usual. */
  paceByFamilyPermille?: PaceByFamily;
  /** Another model than the starting values, for example one fitted to a business's records. */
  model?: GroomModel;
  /** Mat work already done on this pet today: the humane limit is one per pet and visit. */
  matSecondsUsed?: number;
}

/**
 * Groom minutes of one pet in one style: steps with medians, spread and reasons, and their sum.
 * Steps are log-normal and share one pet-day effect; the sum is matched by moments. The forecast is
 * of the style asked for; where that is more than the pet should bear, `overTable` has the plan B.
 * @throws RangeError naming the field that is missing or wrong, and what would be right.
 */
export function forecastPet(
  pet: PetFacts,
  style: Style,
  options: ForecastOptions = {},
): PetForecast {
  const model = options.model ?? groomModel;
  if (style.species !== pet.species) {
    throw new RangeError(
      `style "${style.id}" is for a ${style.species}, but species is ${pet.species}.`,
    );
  }
  checkCoatState(pet);
  const body = bodyOf(pet);
  const work = draftWork(pet, style, body, model, options);
  const { plan, cautions, drafts } = work;
  const limit = tableLimitSeconds(pet, work.age, cautions, model);
  const tableSeconds = tableSecondsOf(drafts);
  // The coat has grown from the whole style, whatever is left out of it today.
  const asGrown = { ...pet, lastCuts: pet.lastCuts ?? style.cuts };
  const over = overTable(style, limit, tableSeconds, (less) =>
    tableSecondsOf(draftWork(asGrown, less, body, model, options).drafts),
  );
  const steps = drafts.map((draft) => finishStep(draft, work.sigmaOf(draft.key), model));

  return {
    ...distribution(sumWithSharedFactor(steps, work.daySigma)),
    steps,
    planChange: plan.change,
    combPlan: work.combPlan,
    borders: work.borders,
    coatTenthsMm: work.coatTenthsMm,
    tableSeconds,
    tableLimitSeconds: limit,
    overTable: over,
    waterMl: drafts.some(({ key }) => key === 'bath') ? waterMl(pet, body, model) : 0,
    heaviestGrams: body.weightGrams,
    weightFrom: body.weightFrom,
    needs: skillsNeeded(body, drafts),
    cautions: cautions.map(({ key, words, stop }) => ({ key, words, stop })),
    extraCleanSeconds: Math.max(0, ...cautions.map((caution) => caution.extraCleanSeconds)),
    modelVersion: model.version,
  };
}

/** From here on a pet needs someone sure with large dogs (70 lb, where salons' large prices begin). */
const LARGE_GRAMS = 32_000;

/** Everything up to medians: the part plan B is tried on. */
function draftWork(
  pet: PetFacts,
  style: Style,
  body: Body,
  model: GroomModel,
  options: ForecastOptions,
) {
  const age = ageBand(pet.ageYears, body);
  const { spread } = model;
  const day = pet.firstVisit ? spread.firstDayPermille : spread.dayPermille;
  const weighed = (spread.perLogWeightPermille * body.weightSpreadPermille) / 1000;
  const daySigma = Math.hypot(day, weighed) / 1000;
  const sigmaOf = (key: StepKey) => Math.hypot(spread.stepPermille[key] / 1000, daySigma);
  const matMeanPerMedian = Math.exp(sigmaOf('mats') ** 2 / 2);
  const used = options.matSecondsUsed ?? 0;
  if (!Number.isInteger(used) || used < 0) {
    throw new RangeError(`matSecondsUsed must be whole seconds, 0 or more, got ${used}.`);
  }
  const plan = planCoat(pet, style, body, age, model, matMeanPerMedian, used);
  const cautions = cautionsFor(pet, body, age, plan);
  const barred = new Set(cautions.flatMap((caution) => caution.barred));

  const { steps, ...cut } = draftSteps(pet, style, body, plan, model);
  const drafts = steps.filter(({ key }) => !barred.has(key));
  for (const draft of drafts) {
    addHandling(draft, pet, cautions, model, options.paceByFamilyPermille);
  }
  const rest = restStep(drafts, cautions, model);
  // Rests are spread over the work; they are listed once, before the wrap-up.
  if (rest) drafts.splice(-1, 0, rest);
  return { age, daySigma, sigmaOf, plan, cautions, drafts, ...cut };
}

function finishStep(draft: StepDraft, sigma: number, model: GroomModel): StepForecast {
  const medianSeconds = secondsOf(draft);
  const moments = momentsFromMedian(medianSeconds, sigma);
  return {
    key: draft.key,
    family: familyOfStep[draft.key],
    label: draft.label,
    baseSeconds: draft.baseSeconds,
    medianSeconds,
    meanSeconds: Math.round(moments.meanSeconds),
    varianceSeconds2: Math.round(moments.varianceSeconds2),
    attentionPermille: model.attentionPermille[draft.key],
    reasons: draft.reasons,
    ...(draft.sections && { sections: sectionsOf(draft.sections, medianSeconds) }),
  };
}

/** Sections in whole seconds that add to the step; the last takes what rounding leaves. */
function sectionsOf(sections: readonly ScissorSection[], total: number): ScissorSection[] {
  const whole = sections.reduce((sum, { medianSeconds }) => sum + medianSeconds, 0);
  let left = total;
  return sections.map(({ region, medianSeconds }, index) => {
    const last = index === sections.length - 1;
    const seconds = last ? left : Math.round((total * medianSeconds) / whole);
    left -= seconds;
    return { region, medianSeconds: seconds };
  });
}

function waterMl(pet: PetFacts, body: Body, model: GroomModel): number {
  const { fixedMl, perM2Ml, coatPermille, soilPermille } = model.water;
  // The dirtiest part decides how often the whole pet is rinsed.
  const { soil, soilByRegion } = pet.coatState;
  const dirt = soilPermille[Math.max(soil, ...Object.values(soilByRegion ?? {}))]!;
  const plain = fixedMl + (perM2Ml * body.surfaceCm2) / 10_000;
  const factor = (coatPermille[body.coatType] * dirt) / 1_000_000;
  return Math.round(plain * factor);
}

function skillsNeeded(body: Body, drafts: readonly StepDraft[]): Skill[] {
  const needs: Skill[] = [];
  if (body.species === 'cat') needs.push('cats');
  if (drafts.some(({ key }) => key === 'strip')) needs.push('hand-stripping');
  if (body.weightGrams >= LARGE_GRAMS) needs.push('large');
  return needs;
}

function checkCoatState({ coatState, weeksSinceLast }: PetFacts): void {
  const within = (name: string, value: number, most: number) => {
    if (!Number.isInteger(value) || value < 0 || value > most) {
      throw new RangeError(`${name} must be a whole number from 0 to ${most}, got ${value}.`);
    }
  };
  within('coatState.matting', coatState.matting, 4);
  within('coatState.undercoatLoad', coatState.undercoatLoad, 2);
  within('coatState.soil', coatState.soil, 2);
  for (const [region, level] of Object.entries(coatState.mattingByRegion ?? {})) {
    within(`coatState.mattingByRegion.${region}`, level, 4);
  }
  for (const [region, load] of Object.entries(coatState.undercoatLoadByRegion ?? {})) {
    within(`coatState.undercoatLoadByRegion.${region}`, load, 2);
  }
  for (const [region, soil] of Object.entries(coatState.soilByRegion ?? {})) {
    within(`coatState.soilByRegion.${region}`, soil, 2);
  }
  const longest = 10_000;
  if (coatState.lengthTenthsMm !== null) {
    within('coatState.lengthTenthsMm', coatState.lengthTenthsMm, longest);
  }
  for (const [region, length] of Object.entries(coatState.lengthByRegionTenthsMm ?? {})) {
    within(`coatState.lengthByRegionTenthsMm.${region}`, length, longest);
  }
  if (weeksSinceLast !== null) within('weeksSinceLast', weeksSinceLast, 2_000);
}
