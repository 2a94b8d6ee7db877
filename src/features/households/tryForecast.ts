import { forecastPet } from '#shared/grooming/forecastPet.ts';
import type { PetFacts, PetForecast, Style } from '#shared/grooming/types.ts';

/** The forecast of a form half filled in, or the words of what is missing or does not fit. */
export function tryForecast(facts: PetFacts | string, style: Style | null): PetForecast | string {
  if (typeof facts === 'string') return facts;
  if (!style) return 'Choose a style, and the minutes show here.';
  try {
    return forecastPet(facts, style);
  } catch (error) {
    if (error instanceof RangeError) return `No forecast yet: ${error.message}`;
    throw error;
  }
}
