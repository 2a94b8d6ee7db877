import type { Body } from './body.ts';
import type { CoatPlan } from './planCoat.ts';
import type { FixedAndArea, GroomModel, PlainStep, RegionWork } from './groomModel.ts';
import { regionWords } from './regionWords.ts';
import type { PetFacts, Reason, Region, RegionCut, StepKey, Style } from './types.ts';

/** A step before handling: what it takes on this body and coat, and why. */
export interface StepDraft {
  key: StepKey;
  label: string;
  baseSeconds: number;
  reasons: Reason[];
}

/**
 * The steps this style needs on this body, in order of work, with reasons from coat and cut.
 * Each is fixed seconds plus a rate on body surface, never a power of weight. Wire coats are
 * stripped dry and dirty, before the bath; cords are never brushed; a bare skin has nothing to brush.
 */
export function draftSteps(
  pet: PetFacts,
  style: Style,
  body: Body,
  plan: CoatPlan,
  model: GroomModel,
): StepDraft[] {
  const has = (service: Style['services'][number]) => style.services.includes(service);
  const steps: StepDraft[] = [];
  const plain = (key: PlainStep, label: string, sharePermille = 1000) => {
    const step = { key, label, baseSeconds: onBody(model.plain[key], body), reasons: [] };
    step.baseSeconds = Math.round((step.baseSeconds * sharePermille) / 1000);
    steps.push(step);
    return step;
  };

  const checkIn = plain('checkIn', 'check in, hands-on look');
  if (pet.firstVisit) addSeconds(checkIn, model.firstVisit.checkInSeconds, 'first visit');
  if (has('nails')) plain('nails', 'nails');
  if (has('ears')) plain('ears', 'ears');
  if (has('sanitary') && has('pads')) plain('tidy', 'sanitary and pads');
  else if (has('sanitary')) plain('tidy', 'sanitary', 500);
  else if (has('pads')) plain('tidy', 'pads', 500);
  if (has('teeth')) plain('teeth', 'teeth');
  addMats(steps, plan, model, body);
  addStrip(steps, pet, body, plan, model);

  if (has('bath')) {
    const bath = coat(plain('bath', 'wash'), body, model);
    scale(bath, model.soilBathPermille[pet.coatState.soil]!, 'dirty coat');
    const dry = coat(plain('dry', 'dry'), body, model);
    shed(dry, pet, body, model);
    scale(dry, 1000 - Math.round(250 * plan.clippedShare), 'coat clipped short');
  }
  if (body.coatType !== 'corded' && body.coatType !== 'hairless') {
    // Without bath, undercoat or cut there is nothing to brush for: a nail trim stays a nail trim.
    if (has('bath') || has('deshed') || Object.keys(plan.cuts).length > 0) {
      const brush = coat(plain('brush', 'brush and comb'), body, model);
      if (has('deshed')) scale(brush, model.deshedPermille, 'undercoat out');
      shed(brush, pet, body, model);
      scale(brush, 1000 - Math.round(500 * plan.clippedShare), 'coat clipped short');
    }
  }
  addCuts(steps, style, body, plan, model);
  plain('wrap', 'check over, collar on');

  const overdue = model.overdue.find((rule) => (pet.weeksSinceLast ?? 0) > rule.pastWeeks);
  for (const step of steps) {
    scale(step, overdue?.stepPermille[step.key] ?? 1000, `${pet.weeksSinceLast} weeks since last`);
  }
  return steps.filter((step) => secondsOf(step) > 0);
}

/** Running total of a draft. */
export function secondsOf(step: StepDraft): number {
  return step.reasons.reduce((sum, reason) => sum + reason.deltaSeconds, step.baseSeconds);
}

/** Multiplies what the step takes so far and keeps the difference as a reason. */
export function scale(step: StepDraft, permille: number, text: string): StepDraft {
  return addSeconds(step, Math.round((secondsOf(step) * (permille - 1000)) / 1000), text);
}

function addSeconds(step: StepDraft, deltaSeconds: number, text: string): StepDraft {
  if (deltaSeconds !== 0) step.reasons.push({ text, deltaSeconds });
  return step;
}

function coat(step: StepDraft, body: Body, model: GroomModel): StepDraft {
  return scale(step, model.coatPermille[body.coatType][step.key] ?? 1000, coatWords[body.coatType]);
}

function shed(step: StepDraft, pet: PetFacts, body: Body, model: GroomModel): void {
  if (!body.undercoat) return;
  const load = model.undercoatLoadPermille[pet.coatState.undercoatLoad];
  const words = pet.coatState.undercoatLoad === 2 ? 'blowing coat' : 'shedding';
  scale(step, load?.[step.key] ?? 1000, words);
}

