import { addDays, localDateToUtcMs } from './localDate.ts';
import { readWall, wallToInstantMs } from './zoneOffset.ts';

/** Where a local date begins on the world's clock, and how long it lasts. */
export interface DayStart {
  /** ISO instant of the date's first moment, e.g. `2026-03-28T23:00:00.000Z`. */
  dayStartUtc: string;
  /** 86,400; 82,800 or 90,000 when the clocks change. */
  dayLengthSeconds: number;
}

/**
 * The first instant of `date` in `timeZone` and the seconds to the next date's first instant.
 * Throws a RangeError naming a bad date or zone.
 */
export function dayStart(date: string, timeZone: string): DayStart {
  const start = firstInstantMs(date, timeZone);
  const next = firstInstantMs(addDays(date, 1), timeZone);
  return {
    dayStartUtc: new Date(start).toISOString(),
    dayLengthSeconds: (next - start) / 1000,
  };
}

/** The local date a wall clock in `timeZone` shows at an instant (ISO text or epoch ms). */
export function localDateAt(instant: string | number, timeZone: string): string {
  const wall = readWall(timeZone, typeof instant === 'number' ? instant : Date.parse(instant));
  const two = (value: number) => String(value).padStart(2, '0');
  return `${String(wall.year).padStart(4, '0')}-${two(wall.month)}-${two(wall.day)}`;
}

function firstInstantMs(date: string, timeZone: string): number {
  // Where clocks skip midnight, wallToInstantMs moves on by the gap, which is the date's first moment.
  return wallToInstantMs(timeZone, localDateToUtcMs(date));
}
