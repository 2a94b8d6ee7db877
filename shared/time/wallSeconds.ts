import { localDateToUtcMs } from './localDate.ts';
import { readWall, wallToInstantMs } from './zoneOffset.ts';

/**
 * Elapsed seconds from the date's start to the moment the wall clock reads `wallMinutes` after
 * midnight (1,440 and more: the next date). A reading that happens twice means the first time; one
 * that is skipped moves on by the gap.
 */
export function wallToSeconds(date: string, timeZone: string, wallMinutes: number): number {
  const midnight = localDateToUtcMs(date);
  const start = wallToInstantMs(timeZone, midnight);
  return (wallToInstantMs(timeZone, midnight + wallMinutes * 60_000) - start) / 1000;
}

/** Whole wall minutes after the date's midnight that the clock reads `seconds` into the day. */
export function secondsToWall(date: string, timeZone: string, seconds: number): number {
  const midnight = localDateToUtcMs(date);
  const wall = readWall(timeZone, wallToInstantMs(timeZone, midnight) + seconds * 1000);
  const date0 = Date.UTC(wall.year, wall.month - 1, wall.day);
  return (date0 - midnight) / 60_000 + wall.hour * 60 + wall.minute;
}

/** Whole elapsed seconds from `dayStartUtc` to an instant (ISO text or epoch ms), rounded down. */
export function instantToSeconds(dayStartUtc: string, instant: string | number): number {
  const ms = typeof instant === 'number' ? instant : Date.parse(instant);
  const start = Date.parse(dayStartUtc);
  if (Number.isNaN(ms) || Number.isNaN(start))
    throw new RangeError(`instant: '${instant}' from '${dayStartUtc}' is not an ISO instant`);
  return Math.floor((ms - start) / 1000);
}

/** The ISO instant `seconds` into the day that starts at `dayStartUtc`. */
export function secondsToInstant(dayStartUtc: string, seconds: number): string {
  return new Date(Date.parse(dayStartUtc) + seconds * 1000).toISOString();
}
