import type { z } from 'zod';
import type { tank } from '#shared/api/vans.ts';

export type TankKind = z.infer<typeof tank>['kind'];

export const tankWords: Record<TankKind, string> = {
  fresh: 'Fresh water',
  grey: 'Grey water',
  energy: 'Energy',
  towels: 'Towels',
};
