import { useCallback, type KeyboardEvent } from 'react';
import type { Day } from '#shared/api/days.ts';
import type { DayTimes } from '#shared/schedule/types.ts';
import { carryVisit, stayMove } from './carryVisit.ts';
import type { DayChange } from './useDayChange.ts';

/**
 * Moving a visit by keys: Enter or Space picks up, arrows carry, Enter or Space drops (the move then
 * waits to be kept), Escape puts back. D opens the visit. `mayMove` says why a visit cannot move.
 */
export function useVisitKeys(
  day: Day,
  times: DayTimes,
  change: DayChange,
  about: {
    mayMove: (visitId: string) => string | null;
    say: (words: string) => void;
    onOpen: (visitId: string) => void;
    onDropped: () => void;
  },
): (visitId: string, event: KeyboardEvent) => void {
  const { pending, propose } = change;
  return useCallback(
    (visitId, event) => {
      const { key } = event;
      if (event.metaKey || event.ctrlKey || event.altKey) return;
      const carried = pending?.carried && pending.visitId === visitId ? pending : null;
      const take = () => event.preventDefault();
      if (key === 'd' || key === 'D') {
        take();
        about.onOpen(visitId);
      } else if (key === 'Escape' && pending) {
        take();
        propose(null);
        about.say('Put back.');
      } else if ((key === 'Enter' || key === ' ') && carried) {
        take();
        const stayed = same(carried.move, stayMove(day.plan, visitId));
        propose(stayed ? null : { ...carried, carried: false });
        about.say(stayed ? 'Put down where it was.' : 'Dropped. Keep the move, or put it back.');
        if (!stayed) about.onDropped();
      } else if (key === 'Enter' || key === ' ') {
        take();
        const why = about.mayMove(visitId);
        if (why) about.say(why);
        else {
          propose({ visitId, move: stayMove(day.plan, visitId), carried: true });
          about.say('Picked up. Arrows move it, Enter drops it, Escape puts it back.');
        }
      } else if (carried && key.startsWith('Arrow')) {
        take();
        const starts = (id: string) =>
          times.runs.flatMap((run) => run.stops).find((stop) => stop.stopId === id)?.startSeconds ??
          Number.MAX_SAFE_INTEGER;
        const move = carryVisit(day.problem, day.plan, carried.move, key, starts);
        if (move) propose({ ...carried, move });
      }
    },
    [day, times, pending, propose, about],
  );
}

function same(one: object, other: object): boolean {
  return JSON.stringify(one) === JSON.stringify(other);
}
