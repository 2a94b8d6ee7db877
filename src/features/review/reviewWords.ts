import type { ReviewTotals } from '#shared/api/review.ts';

/** "For every hour of driving, 4.6 hours of grooming": the week in one sentence. */
export function reviewHeadline(week: ReviewTotals): string {
  if (week.groomSeconds === 0 && week.driveSeconds === 0) return 'No finished visit this week';
  const ratio = groomPerDrive(week);
  if (ratio === null) return `${hoursWords(week.groomSeconds)} of grooming without driving`;
  return `For every hour of driving, ${ratio} ${ratio === '1.0' ? 'hour' : 'hours'} of grooming`;
}

/** Hours groomed per hour driven, one decimal; null without driving. */
export function groomPerDrive(totals: ReviewTotals): string | null {
  if (totals.driveSeconds === 0) return null;
  return (totals.groomSeconds / totals.driveSeconds).toFixed(1);
}

/** "61 h 20", "48 min". */
export function hoursWords(seconds: number): string {
  const minutes = Math.round(seconds / 60);
  if (minutes < 60) return `${minutes} min`;
  return `${Math.floor(minutes / 60)} h ${String(minutes % 60).padStart(2, '0')}`;
}

/** "93 %" of the promises; null when none was made. */
export function keptWords(totals: ReviewTotals): string | null {
  if (totals.promises === 0) return null;
  return `${Math.round((100 * totals.promisesKept) / totals.promises)} %`;
}

/** "6–12 April", "30 March – 5 April", with the year when it is not `thisYear`. */
export function weekWords(from: string, to: string, thisYear: number): string {
  const format = (date: string, month: boolean) =>
    new Intl.DateTimeFormat('en-GB', {
      day: 'numeric',
      ...(month ? { month: 'long' } : {}),
      timeZone: 'UTC',
    }).format(new Date(`${date}T00:00:00Z`));
  const sameMonth = from.slice(0, 7) === to.slice(0, 7);
  const year = Number(to.slice(0, 4)) === thisYear ? '' : ` ${to.slice(0, 4)}`;
  return sameMonth
    ? `${format(from, false)}–${format(to, true)}${year}`
    : `${format(from, true)} – ${format(to, true)}${year}`;
}

/** "+10 %", "−1 %", "0 %" of a lean in permille. */
export function leanWords(permille: number): string {
  const percent = Math.round(permille / 10);
  if (percent === 0) return '0 %';
  return `${percent < 0 ? '−' : '+'}${Math.abs(percent)} %`;
}
