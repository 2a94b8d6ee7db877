import { bladeSteps } from './blades.ts';
import { regions, type Body } from './body.ts';
import { coatLengths, growingCoats, type Lengths } from './coatLengths.ts';
import { cutWith, draftCuts } from './draftCuts.ts';
import type { GroomModel, PlainStep } from './groomModel.ts';
import type { CoatPlan } from './planCoat.ts';
import { regionWords } from './regionWords.ts';
import {
  addSeconds,
  onBody,
  onRegions,
  scale,
  scaleForCoat,
  secondsOf,
  type StepDraft,
} from './stepDraft.ts';
import type { BlendBorder, CombPlan, PetFacts, Region, Style } from './types.ts';

export interface DraftedSteps {
  steps: StepDraft[];
  combPlan: CombPlan | null;
  borders: BlendBorder[];
  coatTenthsMm: Lengths;
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
): DraftedSteps {
  const has = (service: Style['services'][number]) => style.services.includes(service);
  const steps: StepDraft[] = [];
  const plain = (key: PlainStep, label: string, sharePermille = 1000) => {
    const step: StepDraft = {
      key,
      label,
      baseSeconds: onBody(model.plain[key], body),
      reasons: [],
    };
    step.baseSeconds = Math.round((step.baseSeconds * sharePermille) / 1000);
    steps.push(step);
    return step;
  };
  const coatTenthsMm = coatLengths(pet, style, body, model);
  const lengthPermille = permilleForLength(coatTenthsMm, body, model);

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
    const bath = scaleForCoat(plain('bath', 'wash'), body, model);
    const { soil, soilByRegion } = pet.coatState;
    const soiled = overRegions(
      body,
      (region) => model.soilBathPermille[soilByRegion?.[region] ?? soil]!,
    );
    scale(bath, soiled, 'dirty coat');
    const dry = scaleForCoat(plain('dry', 'dry'), body, model);
    follow(dry, lengthPermille);
    shed(dry, pet, body, model);
    scale(dry, 1000 - Math.round(250 * plan.clippedShare), 'coat clipped short');
  }
  if (body.coatType !== 'corded' && body.coatType !== 'hairless') {
    // Without bath, undercoat or cut there is nothing to brush for: a nail trim stays a nail trim.
    if (has('bath') || has('deshed') || Object.keys(plan.cuts).length > 0) {
      const brush = scaleForCoat(plain('brush', 'brush and comb'), body, model);
      follow(brush, lengthPermille);
      if (has('deshed')) scale(brush, model.deshedPermille, 'undercoat out');
      shed(brush, pet, body, model);
      scale(brush, 1000 - Math.round(500 * plan.clippedShare), 'coat clipped short');
    }
  }
  const cut = draftCuts(pet, style, plan.cuts, coatTenthsMm, body, model);
  steps.push(...cut.steps);
  plain('wrap', 'check over, collar on');

  const overdue = model.overdue.find((rule) => (pet.weeksSinceLast ?? 0) > rule.pastWeeks);
  for (const step of steps) {
    scale(step, overdue?.stepPermille[step.key] ?? 1000, `${pet.weeksSinceLast} weeks since last`);
  }
  return {
    steps: steps.filter((step) => secondsOf(step) > 0),
    combPlan: cut.combPlan,
    borders: cut.borders,
    coatTenthsMm,
  };
}

/** Mean over the body of something known by region. */
function overRegions(body: Body, permille: (region: Region) => number): number {
  return Math.round(
    regions.reduce((sum, region) => sum + body.shares[region] * permille(region), 0),
  );
}

/**
 * A longer coat than usual holds more water and more comb. Only for coats that keep growing: the
 * others are about as long as they get, and their minutes already say so.
 */
function permilleForLength(arrival: Lengths, body: Body, model: GroomModel): number {
  if (!growingCoats.includes(body.coatType)) return 1000;
  const { usualTenthsMm, perStepPermille } = model.growth;
  const steps = regions.reduce((sum, region) => {
    const longer = arrival[region] > usualTenthsMm ? 1 : -1;
    return sum + body.shares[region] * longer * bladeSteps(arrival[region], usualTenthsMm);
  }, 0);
  return Math.min(1150, Math.max(850, 1000 + Math.round(perStepPermille * steps)));
}

function follow(step: StepDraft, permille: number): void {
  // A step that moves by less than a fiftieth says nothing.
  if (Math.abs(permille - 1000) < 20) return;
  scale(step, permille, permille > 1000 ? 'long coat' : 'short coat');
}

function shed(step: StepDraft, pet: PetFacts, body: Body, model: GroomModel): void {
  if (!body.undercoat) return;
  const { undercoatLoad, undercoatLoadByRegion } = pet.coatState;
  const load = (region: Region) => undercoatLoadByRegion?.[region] ?? undercoatLoad;
  const words = regions.some((region) => load(region) === 2) ? 'blowing coat' : 'shedding';
  const permille = (region: Region) =>
    model.undercoatLoadPermille[load(region)]?.[step.key] ?? 1000;
  scale(step, overRegions(body, permille), words);
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
    steps.push(scaleForCoat({ key: 'clipOff', label, baseSeconds: 0, reasons }, body, model));
  }
}

function addStrip(
  steps: StepDraft[],
  pet: PetFacts,
  body: Body,
  plan: CoatPlan,
  model: GroomModel,
): void {
  const stripped = cutWith(plan.cuts, 'strip');
  if (stripped.length === 0) return;
  const strip: StepDraft = {
    key: 'strip',
    label: `hand-strip ${regionWords(stripped)}, before the bath`,
    baseSeconds: onRegions(model.strip, stripped, body),
    reasons: [],
  };
  steps.push(strip);
  const weeks = pet.weeksSinceLast;
  if (!pet.firstVisit && weeks !== null && weeks <= model.strip.rolledWithinWeeks) {
    scale(strip, model.strip.rolledPermille, 'coat kept rolled');
  }
}
