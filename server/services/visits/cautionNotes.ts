import { forecastPet } from '#shared/grooming/forecastPet.ts';
import type { Style } from '#shared/grooming/types.ts';
import type { Pet } from '#server/models/Pet.ts';
import { petFactsOf } from '#server/services/households/petFactsOf.ts';

export interface CautionNoteRow {
  key: string;
  words: string;
  stop: boolean;
}

/** The cautions of a pet in its style on a date, from the cautions table of shared/grooming. */
export function cautionNotes(pet: Pet, style: Style, date: string): CautionNoteRow[] {
  const facts = petFactsOf(pet, new Date(`${date}T12:00:00Z`), date);
  return forecastPet(facts, style).cautions.map(({ key, words, stop }) => ({
    key,
    words,
    stop,
  }));
}
