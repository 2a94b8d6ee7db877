import { readWall } from './zoneOffset.ts';

/** What of a day is needed to read its clock; a `DayProblem` fits. */
export interface DayClock {
  dayStartUtc: string;
  timeZone: string;
}

/** The wall clock `seconds` into the day, '9:48' (24 hours, cut to the minute). */
export function formatWall(day: DayClock, seconds: number): string {
  const wall = readWall(day.timeZone, Date.parse(day.dayStartUtc) + Math.floor(seconds) * 1000);
  return `${wall.hour}:${String(wall.minute).padStart(2, '0')}`;
}

/** Two wall times with an en dash: '9:30–11:30'. */
export function formatWallRange(day: DayClock, fromSeconds: number, toSeconds: number): string {
  const [from, to] = [formatWall(day, fromSeconds), formatWall(day, toSeconds)];
  return from === to ? from : `${from}–${to}`;
}
