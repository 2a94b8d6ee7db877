import { formatWall, type DayClock } from '#shared/time/formatWall.ts';

/** Two wall times as people read them: `{ from: '9:48', to: '9:56' }`. */
export interface WallRange {
  from: string;
  to: string;
}

/**
 * A range of elapsed seconds of a day as wall times, widened to whole minutes: the start rounded
 * down and the end up, so that words never claim more than the forecast does.
 */
export function wallRange(day: DayClock, fromSeconds: number, toSeconds: number): WallRange {
  return {
    from: formatWall(day, fromSeconds),
    to: formatWall(day, Math.ceil(toSeconds / 60) * 60),
  };
}

/** '9:48–9:56' for screens and letters, or one time when both are the same minute. */
export function screenRange(range: WallRange): string {
  return range.from === range.to ? range.from : `${range.from}–${range.to}`;
}

/** '9:48-9:56' for an SMS: an en dash would push the whole text into UCS-2 and double its price. */
export function smsRange(range: WallRange): string {
  return range.from === range.to ? range.from : `${range.from}-${range.to}`;
}
