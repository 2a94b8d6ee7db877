import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { name, phone } from './values.ts';

export const timeZone = z.string().refine((zone) => {
  try {
    new Intl.DateTimeFormat('en', { timeZone: zone });
    return zone.includes('/') || zone === 'UTC';
  } catch {
    return false;
  }
}, 'must be a time zone like Europe/Lisbon');
export const currency = z
  .string()
  .trim()
  .toUpperCase()
  .pipe(z.string().regex(/^[A-Z]{3}$/, 'must be three letters like EUR (ISO 4217)'));
export const distanceUnit = z.enum(['km', 'mi'], 'must be km or mi');
export const weightUnit = z.enum(['kg', 'lb'], 'must be kg or lb');

const price = z.int().min(0, 'must not be negative').max(10_000_000, 'must be 100,000 or less');

export const business = z.object({
  name: z.string(),
  timeZone: z.string(),
  currency: z.string(),
  distanceUnit,
  weightUnit,
  areaName: z.string(),
  /** The number texts come from, E.164. */
  senderPhone: z.string().nullable(),
  /** What households can call, E.164. */
  deskPhone: z.string().nullable(),
  setUpMinutes: z.int(),
  cleanDownMinutes: z.int(),
  /** What a groomer's hour at the pet costs a household; 0 until it is set. In the currency's hundredths. */
  priceCentsPerHour: z.int(),
  calloutCents: z.int(),
});
export type Business = z.infer<typeof business>;

export const getBusiness = endpoint({
  method: 'GET',
  path: '/api/business',
  summary: 'The business and its settings',
  response: business,
});

export const updateBusiness = endpoint({
  method: 'PATCH',
  path: '/api/business',
  summary: 'Change the business and its settings',
  body: z
    .object({
      name,
      timeZone,
      currency,
      distanceUnit,
      weightUnit,
      areaName: z.string().trim().min(1).max(60),
      senderPhone: phone.nullable(),
      deskPhone: phone.nullable(),
      setUpMinutes: z.int().min(0).max(60, 'must be 60 minutes or fewer'),
      cleanDownMinutes: z.int().min(0).max(60, 'must be 60 minutes or fewer'),
      priceCentsPerHour: price,
      calloutCents: price,
    })
    .partial(),
  response: business,
});

/** Areas whose maps are on this server, for the working-area choice. */
export const listAreas = endpoint({
  method: 'GET',
  path: '/api/areas',
  summary: 'Imported areas',
  response: z.array(
    z.object({
      name: z.string(),
      version: z.string(),
      addressCount: z.int(),
      bounds: z.tuple([z.number(), z.number(), z.number(), z.number()]),
      attribution: z.string(),
    }),
  ),
});
