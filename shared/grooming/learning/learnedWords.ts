import type { StepFamily } from '../types.ts';
import { type GroomFit, type LearnedEffect } from './groomFit.ts';
import type { PredictFor } from './predictMinutes.ts';

/** Names to say; without them "this pet" and "this groomer". */
export interface LearnedNames {
  pet?: string;
  groomer?: string;
}

const familyWords: Record<StepFamily, string> = {
  prep: 'preparing',
  wash: 'washing',
  dry: 'drying',
  clip: 'clipping',
  scissor: 'scissor work',
  wrap: 'wrapping up',
};

/**
 * What the records taught about this visit, one sentence each, the pet first. An effect is told from
 * 2 % on and only when it is larger than its own uncertainty; less is said to be as usual.
 */
export function learnedWords(
  fit: GroomFit,
  who: PredictFor,
  names: LearnedNames,
  steps: readonly { family: StepFamily }[],
): string[] {
  if (fit.records === 0) return ['Not learned yet: no finished visits.'];
  const words: string[] = [];
  const pet = names.pet ?? 'this pet';
  const own = fit.effects[`pet ${who.petId}`];
  if (own) words.push(`Learned from ${visits(own)} of ${pet}: ${told(own)}.`);
  else words.push(`No finished visit of ${pet} yet: borrowed from its coat and style.`);
  const group = fit.effects[`coatStyle ${who.coatStyle}`];
  if (group) words.push(`Learned from ${visits(group)} of ${who.coatStyle}: ${told(group)}.`);
  const groomer = who.groomerId === null ? undefined : fit.effects[`groomer ${who.groomerId}`];
  if (groomer) {
    const leaning = familyParts(fit, who, steps);
    // Usual on the whole goes without saying where single steps are not.
    const parts = clear(groomer) || leaning.length === 0 ? [told(groomer), ...leaning] : leaning;
    words.push(
      `Learned from ${visits(groomer)} with ${names.groomer ?? 'this groomer'}: ${parts.join(', ')}.`,
    );
  }
  return words;
}

function familyParts(
  fit: GroomFit,
  who: PredictFor,
  steps: readonly { family: StepFamily }[],
): string[] {
  return [...new Set(steps.map(({ family }) => family))].flatMap((family) => {
    const effect = fit.families[`groomer ${who.groomerId} ${family}`];
    return effect && clear(effect) ? [`${familyWords[family]} ${told(effect)}`] : [];
  });
}

function told(effect: LearnedEffect): string {
  if (!clear(effect)) return 'as usual';
  const percent = Math.round(100 * Math.expm1(effect.value));
  return `${Math.abs(percent)} % ${percent > 0 ? 'slower' : 'faster'} than usual`;
}

function clear({ value, se }: LearnedEffect): boolean {
  return Math.abs(Math.expm1(value)) >= 0.02 && Math.abs(value) > se;
}

function visits({ records }: LearnedEffect): string {
  return records === 1 ? '1 visit' : `${records} visits`;
}
