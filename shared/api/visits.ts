import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { done, id, localDate, note, wallMinutes } from './values.ts';

export const stepFamily = z.enum(['prep', 'wash', 'dry', 'clip', 'scissor', 'wrap']);

/** One forecast step as stored with the visit at booking and drawn as a tower. */
export const visitStep = z.object({
  petId: id,
  key: z.string(),
  family: stepFamily,
  label: z.string(),
  medianSeconds: z.int(),
  meanSeconds: z.int(),
  varianceSeconds2: z.int(),
  attentionPermille: z.int(),
  reasons: z.array(z.object({ text: z.string(), deltaSeconds: z.int() })),
});
export type VisitStep = z.infer<typeof visitStep>;

const windowFields = z.object({ startMinutes: wallMinutes, endMinutes: wallMinutes });
const startsFirst = (w: { startMinutes: number; endMinutes: number }) =>
  w.startMinutes < w.endMinutes;
const window = windowFields.refine(startsFirst, {
  path: ['endMinutes'],
  message: 'must be after the start',
});

export const visitCard = z.object({
  id,
  date: z.string(),
  status: z.enum(['booked', 'cancelled', 'done', 'failed']),
  householdId: id,
  householdName: z.string(),
  addressLabel: z.string(),
  siteName: z.string().nullable(),
  lat: z.number(),
  lon: z.number(),
  phone: z.string().nullable(),
  textsConsent: z.boolean(),
  note: z.string(),
  /** Wall minutes of the business's zone. */
  promise: z.object({ startMinutes: z.int(), endMinutes: z.int(), version: z.int() }).nullable(),
  pets: z.array(
    z.object({
      id,
      name: z.string(),
      species: z.enum(['dog', 'cat']),
      breedName: z.string(),
      weightGrams: z.int(),
      styleName: z.string(),
      styleNotes: z.string(),
      temperament: z.string(),
      cautions: z.array(z.object({ key: z.string(), words: z.string(), stop: z.boolean() })),
      cautionNote: z.string(),
      vetName: z.string(),
      vetPhone: z.string().nullable(),
    }),
  ),
  steps: z.array(visitStep),
  p10Seconds: z.int(),
  p90Seconds: z.int(),
  /** What finished visits taught about this forecast; absent where nothing was learned at booking. */
  learned: z
    .object({ words: z.array(z.string()), petVisits: z.int(), learnedPermille: z.int() })
    .optional(),
});
export type VisitCard = z.infer<typeof visitCard>;

const visitFields = z.object({
  householdId: id,
  date: localDate,
  petIds: z.array(id).min(1, 'must name at least one pet').max(8),
  promise: window.nullable().default(null),
  /** Hard: "owner leaves at 12", parking hours. */
  allowed: z
    .array(
      windowFields
        .extend({ binds: z.enum(['arrival', 'stay']) })
        .refine(startsFirst, { path: ['endMinutes'], message: 'must be after the start' }),
    )
    .max(4)
    .default([]),
  preferredGroomerId: id.nullable().default(null),
  note: note.default(''),
});

const one = z.object({ visitId: id });

/** The visit lands in the day's "not placed". */
export const createVisit = endpoint({
  method: 'POST',
  path: '/api/visits',
  summary: 'Book a visit',
  body: visitFields,
  response: visitCard,
});
export const getVisit = endpoint({
  method: 'GET',
  path: '/api/visits/:visitId',
  summary: 'A visit with its forecast',
  params: one,
  response: visitCard,
});
/** A new promise appends a version; the old ones stay. */
export const updateVisit = endpoint({
  method: 'PATCH',
  path: '/api/visits/:visitId',
  summary: 'Change the promise, allowed windows, groomer or note of a visit',
  params: one,
  body: z.object({
    promise: window.nullable().optional(),
    allowed: visitFields.shape.allowed.unwrap().optional(),
    preferredGroomerId: id.nullable().optional(),
    note: note.optional(),
  }),
  response: visitCard,
});
export const cancelVisit = endpoint({
  method: 'POST',
  path: '/api/visits/:visitId/cancel',
  summary: 'Cancel a visit that has not begun',
  params: one,
  body: z.object({ reason: z.string().trim().min(1, 'must say why').max(200) }),
  response: done,
});
