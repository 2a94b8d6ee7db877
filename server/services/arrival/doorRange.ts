import type { DayProblem, StopTimes } from '#shared/schedule/types.ts';

/**
 * When a household should open the door, elapsed seconds of the day: the forecast arrival, but never
 * before its promise begins or before work may start. A van that is early waits; the door does not.
 */
export function doorRange(
  problem: Pick<DayProblem, 'visits'>,
  stop: Pick<
    StopTimes,
    'stopId' | 'arriveEarlySeconds' | 'arriveLateSeconds' | 'waitSeconds' | 'startSeconds'
  >,
): { fromSeconds: number; toSeconds: number } {
  const promise = problem.visits.find(({ id }) => id === stop.stopId)?.promise;
  const fromSeconds = Math.max(
    stop.arriveEarlySeconds,
    promise?.startSeconds ?? 0,
    stop.waitSeconds > 0 ? stop.startSeconds : 0,
  );
  return { fromSeconds, toSeconds: Math.max(stop.arriveLateSeconds, fromSeconds) };
}
