import type { DayRun } from '#shared/api/days.ts';
import { formatWall, type DayClock } from '#shared/time/formatWall.ts';
import { localDateAt } from '#shared/time/dayStart.ts';
import { instantToSeconds } from '#shared/time/wallSeconds.ts';
import { writeDate } from '#src/lib/words.ts';

/** "sent 7:12", "sent Mon 13 Apr 18:40", "changed since sent"; null while nothing was sent. */
export function sentWords(day: DayClock & { date: string }, run: DayRun): string | null {
  if (run.sentAt === null) return null;
  if (run.changedSinceSent) return 'changed since sent';
  return `sent ${momentWords(day, run.sentAt)}`;
}

/** "7:12" of the day's own date, "Mon 13 Apr 18:40" of another. */
export function momentWords(day: DayClock & { date: string }, instant: string): string {
  const on = localDateAt(instant, day.timeZone);
  const at = formatWall(day, instantToSeconds(day.dayStartUtc, instant));
  return on === day.date ? at : `${writeDate(on, 'short')} ${at}`;
}
