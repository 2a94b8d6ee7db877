import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { localDate } from './values.ts';

const minutes = {
  groomSeconds: z.int(),
  scissorSeconds: z.int(),
  driveSeconds: z.int(),
  waitSeconds: z.int(),
  driveMetres: z.int(),
  visits: z.int(),
  promises: z.int(),
  promisesKept: z.int(),
};
const totals = z.object(minutes);
export type ReviewTotals = z.infer<typeof totals>;

export const review = z.object({
  /** Monday and Sunday of the week, local dates. */
  from: z.string(),
  to: z.string(),
  week: totals,
  weekBefore: totals,
  days: z.array(z.object({ date: z.string(), ...minutes })),
  vans: z.array(
    z.object({ vanId: z.string(), vanName: z.string(), shape: z.string(), ...minutes }),
  ),
  vanDays: z.array(
    z.object({ date: z.string(), vanId: z.string(), vanName: z.string(), ...minutes }),
  ),
  /** Forecast at booking against the clock, one per finished visit. */
  visits: z.array(
    z.object({
      visitId: z.string(),
      date: z.string(),
      label: z.string(),
      vanName: z.string(),
      groomerName: z.string(),
      coatStyle: z.string(),
      forecastSeconds: z.int(),
      p10Seconds: z.int(),
      p90Seconds: z.int(),
      clockSeconds: z.int(),
      promiseKept: z.boolean().nullable(),
    }),
  ),
  leans: z.array(
    z.object({
      coatStyle: z.string(),
      visits: z.int(),
      forecastSeconds: z.int(),
      clockSeconds: z.int(),
      leanPermille: z.int(),
    }),
  ),
});
export type Review = z.infer<typeof review>;

export const getReview = endpoint({
  method: 'GET',
  path: '/api/review',
  summary: 'A week of grooming, driving and waiting (the week of a date; this week when absent)',
  query: z.object({ date: localDate.optional() }),
  response: review,
});

/** Text/csv: one row per van and day. */
export const exportReview = endpoint({
  method: 'GET',
  path: '/api/review.csv',
  summary: 'The same week as CSV, one row per van and day',
  query: z.object({ date: localDate.optional() }),
  response: z.string(),
});
