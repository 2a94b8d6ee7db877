import type { StopHappened } from '#shared/schedule/reduceEvents.ts';

/**
 * Seconds of work on pets at a finished stop. Pets' own stopwatches where they were tapped; else
 * the stay less the booked set-up and clean-down (three taps a stop are enough). null unless done.
 */
export function workSeconds(
  stop: StopHappened,
  booked: { setUpSeconds: number; cleanDownSeconds: number },
): number | null {
  if (stop.state !== 'done') return null;
  const tapped = stop.pets.filter((pet) => !pet.startImplied && pet.doneSeconds !== null);
  if (tapped.length > 0 && tapped.length === stop.pets.length)
    return stop.pets.reduce((sum, pet) => sum + pet.doneSeconds! - pet.startedSeconds, 0);
  const { arrivedSeconds, leftSeconds } = stop.fact;
  if (arrivedSeconds === null || leftSeconds === null) return null;
  return Math.max(0, leftSeconds - arrivedSeconds - booked.setUpSeconds - booked.cleanDownSeconds);
}
