import { daysBetween } from '#shared/time/localDate.ts';
import type { Household } from '#server/models/Household.ts';
import { randomFor } from './randomFor.ts';

/** A household with what decides its rhythm. */
export interface Rhythm {
  household: Household;
  petIds: string[];
  intervalWeeks: number;
  /** A usual stay there with the drive to it, so that a day is not booked beyond its hours. */
  staySeconds: number;
}

const epoch = '2024-01-01';

/** Households due on a date: each comes round every `intervalWeeks`, on a day of its cycle drawn once. */
export function dueOn(date: string, rhythms: Rhythm[]): Rhythm[] {
  const day = daysBetween(epoch, date);
  return rhythms.filter(({ household, intervalWeeks }) => {
    const cycle = intervalWeeks * 7;
    const random = randomFor(`phase ${household.name} ${household.addressLabel}`);
    return day % cycle === Math.floor(random() * cycle);
  });
}
