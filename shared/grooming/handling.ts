import type { Caution } from './cautions.ts';
import type { GroomModel } from './groomModel.ts';
import { scale, secondsOf, type StepDraft } from './stepDraft.ts';
import type { PaceByFamily, PetFacts, StepFamily, StepKey, Temperament } from './types.ts';

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
  comb: 'clip',
  scissor: 'scissor',
  head: 'scissor',
  blend: 'scissor',
  rest: 'wrap',
  wrap: 'wrap',
};

/** Steps bound by what the pet bears: never scaled by a groomer's pace, never counted against it. */
export const pacelessSteps: readonly StepKey[] = ['mats', 'rest'];

/** Minutes around the pet: not time in tub or on table. */
export const offTableSteps: readonly StepKey[] = ['checkIn', 'rest', 'wrap'];

/**
 * Temper, health and age (by caution), first visit and the groomer's pace, each as a reason.
 * Mat work is already bound by what the pet bears; slower hands do not lengthen the limit.
 * @throws RangeError when a pace is not a whole number above 0.
 */
export function addHandling(
  draft: StepDraft,
  pet: PetFacts,
  cautions: readonly Caution[],
  model: GroomModel,
  pace: PaceByFamily = {},
): void {
  const { key } = draft;
  if (pacelessSteps.includes(key)) return;
  const family = familyOfStep[key];
  scale(draft, temperPermille(draft, pet.temperament, model), temperamentWords(draft, pet));
  for (const { slower } of cautions) {
    for (const rule of slower) {
      if (rule.steps.includes(key)) scale(draft, rule.permille, rule.because);
    }
  }
  if (pet.firstVisit && key !== 'checkIn') {
    scale(draft, model.firstVisit.byFamilyPermille[family], 'first visit');
  }
  const own = pace[family] ?? 1000;
  if (!Number.isInteger(own) || own <= 0) {
    throw new RangeError(
      `paceByFamilyPermille.${family} must be a whole number above 0, got ${own}.`,
    );
  }
  scale(draft, own, 'groomer’s pace');
}

/**
 * The rests this pet takes, as a step; null for none. Of several reasons to rest the one that asks
 * for most counts: a pet lies down once, not once per reason.
 */
export function restStep(
  drafts: readonly StepDraft[],
  cautions: readonly Caution[],
  model: GroomModel,
): StepDraft | null {
  const table = tableSecondsOf(drafts);
  let most = { seconds: 0, count: 0, words: '' };
  for (const { key } of cautions) {
    const rule = model.rests[key];
    if (!rule) continue;
    const count = Math.floor(table / rule.everySeconds);
    const seconds = count * rule.restSeconds;
    if (seconds > most.seconds) most = { seconds, count, words: RESTS_FOR[key] ?? '' };
  }
  if (most.seconds === 0) return null;
  return {
    key: 'rest',
    label: most.count === 1 ? 'one rest' : `${most.count} rests, spread over the work`,
    baseSeconds: 0,
    reasons: [{ text: `rests ${most.words}`, deltaSeconds: most.seconds }],
  };
}

/** Usual seconds in tub and on table. */
export function tableSecondsOf(drafts: readonly StepDraft[]): number {
  return drafts
    .filter(({ key }) => !offTableSteps.includes(key))
    .reduce((sum, draft) => sum + secondsOf(draft), 0);
}

/** Feet have a factor of their own, weighed by their part of the scissor work. */
function temperPermille(draft: StepDraft, temperament: Temperament, model: GroomModel): number {
  const temper = model.temperamentPermille[temperament];
  const family = familyOfStep[draft.key];
  const usual = temper.byStep[draft.key] ?? temper.byFamily[family] ?? 1000;
  if (draft.key !== 'scissor' || !draft.sections) return usual;
  const whole = draft.sections.reduce((sum, { medianSeconds }) => sum + medianSeconds, 0);
  const feet = draft.sections.find(({ region }) => region === 'feet')?.medianSeconds ?? 0;
  // Sections follow, so that they still tell where the minutes go.
  for (const section of draft.sections) {
    const factor = section.region === 'feet' ? temper.feet : usual;
    section.medianSeconds = Math.round((section.medianSeconds * factor) / 1000);
  }
  return Math.round(usual + ((temper.feet - usual) * feet) / whole);
}

function temperamentWords({ key }: StepDraft, { temperament }: PetFacts): string {
  return key === 'head' && temperament !== 'calm' ? `${temperament} at the face` : temperament;
}

const RESTS_FOR: Partial<Record<Caution['key'], string>> = {
  senior: 'for an old pet',
  young: 'for a young pet',
  heart: 'for the heart',
  weakJoints: 'for the joints',
  pregnant: 'while pregnant',
  shortNosed: 'to breathe',
};
