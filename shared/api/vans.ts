import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { patchOf } from './patchOf.ts';
import { done, id, name } from './values.ts';

export const vanShape = z.enum(['square', 'circle', 'triangle', 'diamond', 'hexagon', 'cross']);
export const tank = z.object({
  kind: z.enum(['fresh', 'grey', 'energy', 'towels']),
  capacityMl: z
    .int()
    .min(1000, 'must be 1 litre or more')
    .max(2_000_000, 'must be 2,000 litres or fewer'),
});

const vanFields = z.object({
  name,
  shape: vanShape,
  startPlaceId: id,
  endPlaceId: id,
  tanks: z
    .array(tank)
    .max(4)
    .refine(
      (list) => new Set(list.map((one) => one.kind)).size === list.length,
      'must name each tank once',
    ),
  tableLimitGrams: z.int().min(1000, 'must be 1 kg or more').max(120_000, 'must be 120 kg or less'),
});

export const van = vanFields.extend({ id, active: z.boolean() });
export type Van = z.infer<typeof van>;

const one = z.object({ vanId: id });

export const listVans = endpoint({
  method: 'GET',
  path: '/api/vans',
  summary: 'Vans in use',
  response: z.array(van),
});
export const createVan = endpoint({
  method: 'POST',
  path: '/api/vans',
  summary: 'Add a van',
  body: vanFields,
  response: van,
});
export const updateVan = endpoint({
  method: 'PATCH',
  path: '/api/vans/:vanId',
  summary: 'Change a van',
  params: one,
  body: patchOf(vanFields),
  response: van,
});
export const retireVan = endpoint({
  method: 'DELETE',
  path: '/api/vans/:vanId',
  summary: 'Take a van out of use; its past stays',
  params: one,
  response: done,
});
