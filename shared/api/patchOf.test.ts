import { expect, it } from 'vitest';
import { z } from 'zod';
import { patchOf } from './patchOf.ts';

const fields = z.object({ name: z.string().min(1), notes: z.string().default('none') });

it('leaves absent fields absent, defaults too', () => {
  expect(patchOf(fields).parse({ name: 'Otter' })).toEqual({ name: 'Otter' });
  expect(patchOf(fields).parse({})).toEqual({});
});

it('still checks what is given', () => {
  expect(patchOf(fields).safeParse({ name: '' }).success).toBe(false);
  expect(patchOf(fields).parse({ notes: 'gate sticks' })).toEqual({ notes: 'gate sticks' });
});
