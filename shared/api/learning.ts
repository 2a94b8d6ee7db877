import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { id } from './values.ts';

/** working: under way, its figures are 0 till then. failed: it broke off and nothing changed. */
export const fitState = z.enum(['working', 'kept', 'notKept', 'failed']);

/** One learning. Losses are mean pinball losses on visits neither fit has seen. */
export const groomFit = z.object({
  id,
  state: fitState,
  /** When it began. */
  fittedAt: z.string(),
  modelVersion: z.string(),
  /** Pet visits learned from, and left out (ended, two people, forgotten timers). */
  records: z.int(),
  leftOut: z.int(),
  /** Visits that judged: fewer than `leastHeldOut` and nothing is kept. */
  heldOut: z.int(),
  beforeSeconds: z.int(),
  afterSeconds: z.int(),
});
export type GroomFit = z.infer<typeof groomFit>;

export const listFits = endpoint({
  method: 'GET',
  path: '/api/learning',
  summary: 'What was learned from finished visits, newest first, and what bookings use',
  response: z.object({
    fits: z.array(groomFit),
    /** The newest one kept, however long ago; null: bookings use the plain forecast. */
    inForce: groomFit.nullable(),
  }),
});
export const learnMinutes = endpoint({
  method: 'POST',
  path: '/api/learning',
  summary:
    'Start learning from finished visits; answers at once, the one under way if there is one',
  response: groomFit,
});

/** What the fit in force makes of one pet, as a booking today would. Work on the pet, no set-up. */
export const petLearned = z.object({
  words: z.array(z.string()),
  /** Finished visits of this pet. */
  petVisits: z.int(),
  medianSeconds: z.int(),
  p10Seconds: z.int(),
  p90Seconds: z.int(),
  /** Groomers whose pace is known, quickest first. */
  byGroomer: z.array(
    z.object({ groomerName: z.string(), medianSeconds: z.int(), words: z.string() }),
  ),
});
export type PetLearned = z.infer<typeof petLearned>;

export const getPetLearned = endpoint({
  method: 'GET',
  path: '/api/pets/:petId/learned',
  summary: 'The learned forecast of a pet; null when nothing is learned yet',
  params: z.object({ petId: id }),
  response: petLearned.nullable(),
});
