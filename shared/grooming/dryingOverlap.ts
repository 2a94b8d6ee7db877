import { bodyOf } from './body.ts';
import { findCaution } from './cautions.ts';
import type { CautionKey, CoatType, PetFacts, PetForecast } from './types.ts';

export interface DryingOverlap {
  seconds: number;
  /** Why this pet may not dry while another is worked on; null = it may. */
  refused: string | null;
}

/**
 * Seconds saved when this pet finishes drying while the next is checked and prepared. A drying pet
 * is never unwatched: one household, unheated air, in sight, one pet to an enclosure, looked at every
 * ten minutes (a minute a look); never a short-nosed, old, young, ill or anxious pet, never a cat.
 * A coat dried straight under the brush (curly, drop, feathered) cannot finish by itself.
 */
export function dryingOverlap(
  pet: PetFacts,
  forecast: PetForecast,
  next: PetForecast,
): DryingOverlap {
  const refused = refusal(pet, forecast);
  if (refused) return { seconds: 0, refused };
  const dry = forecast.steps.find(({ key }) => key === 'dry')?.medianSeconds ?? 0;
  const alone = Math.round((dry * (AIR_PERMILLE[bodyOf(pet).coatType] ?? 0)) / 1000);
  const prepared = next.steps
    .filter(({ family }) => family === 'prep')
    .reduce((sum, { medianSeconds }) => sum + medianSeconds, 0);
  const together = Math.min(alone, prepared);
  const looks = Math.ceil(together / LOOK_EVERY_SECONDS) * LOOK_SECONDS;
  return { seconds: Math.max(0, together - looks), refused: null };
}

const LOOK_EVERY_SECONDS = 600;
const LOOK_SECONDS = 60;

/** Part of drying that still air finishes after the water is out. Our own guess. */
const AIR_PERMILLE: Partial<Record<CoatType, number>> = { smooth: 400, double: 400, wire: 400 };

const NEVER: readonly CautionKey[] = ['shortNosed', 'senior', 'young', 'dryerShy'];

function refusal(pet: PetFacts, forecast: PetForecast): string | null {
  if (pet.species === 'cat') return 'a cat is never left to dry';
  if (pet.temperament === 'anxious') return 'an anxious pet is never left to dry';
  for (const { key, stop } of forecast.cautions) {
    const ill = findCaution(key).decides === 'vet';
    if (stop || ill || NEVER.includes(key)) {
      return `never left to dry: ${findCaution(key).words}`;
    }
  }
  return null;
}
