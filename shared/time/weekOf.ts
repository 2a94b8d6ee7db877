import { addDays, weekdayOf } from './localDate.ts';

/** The seven dates of the ISO week `date` lies in, Monday first. */
export function weekOf(date: string): string[] {
  const monday = addDays(date, 1 - weekdayOf(date));
  return Array.from({ length: 7 }, (_, day) => addDays(monday, day));
}
