import type { Day } from '#shared/api/days.ts';
import type { DayTimes } from '#shared/schedule/types.ts';
import { writeList } from '#src/lib/words.ts';

/**
 * A run nobody sent is drawn as planned even when its hour to leave is over: this says so, since its
 * promises then only look safe. null while there is none, and on other days than today.
 */
export function unsentWords(
  day: Pick<Day, 'runs' | 'problem'>,
  times: Pick<DayTimes, 'runs'>,
  nowSeconds: number | null,
): string | null {
  if (nowSeconds === null) return null;
  const overdue = times.runs
    .filter(({ stops }) => stops.some(({ kind }) => kind === 'visit'))
    .filter(({ leaveSeconds }) => leaveSeconds < nowSeconds)
    .filter(({ vanId }) => day.runs.find((run) => run.vanId === vanId)?.sentAt === null)
    .map(({ vanId }) => day.problem.vans.find((van) => van.vanId === vanId)?.vanName ?? '');
  if (overdue.length === 0) return null;
  return `${writeList(overdue)} should have left and ${overdue.length === 1 ? 'is' : 'are'} not sent: times as planned`;
}
