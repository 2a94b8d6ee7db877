import type { Body } from './body.ts';
import type { FixedAndArea, GroomModel, RegionWork } from './groomModel.ts';
import type { Reason, Region, ScissorSection, StepKey } from './types.ts';

/** A step before handling: what it takes on this body and coat, and why. */
export interface StepDraft {
  key: StepKey;
  label: string;
  baseSeconds: number;
  reasons: Reason[];
  /** Before handling; only their proportions count. */
  sections?: ScissorSection[];
}

/** Running total of a draft. */
export function secondsOf(step: StepDraft): number {
  return step.reasons.reduce((sum, reason) => sum + reason.deltaSeconds, step.baseSeconds);
}

/** Multiplies what the step takes so far and keeps the difference as a reason. */
export function scale(step: StepDraft, permille: number, text: string): StepDraft {
  return addSeconds(step, Math.round((secondsOf(step) * (permille - 1000)) / 1000), text);
}

export function addSeconds(step: StepDraft, deltaSeconds: number, text: string): StepDraft {
  if (deltaSeconds !== 0) step.reasons.push({ text, deltaSeconds });
  return step;
}

/** What this coat makes of the step. */
export function scaleForCoat(step: StepDraft, body: Body, model: GroomModel): StepDraft {
  return scale(step, model.coatPermille[body.coatType][step.key] ?? 1000, coatWords[body.coatType]);
}

export function onBody({ fixedSeconds, perM2Seconds }: FixedAndArea, body: Body): number {
  return Math.round(fixedSeconds + (perM2Seconds * body.surfaceCm2) / 10_000);
}

export function onRegions(work: RegionWork, chosen: readonly Region[], body: Body): number {
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
