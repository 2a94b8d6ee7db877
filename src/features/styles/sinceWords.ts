import { dayWords } from '#src/lib/dayWords.ts';

/** "since 3 March", with the year when it is another one; `madeAt` null: before versions were kept. */
export function sinceWords(madeAt: string | null, timeZone: string, today: string): string {
  return madeAt === null ? 'from the beginning' : `since ${dayWords(madeAt, timeZone, today)}`;
}
