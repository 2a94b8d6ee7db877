import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { patchOf } from './patchOf.ts';
import { done, id, localDate, name, wallMinutes } from './values.ts';

export const skill = z.enum(['cats', 'hand-stripping', 'large', 'two-person lift']);

const groomerFields = z.object({ name, skills: z.array(skill).transform((s) => [...new Set(s)]) });
export const groomer = z.object({
  id,
  name: z.string(),
  skills: z.array(z.string()),
  /** The person's sign-in, when there is one. */
  userId: id.nullable(),
  active: z.boolean(),
});
export type Groomer = z.infer<typeof groomer>;

export const listGroomers = endpoint({
  method: 'GET',
  path: '/api/groomers',
  summary: 'Groomers and their skills',
  response: z.array(groomer),
});
export const createGroomer = endpoint({
  method: 'POST',
  path: '/api/groomers',
  summary: 'Add a groomer',
  body: groomerFields,
  response: groomer,
});
export const updateGroomer = endpoint({
  method: 'PATCH',
  path: '/api/groomers/:groomerId',
  summary: 'Change a groomer',
  params: z.object({ groomerId: id }),
  body: patchOf(groomerFields.extend({ active: z.boolean() })),
  response: groomer,
});

const shiftFields = z.object({
  date: localDate,
  vanId: id,
  groomerId: id,
  startMinutes: wallMinutes,
  endMinutes: wallMinutes,
  mostOvertimeMinutes: z.int().min(0).max(240).default(30),
  meal: z
    .object({
      lengthMinutes: z.int().min(5, 'must be 5 minutes or more').max(120),
      earliestMinutes: wallMinutes,
      latestMinutes: wallMinutes,
      dueAfterMinutes: z.int().min(0).max(1440),
    })
    .nullable(),
});
const startsBeforeEnd = {
  check: (s: { startMinutes: number; endMinutes: number }) => s.startMinutes < s.endMinutes,
  message: { path: ['endMinutes'], message: 'must be after the start' },
};

export const shift = shiftFields.extend({ id });
export type Shift = z.infer<typeof shift>;

export const listShifts = endpoint({
  method: 'GET',
  path: '/api/shifts',
  summary: 'Shifts from one date to another, both included, at most 62 days',
  query: z.object({ from: localDate, to: localDate }),
  response: z.array(shift),
});
/** One shift per van and date, and one per groomer and date. */
export const setShift = endpoint({
  method: 'PUT',
  path: '/api/shifts',
  summary: 'Set the shift of a van on a date',
  body: shiftFields.refine(startsBeforeEnd.check, startsBeforeEnd.message),
  response: shift,
});
export const removeShift = endpoint({
  method: 'DELETE',
  path: '/api/shifts/:shiftId',
  summary: 'Remove a shift; its visits become not placed',
  params: z.object({ shiftId: id }),
  response: done,
});
