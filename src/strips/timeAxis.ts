import { formatWall, type DayClock } from '#shared/time/formatWall.ts';

/** Seconds of the day to pixels, with its hour ticks. */
export interface TimeAxis {
  fromSeconds: number;
  toSeconds: number;
  widthPx: number;
  pxPerSecond: number;
  ticks: { seconds: number; words: string }[];
}

/**
 * An axis over whole hours around [from, to]; `ticks` are wall times, every second hour where an
 * hour is too narrow for its words.
 */
export function timeAxis(
  day: DayClock,
  fromSeconds: number,
  toSeconds: number,
  widthPx: number,
): TimeAxis {
  const from = Math.floor(fromSeconds / HALF_HOUR) * HALF_HOUR;
  const to = Math.max(from + 2 * HALF_HOUR, Math.ceil(toSeconds / HALF_HOUR) * HALF_HOUR);
  const pxPerSecond = widthPx / (to - from);
  const every = 3600 * Math.max(1, Math.ceil(44 / (pxPerSecond * 3600)));
  const ticks = [];
  for (let at = Math.ceil(from / 3600) * 3600; at <= to; at += every)
    ticks.push({ seconds: at, words: formatWall(day, at) });
  return { fromSeconds: from, toSeconds: to, widthPx, pxPerSecond, ticks };
}

export function xOf(axis: TimeAxis, seconds: number): number {
  return (seconds - axis.fromSeconds) * axis.pxPerSecond;
}

export function secondsAt(axis: TimeAxis, x: number): number {
  return axis.fromSeconds + x / axis.pxPerSecond;
}

const HALF_HOUR = 1800;
