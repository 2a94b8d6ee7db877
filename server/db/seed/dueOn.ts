import { daysBetween } from '#shared/time/localDate.ts';
import type { Household } from '#server/models/Household.ts';

/** A household with what decides its rhythm. */
export interface Rhythm {
  household: Household;
  petIds: string[];
  intervalWeeks: number;
  /** A usual stay there with the drive to it, so that a day is not booked beyond its hours. */
  staySeconds: number;
}

const epoch = '2024-01-01';

/**
 * Households due on a date: each comes round every `intervalWeeks`, on a day of its cycle that
 * neighbours share, so that a day is a few parts of town and not the whole of it.
 */
export function dueOn(
  date: string,
  rhythms: Rhythm[],
  centre: { lat: number; lon: number },
): Rhythm[] {
  const day = daysBetween(epoch, date);
  const due: Rhythm[] = [];
  for (const weeks of new Set(rhythms.map((one) => one.intervalWeeks))) {
    const cycle = weeks * 7;
    const around = rhythms
      .filter((one) => one.intervalWeeks === weeks)
      .sort((a, b) => angle(a.household, centre) - angle(b.household, centre));
    around.forEach((one, rank) => {
      // Times three round the clock: three sectors of town are busy at once, one a van.
      const phase = Math.floor((((rank * 3) % around.length) / around.length) * cycle);
      if (day % cycle === phase) due.push(one);
    });
  }
  return due;
}

function angle(at: { lat: number; lon: number }, centre: { lat: number; lon: number }): number {
  return Math.atan2(at.lat - centre.lat, at.lon - centre.lon);
}
