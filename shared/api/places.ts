import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { patchOf } from './patchOf.ts';
import { done, id, latitude, longitude, name, phone, wallMinutes } from './values.ts';

export const placeKind = z.enum(['depot', 'waterFill', 'waterDump', 'fillAndDump', 'emergencyVet']);

const placeFields = z.object({
  kind: placeKind,
  name,
  addressLabel: z.string().trim().max(160).default(''),
  lat: latitude,
  lon: longitude,
  phone: phone.nullable().default(null),
  opensMinutes: wallMinutes.default(0),
  closesMinutes: wallMinutes.default(1440),
  /** How long a refill or dump takes there. */
  lengthMinutes: z.int().min(1).max(120).default(12),
});

export const place = placeFields.extend({ id });
export type Place = z.infer<typeof place>;

const one = z.object({ placeId: id });
const opensBeforeCloses = 'must open before it closes';

export const listPlaces = endpoint({
  method: 'GET',
  path: '/api/places',
  summary: 'Depots, water places, emergency vets',
  response: z.array(place),
});
export const createPlace = endpoint({
  method: 'POST',
  path: '/api/places',
  summary: 'Add a place',
  body: placeFields.refine((p) => p.opensMinutes < p.closesMinutes, {
    path: ['closesMinutes'],
    message: opensBeforeCloses,
  }),
  response: place,
});
export const updatePlace = endpoint({
  method: 'PATCH',
  path: '/api/places/:placeId',
  summary: 'Change a place',
  params: one,
  body: patchOf(placeFields),
  response: place,
});
export const removePlace = endpoint({
  method: 'DELETE',
  path: '/api/places/:placeId',
  summary: 'Remove a place no van starts or ends at',
  params: one,
  response: done,
});
