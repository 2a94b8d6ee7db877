/** "3 March" of an instant, in the business's zone; with the year when it is not today's. */
export function dayWords(instant: string, timeZone: string, today: string): string {
  const date = new Date(instant);
  const year = new Intl.DateTimeFormat('en-GB', { year: 'numeric', timeZone }).format(date);
  return new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'long',
    ...(year === today.slice(0, 4) ? {} : { year: 'numeric' }),
    timeZone,
  }).format(date);
}
