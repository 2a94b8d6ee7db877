import { z } from 'zod';
import { endpoint } from './endpoint.ts';

/** Everything the arrival page shows: one household's facts and nobody else's. */
export const arrival = z.object({
  businessName: z.string(),
  callPhone: z.string().nullable(),
  petNames: z.string(),
  groomerName: z.string(),
  vanName: z.string(),
  shape: z.string(),
  state: z.enum(['planned', 'onTheWay', 'arrived', 'done', 'notToday']),
  /** The page's one essential sentence, rendered by shared/texts, e.g. "Open the door 9:48–9:56". */
  headline: z.string(),
  sentence: z.string(),
  promiseWords: z.string().nullable(),
  haveReady: z.array(z.string()),
  home: z.object({ lat: z.number(), lon: z.number() }),
  /** null unless the van is on its way here and away from the stop before. */
  van: z
    .object({
      lat: z.number(),
      lon: z.number(),
      freshness: z.enum(['live', 'expected']),
      words: z.string(),
    })
    .nullable(),
  steps: z.array(z.object({ family: z.string(), seconds: z.int(), attentionPermille: z.int() })),
  areaName: z.string(),
  areaVersion: z.string().nullable(),
  attribution: z.string().nullable(),
  updatedAt: z.string(),
});
export type Arrival = z.infer<typeof arrival>;

export const getArrival = endpoint({
  method: 'GET',
  path: '/api/arrival/:token',
  summary: 'The arrival page of a link; 410 when the link has expired',
  params: z.object({ token: z.string().min(16).max(32) }),
  response: arrival,
});
