import type { Strip } from './types.ts';

/** First and last moment a set of strips draws: shifts, finishes and promises. */
export function stripsRange(strips: readonly Strip[]): { fromSeconds: number; toSeconds: number } {
  if (strips.length === 0) return { fromSeconds: 8 * 3600, toSeconds: 18 * 3600 };
  const promises = strips.flatMap((strip) =>
    strip.stops.flatMap((stop) => (stop.promise ? [stop.promise] : [])),
  );
  return {
    fromSeconds: Math.min(
      ...strips.map((strip) => strip.shiftStartSeconds),
      ...strips.flatMap((strip) => strip.stops.map((stop) => stop.drive?.fromSeconds ?? Infinity)),
      ...promises.map((promise) => promise.startSeconds),
    ),
    toSeconds: Math.max(
      ...strips.map((strip) =>
        // Overtime says its minutes behind the finish.
        Math.max(
          strip.shiftEndSeconds,
          strip.finishSeconds + (strip.overtimeSeconds > 0 ? 2700 : 0),
        ),
      ),
      ...promises.map((promise) => promise.endSeconds),
    ),
  };
}
