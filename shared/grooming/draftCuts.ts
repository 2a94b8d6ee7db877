import { blendBorders } from './blendBorders.ts';
import { regions, type Body } from './body.ts';
import { lengthsAfter, type Lengths } from './coatLengths.ts';
import { combPlanOf, passWords, scissorWork, type ScissorWork } from './combPasses.ts';
import type { GroomModel } from './groomModel.ts';
import { regionWords } from './regionWords.ts';
import { addSeconds, onRegions, scale, scaleForCoat, type StepDraft } from './stepDraft.ts';
import type { BlendBorder, CombPlan, PetFacts, Region, RegionCut, Style } from './types.ts';

/** The cutting steps of a plan, with what they rest on. */
export interface CutDrafts {
  steps: StepDraft[];
  combPlan: CombPlan | null;
  borders: BlendBorder[];
}

/**
 * Clip, comb, scissor section by section, head, blend. Blades first; then guide combs, both where
 * the style asks for a comb and as passes ahead of the scissors where that pays; one scissored
 * section is finished before the next, head and ears last.
 */
export function draftCuts(
  pet: PetFacts,
  style: Style,
  cuts: Style['cuts'],
  arrival: Lengths,
  body: Body,
  model: GroomModel,
): CutDrafts {
  const planned = { ...style, cuts };
  const finishTimes =
    (model.scissor.finishPermille[style.finish] *
      (model.coatPermille[body.coatType].scissor ?? 1000)) /
    1_000_000;
  const passTimes = (model.coatPermille[body.coatType].comb ?? 1000) / 1000;
  const works = cutWith(cuts, 'scissor').map((region) =>
    scissorWork(region, planned, arrival, body, model, finishTimes, passTimes),
  );
  const borders = blendBorders(cuts, lengthsAfter(cuts, arrival, model), body, model);
  const combPlan = combPlanOf(works, finishTimes, passTimes);
  const steps = [
    clipStep(cuts, body, model),
    combStep(cuts, works, combPlan, body, model),
    scissorStep('scissor', works.filter(isBody), pet, style, combPlan, body, model),
    scissorStep(
      'head',
      works.filter((work) => !isBody(work)),
      pet,
      style,
      null,
      body,
      model,
    ),
    blendStep(borders, style, model),
  ];
  return { steps: steps.filter((step) => step !== null), combPlan, borders };
}

/** Regions cut with a tool, in the order scissors take them. */
export function cutWith(cuts: Style['cuts'], tool: RegionCut['tool']): Region[] {
  return SECTIONS.filter((region) => cuts[region]?.tool === tool);
}

/** Legs and feet while the pet is fresh, then the outline, the face last. Sanitary is a service. */
const SECTIONS: readonly Region[] = [
  'hindLegs',
  'foreLegs',
  'feet',
  'belly',
  'back',
  'neck',
  'tail',
  'ears',
  'head',
];

function isBody({ region }: ScissorWork): boolean {
  return region !== 'head' && region !== 'ears';
}

function clipStep(cuts: Style['cuts'], body: Body, model: GroomModel): StepDraft | null {
  const bladed = cutWith(cuts, 'blade');
  if (bladed.length === 0) return null;
  const baseSeconds = onRegions(model.clip, bladed, body);
  const label = `clip ${regionWords(bladed)}`;
  return scaleForCoat({ key: 'clip', label, baseSeconds, reasons: [] }, body, model);
}

function combStep(
  cuts: Style['cuts'],
  works: readonly ScissorWork[],
  combPlan: CombPlan | null,
  body: Body,
  model: GroomModel,
): StepDraft | null {
  const combed = cutWith(cuts, 'comb');
  if (combed.length === 0 && !combPlan) return null;
  const passed = combPlan?.byRegion.map(({ region }) => region) ?? [];
  const step: StepDraft = {
    key: 'comb',
    label: `guide comb ${regionWords(regions.filter((region) => [...combed, ...passed].includes(region)))}`,
    baseSeconds: onRegions(model.clip, combed, body),
    reasons: [],
  };
  scale(step, model.clip.combPermille, 'comb over the blade');
  const passSeconds = works.reduce((sum, work) => sum + work.passes * work.passSeconds, 0);
  if (combPlan) {
    addSeconds(step, Math.round(passSeconds), `${passWords(combPlan.byRegion)} before scissors`);
  }
  return scaleForCoat(step, body, model);
}

function scissorStep(
  key: 'scissor' | 'head',
  works: readonly ScissorWork[],
  pet: PetFacts,
  style: Style,
  combPlan: CombPlan | null,
  body: Body,
  model: GroomModel,
): StepDraft | null {
  if (works.length === 0) return null;
  const total = (part: (work: ScissorWork) => number) =>
    works.reduce((sum, work) => sum + part(work), 0);
  const usual = Math.round(total((work) => work.usualSeconds));
  const alone = Math.round(total((work) => work.aloneSeconds));
  const after = Math.round(total((work) => work.afterSeconds));
  const step: StepDraft = {
    key,
    label: `scissor ${regionWords(works.map(({ region }) => region))}`,
    baseSeconds: usual,
    reasons: [],
    sections: works.map(({ region, afterSeconds }) => ({
      region,
      medianSeconds: Math.round(afterSeconds),
    })),
  };
  addSeconds(step, alone - usual, growthWords(pet, model));
  if (combPlan) addSeconds(step, after - alone, `${passWords(combPlan.byRegion)} first`);
  const finish = style.finish === 'full' ? 'finished by hand all over' : 'quick finish';
  scale(step, model.scissor.finishPermille[style.finish], finish);
  return scaleForCoat(step, body, model);
}

function growthWords(pet: PetFacts, model: GroomModel): string {
  const { lengthTenthsMm, lengthByRegionTenthsMm } = pet.coatState;
  if (lengthTenthsMm !== null || lengthByRegionTenthsMm) return 'coat as measured';
  if (pet.weeksSinceLast === null) return `about ${model.growth.assumedWeeks} weeks’ growth`;
  return `${pet.weeksSinceLast} weeks’ growth`;
}

function blendStep(
  borders: readonly BlendBorder[],
  style: Style,
  model: GroomModel,
): StepDraft | null {
  const seconds = borders.reduce((sum, border) => sum + border.seconds, 0);
  if (seconds < LEAST_BLEND_SECONDS) return null;
  const [longest] = borders;
  const step: StepDraft = {
    key: 'blend',
    label: `blend ${regionWords([longest!.between[0]])} into ${regionWords([longest!.between[1]])}${borders.length > 1 ? ' and on' : ''}`,
    baseSeconds: seconds,
    reasons: [],
  };
  const finish = style.finish === 'full' ? 'finished by hand all over' : 'quick finish';
  return scale(step, model.blend.finishPermille[style.finish], finish);
}

/** Less than this is done in passing. */
const LEAST_BLEND_SECONDS = 30;
