import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { latitude, longitude } from './values.ts';

export const address = z.object({
  id: z.string(),
  label: z.string(),
  street: z.string(),
  houseNumber: z.string(),
  city: z.string(),
  postcode: z.string(),
  lat: z.number(),
  lon: z.number(),
});
export type Address = z.infer<typeof address>;

export const findAddresses = endpoint({
  method: 'GET',
  path: '/api/addresses',
  summary: 'Addresses of the working area that match some text',
  query: z.object({
    text: z.string().trim().min(1).max(120),
    limit: z.coerce.number().int().min(1).max(20).default(8),
  }),
  response: z.array(address),
});

export const findNearestAddress = endpoint({
  method: 'GET',
  path: '/api/addresses/nearest',
  summary: 'The address next to a pin, or null when none is near',
  query: z.object({
    lat: z.coerce.number().pipe(latitude),
    lon: z.coerce.number().pipe(longitude),
  }),
  response: z.object({ address: address.nullable(), outsideArea: z.boolean() }),
});

/** Road shape through points in order: one polyline per leg, `[lat, lon]` pairs. */
export const getRoadLines = endpoint({
  method: 'POST',
  path: '/api/road-lines',
  summary: 'Road shapes of the legs through points in order',
  body: z.object({
    points: z
      .array(z.tuple([latitude, longitude]))
      .min(2)
      .max(60),
  }),
  response: z.object({
    legs: z.array(
      z.object({
        line: z.array(z.tuple([z.number(), z.number()])),
        driveSeconds: z.int(),
        driveMetres: z.int(),
        rough: z.boolean(),
      }),
    ),
  }),
});
