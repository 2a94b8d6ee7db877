import type { CannotReason } from '#shared/api/runs.ts';

/** Why a stop could not be done, in the order they are offered. None counts against anybody's pace. */
export const cannotReasons: readonly { reason: CannotReason; words: string }[] = [
  { reason: 'noAnswer', words: 'Nobody answers' },
  { reason: 'refused', words: 'They say not today' },
  { reason: 'unwellPet', words: 'The pet is unwell' },
  { reason: 'mattingNeedsConsent', words: 'Matted: clipping short needs their yes' },
  { reason: 'unsafe', words: 'Not safe for the pet or for me' },
  { reason: 'nowhereToPark', words: 'Nowhere to park' },
  { reason: 'gateShut', words: 'Gate shut' },
  { reason: 'gear', words: 'Gear broke' },
  { reason: 'heat', words: 'Too hot to work safely' },
  { reason: 'groomerUnwell', words: 'I am unwell' },
];

export function cannotWords(reason: string): string {
  return cannotReasons.find((one) => one.reason === reason)?.words ?? reason;
}