function addMats(steps: StepDraft[], plan: CoatPlan, model: GroomModel, body: Body): void {
  const where = plan.matRegions.length > 0 ? `: ${regionWords(plan.matRegions)}` : '';
  if (plan.matSeconds > 0) {
    const reasons = [{ text: `matting${where}`, deltaSeconds: plan.matSeconds }];
    steps.push({ key: 'mats', label: 'mats, before the bath', baseSeconds: 0, reasons });
  }
  if (plan.clipOffSeconds > 0 && plan.change) {
    const reasons = [{ text: 'matted past brushing out', deltaSeconds: plan.clipOffSeconds }];
    const label = `clip off ${regionWords(plan.change.regions)}, before the bath`;
    coat(pushed(steps, { key: 'clipOff', label, baseSeconds: 0, reasons }), body, model);
  }
}

function pushed(steps: StepDraft[], step: StepDraft): StepDraft {
  steps.push(step);
  return step;
}

function addStrip(
  steps: StepDraft[],
  pet: PetFacts,
  body: Body,
  plan: CoatPlan,
  model: GroomModel,
): void {
  const stripped = cutWith(plan, 'strip');
  if (stripped.length === 0) return;
  const strip = pushed(steps, {
    key: 'strip',
    label: `hand-strip ${regionWords(stripped)}, before the bath`,
    baseSeconds: onRegions(model.strip, stripped, body),
    reasons: [],
  });
  const weeks = pet.weeksSinceLast;
  if (!pet.firstVisit && weeks !== null && weeks <= model.strip.rolledWithinWeeks) {
    scale(strip, model.strip.rolledPermille, 'coat kept rolled');
  }
}

function addCuts(
  steps: StepDraft[],
  style: Style,
  body: Body,
  plan: CoatPlan,
  model: GroomModel,
): void {
  const bladed = cutWith(plan, 'blade');
  const combed = cutWith(plan, 'comb');
  const clipped = [...bladed, ...combed].filter((region) => region !== 'sanitary');
  if (clipped.length > 0) {
    const baseSeconds = onRegions(model.clip, clipped, body);
    const clip = pushed(steps, {
      key: 'clip',
      label: `clip ${regionWords(clipped)}`,
      baseSeconds,
      reasons: [],
    });
    const combShare = onRegions(model.clip, combed, body) / baseSeconds;
    const combPermille = 1000 + Math.round((model.clip.combPermille - 1000) * combShare);
    scale(clip, combPermille, 'guide comb');
    coat(clip, body, model);
  }

  const scissored = cutWith(plan, 'scissor').filter((region) => region !== 'sanitary');
  if (scissored.length > 0) {
    const scissor = pushed(steps, {
      key: 'scissor',
      label: `scissor ${regionWords(scissored)}`,
      baseSeconds: onRegions(model.scissor, scissored, body),
      reasons: [],
    });
    const finish = style.finish === 'full' ? 'finished by hand all over' : 'quick finish';
    scale(scissor, model.scissor.finishPermille[style.finish], finish);
    coat(scissor, body, model);
  }

  const otherTool = clipped.length > 0 || cutWith(plan, 'strip').length > 0;
  if (scissored.length > 0 && (otherTool || style.finish === 'full')) {
    // The longer the scissored outline, the longer the borders to melt into the clipped coat.
    const share = scissored.reduce((sum, region) => sum + body.shares[region], 0);
    const baseSeconds = Math.round(onBody(model.plain.blend, body) * (0.5 + Math.min(0.5, share)));
    steps.push({ key: 'blend', label: 'blend and thin', baseSeconds, reasons: [] });
  }
}

function cutWith(plan: CoatPlan, tool: RegionCut['tool']): Region[] {
  return (Object.keys(plan.cuts) as Region[]).filter((region) => plan.cuts[region]?.tool === tool);
}

function onBody({ fixedSeconds, perM2Seconds }: FixedAndArea, body: Body): number {
  return Math.round(fixedSeconds + (perM2Seconds * body.surfaceCm2) / 10_000);
}

function onRegions(work: RegionWork, chosen: readonly Region[], body: Body): number {
  const share = chosen.reduce((sum, region) => sum + body.shares[region], 0);
  const fixed = chosen.reduce((sum, region) => sum + work.fixedByRegionSeconds[region], 0);
  return Math.round(fixed + (work.perM2Seconds * body.surfaceCm2 * share) / 10_000);
}

const coatWords: Record<Body['coatType'], string> = {
  smooth: 'smooth coat',
  double: 'double coat',
  curly: 'curly coat',
  drop: 'drop coat',
  wire: 'wire coat',
  combination: 'feathered coat',
  corded: 'cords',
  hairless: 'bare skin',
  catShort: 'short cat coat',
  catLong: 'long cat coat',
};
