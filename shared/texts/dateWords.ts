import { localDateToUtcMs, weekdayOf } from '#shared/time/localDate.ts';

const weekdays = ['Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat', 'Sun'];
const months = 'Jan Feb Mar Apr May Jun Jul Aug Sep Oct Nov Dec'.split(' ');

/** 'Tue 14 Apr': the weekday said and the month spelled, so that no reader can swap day and month. */
export function dateWords(date: string): string {
  const day = new Date(localDateToUtcMs(date));
  return `${weekdays[weekdayOf(date) - 1]} ${day.getUTCDate()} ${months[day.getUTCMonth()]}`;
}
