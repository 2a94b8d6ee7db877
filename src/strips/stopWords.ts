import { formatWall, formatWallRange, type DayClock } from '#shared/time/formatWall.ts';
import { writeSpan } from '#src/lib/words.ts';
import type { StripStop } from './types.ts';

/** The second line under a stop's name: what matters most about it now. */
export function stopWords(day: DayClock, stop: StripStop, shiftSeconds = 0): string {
  const late = stop.promise && stop.arrival && stop.arrival.meanSeconds - stop.promise.endSeconds;
  if (stop.state === 'failed')
    return stop.failedReason ? `not done: ${stop.failedReason}` : 'not done';
  if (stop.atRisk && late && stop.onTimePermille === null)
    return `▲ ${Math.round(late / 60)} min late`;
  if (stop.atRisk && stop.state !== 'ahead' && stop.state !== 'driving' && late)
    return `▲ came ${Math.max(1, Math.round(late / 60))} min late`;
  if (stop.atRisk) return `▲ ${percentWords(stop.onTimePermille ?? 0)} on time`;
  if (Math.abs(shiftSeconds) >= 90) return shiftWords(shiftSeconds);
  if (stop.state === 'driving')
    return `on the way, ${formatWall(day, stop.arrival?.meanSeconds ?? stop.fromSeconds)}`;
  if (stop.state === 'arrived') return 'at the door';
  if (stop.state === 'working') return `working, done ${formatWall(day, stop.toSeconds)}`;
  return stop.words;
}

/** All of a stop in one sentence, for people who listen and for titles. */
export function stopSentence(day: DayClock, stop: StripStop, vanName: string): string {
  const parts = [
    `${stop.label}${stop.words ? `, ${stop.words}` : ''}`,
    `${vanName}, ${formatWallRange(day, stop.fromSeconds, stop.toSeconds)}`,
  ];
  if (stop.promise)
    parts.push(
      `promised ${formatWallRange(day, stop.promise.startSeconds, stop.promise.endSeconds)}`,
    );
  if (stop.onTimePermille !== null && stop.state === 'ahead')
    parts.push(`${percentWords(stop.onTimePermille)} on time`);
  if (stop.pinned) parts.push('pinned to this van');
  if (stop.state !== 'ahead') {
    const now = stopWords(day, stop);
    // What is done without more to say shows its pets again, which were said already.
    parts.push(now === '' || now === stop.words ? stop.state : now);
  }
  return parts.join(', ');
}

/** '71 %'. 100 % and 0 % are said only when nothing is left to chance. */
export function percentWords(permille: number): string {
  if (permille >= 1000) return '100 %';
  if (permille <= 0) return '0 %';
  return `${Math.min(99, Math.max(1, Math.round(permille / 10)))} %`;
}

/** '+14 min' or '−8 min' against the day as it is. */
export function shiftWords(seconds: number): string {
  return `${seconds < 0 ? '−' : '+'}${writeSpan(Math.abs(seconds))}`;
}
