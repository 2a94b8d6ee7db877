import { momentsFromMedian, sumWithSharedFactor } from '#shared/stats/logNormal.ts';
import { ageBand } from './age.ts';
import { bodyOf, type Body } from './body.ts';
import type { Caution } from './cautions.ts';
import { cautionsFor } from './cautionsFor.ts';
import { distribution } from './distribution.ts';
import { draftSteps, scale, secondsOf, type StepDraft } from './draftSteps.ts';
import { groomModel, type GroomModel } from './groomModel.ts';
import { planCoat } from './planCoat.ts';
import type {
  PaceByFamily,
  PetFacts,
  PetForecast,
  Skill,
  StepFamily,
  StepForecast,
  StepKey,
  Style,
  Temperament,
} from './types.ts';

export interface ForecastOptions {
  /** The groomer's pace, 1000 = usual. */
  paceByFamilyPermille?: PaceByFamily;
  /** Another model than the starting values, for example one fitted to a business's records. */
  model?: GroomModel;
}

/**
 * Groom minutes of one pet in one style: steps with medians, spread and reasons, and their sum.
 * Steps are log-normal and share one pet-day effect; the sum is matched by moments.
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
  const age = ageBand(pet.ageYears, body);
  const daySigma =
    (pet.firstVisit ? model.spread.firstDayPermille : model.spread.dayPermille) / 1000;
  const sigmaOf = (key: StepKey) => Math.hypot(model.spread.stepPermille[key] / 1000, daySigma);
  const plan = planCoat(pet, style, body, age, model, Math.exp(sigmaOf('mats') ** 2 / 2));
  const cautions = cautionsFor(pet, body, age, plan);
  const barred = new Set(cautions.flatMap((caution) => caution.barred));

  const drafts = draftSteps(pet, style, body, plan, model).filter(({ key }) => !barred.has(key));
  for (const draft of drafts) addHandling(draft, pet, cautions, model, options);
  const steps = drafts.map((draft) => finishStep(draft, sigmaOf(draft.key), model));

  return {
    ...distribution(sumWithSharedFactor(steps, daySigma)),
    steps,
    planChange: plan.change,
    waterMl: drafts.some(({ key }) => key === 'bath') ? waterMl(pet, body, model) : 0,
    heaviestGrams: body.weightGrams,
    needs: skillsNeeded(body, drafts),
    cautions: cautions.map(({ key, words, stop }) => ({ key, words, stop })),
    extraCleanSeconds: Math.max(0, ...cautions.map((caution) => caution.extraCleanSeconds)),
    modelVersion: model.version,
  };
}

/** Which family each step belongs to. */
export const familyOfStep: Record<StepKey, StepFamily> = {
  checkIn: 'prep',
  nails: 'prep',
  ears: 'prep',
  tidy: 'prep',
  teeth: 'prep',
  mats: 'prep',
  clipOff: 'clip',
  strip: 'clip',
  bath: 'wash',
  dry: 'dry',
  brush: 'dry',
  clip: 'clip',
  scissor: 'scissor',
  blend: 'scissor',
  wrap: 'wrap',
};

/** From here on a pet needs someone sure with large dogs (70 lb, where salons' large prices begin). */
const LARGE_GRAMS = 32_000;

const temperamentWords: Record<Temperament, string> = {
  calm: 'calm',
  restless: 'restless',
  anxious: 'anxious',
  nippy: 'nippy',
};

function addHandling(
  draft: StepDraft,
  pet: PetFacts,
  cautions: readonly Caution[],
  model: GroomModel,
  options: ForecastOptions,
): void {
  // Mat work is already bound by what the pet bears; slower hands do not lengthen the limit.
  if (draft.key !== 'mats') {
    const family = familyOfStep[draft.key];
    const temper = model.temperamentPermille[pet.temperament][family] ?? 1000;
    scale(draft, temper, temperamentWords[pet.temperament]);
    for (const { slower } of cautions) {
      for (const rule of slower) {
        if (rule.steps.includes(draft.key)) scale(draft, rule.permille, rule.because);
      }
    }
    if (pet.firstVisit && draft.key !== 'checkIn') {
      scale(draft, model.firstVisit.permille, 'first visit');
    }
    const pace = options.paceByFamilyPermille?.[family] ?? 1000;
    if (!Number.isInteger(pace) || pace <= 0) {
      throw new RangeError(
        `paceByFamilyPermille.${family} must be a whole number above 0, got ${pace}.`,
      );
    }
    scale(draft, pace, 'groomer’s pace');
  }
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
  };
}

function waterMl(pet: PetFacts, body: Body, model: GroomModel): number {
  const { fixedMl, perM2Ml, coatPermille, soilPermille } = model.water;
  const plain = fixedMl + (perM2Ml * body.surfaceCm2) / 10_000;
  const factor = (coatPermille[body.coatType] * soilPermille[pet.coatState.soil]!) / 1_000_000;
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
  if (weeksSinceLast !== null) within('weeksSinceLast', weeksSinceLast, 2_000);
}
