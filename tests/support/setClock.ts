import { dayStart } from '#shared/time/dayStart.ts';
import { wallToSeconds } from '#shared/time/wallSeconds.ts';
import { clock } from '#server/clock.ts';

export const testZone = 'Atlantic/Azores';

/** The instant the wall clock of the test businesses reads 'H:MM' or 'H:MM:SS' on a date. */
export function instantAt(date: string, wall: string): Date {
  const [hours, minutes, seconds = 0] = wall.split(':').map(Number) as [number, number, number?];
  const { dayStartUtc } = dayStart(date, testZone);
  const into = wallToSeconds(date, testZone, hours * 60 + minutes) + seconds;
  return new Date(Date.parse(dayStartUtc) + into * 1000);
}

/** Moves the server's clock there; sign-ins older than 15 minutes are over then. */
export function setClock(date: string, wall: string): Date {
  const instant = instantAt(date, wall);
  clock.offsetMs = instant.getTime() - Date.now();
  return instant;
}
