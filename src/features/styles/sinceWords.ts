/** "since 3 March", with the year when it is another one; `madeAt` null: before versions were kept. */
export function sinceWords(madeAt: string | null, timeZone: string, today: string): string {
  return madeAt === null ? 'from the beginning' : `since ${dayWords(madeAt, timeZone, today)}`;
}

/** "3 March" of an instant, in the business's zone. */
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
