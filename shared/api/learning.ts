import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { id } from './values.ts';

/** One night of learning. Losses are mean pinball losses on visits neither fit has seen. */
export const groomFit = z.object({
  id,
  fittedAt: z.string(),
  modelVersion: z.string(),
  /** Pet visits learned from, and left out (ended, two people, forgotten timers). */
  records: z.int(),
  leftOut: z.int(),
  heldOut: z.int(),
  beforeSeconds: z.int(),
  afterSeconds: z.int(),
  kept: z.boolean(),
});
export type GroomFit = z.infer<typeof groomFit>;

export const listFits = endpoint({
  method: 'GET',
  path: '/api/learning',
  summary: 'What was learned from finished visits, newest first',
  response: z.object({ fits: z.array(groomFit) }),
});
export const learnMinutes = endpoint({
  method: 'POST',
  path: '/api/learning',
  summary: 'Learn from finished visits now; kept only if it forecasts better',
  response: groomFit,
});
