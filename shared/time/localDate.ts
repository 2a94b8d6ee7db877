/** True for a real calendar date written YYYY-MM-DD. */
export function isLocalDate(text: string): boolean {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text)) return false;
  const ms = Date.parse(`${text}T00:00:00Z`);
  return !Number.isNaN(ms) && new Date(ms).toISOString().slice(0, 10) === text;
}

/** Milliseconds UTC of the date's midnight, as if the date lay in UTC. Throws a RangeError for a bad date. */
export function localDateToUtcMs(date: string): number {
  if (!isLocalDate(date))
    throw new RangeError(`date: '${date}' is not a calendar date; write it as YYYY-MM-DD`);
  return Date.parse(`${date}T00:00:00Z`);
}

/** The date `days` later (earlier when negative). */
export function addDays(date: string, days: number): string {
  return new Date(localDateToUtcMs(date) + days * 86_400_000).toISOString().slice(0, 10);
}

/** Whole days from `from` to `to`; negative when `to` is earlier. */
export function daysBetween(from: string, to: string): number {
  return (localDateToUtcMs(to) - localDateToUtcMs(from)) / 86_400_000;
}

/** ISO weekday: 1 Monday … 7 Sunday. */
export function weekdayOf(date: string): number {
  return new Date(localDateToUtcMs(date)).getUTCDay() || 7;
}
