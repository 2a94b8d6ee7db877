import { useMemo } from 'react';
import type { Day } from '#shared/api/days.ts';
import type { DayTimes, Plan } from '#shared/schedule/types.ts';
import { stripsRange } from '#src/strips/stripsRange.ts';
import { movedVisits } from './proposalRows.ts';
import { sentWords } from './sentWords.ts';
import { stripsOf } from './stripsOf.ts';
import type { PendingChange } from './useDayChange.ts';
import type { Trial } from './tryMove.ts';
import { vanPaint } from './vanPaint.ts';

/**
 * What strips and map draw: the day as it is, the change being weighed, or the proposal; and how the
 * drawn day differs from the one that is. Each part keeps its identity while it stays the same.
 */
export function useShownDay(
  day: Day,
  base: DayTimes,
  pending: PendingChange | null,
  trial: Trial | null,
  offered: { plan: Plan; times: DayTimes } | null,
) {
  const drawn = trial && !trial.refusedBecause ? trial : pending ? null : offered;
  const plan = drawn?.plan ?? day.plan;
  const times = drawn?.times ?? base;
  const still = useMemo(() => stripsOf(day, day.plan, base), [day, base]);
  const strips = useMemo(
    () => (times === base ? still : stripsOf(day, plan, times)),
    [day, plan, times, base, still],
  );
  const moved = useMemo(() => {
    if (pending) return new Set([pending.visitId]);
    return drawn ? movedVisits(day.plan, plan) : nothingMoved;
  }, [pending, drawn, day.plan, plan]);
  const shifts = useMemo(() => (times === base ? null : arrivalShifts(base, times)), [base, times]);
  const ghost = useMemo(
    () => (pending && trial?.moved ? placeBefore(base, pending.visitId) : null),
    [pending, trial, base],
  );
  const marks = useMemo(() => vanMarks(day), [day]);
  return { plan, times, strips, range: useRange(still, strips), moved, shifts, ghost, marks };
}

/** Both the day as it is and the one drawn fit the axis, so that nothing jumps while weighing. */
function useRange(still: ReturnType<typeof stripsOf>, drawn: ReturnType<typeof stripsOf>) {
  return useMemo(() => {
    const [one, other] = [stripsRange(still), stripsRange(drawn)];
    return {
      fromSeconds: Math.min(one.fromSeconds, other.fromSeconds),
      toSeconds: Math.max(one.toSeconds, other.toSeconds),
    };
  }, [still, drawn]);
}

function vanMarks(day: Day) {
  return new Map(
    day.problem.vans.map((van, index) => {
      const run = day.runs.find((one) => one.vanId === van.vanId);
      return [
        van.vanId,
        {
          shape: run?.shape ?? ('circle' as const),
          color: vanPaint(index).color,
          sentWords: run ? sentWords(day.problem, run) : null,
          changed: run?.changedSinceSent ?? false,
        },
      ];
    }),
  );
}

function arrivalShifts(before: DayTimes, after: DayTimes): Map<string, number> {
  const was = new Map(
    before.runs.flatMap((run) => run.stops.map((stop) => [stop.stopId, stop.arriveSeconds])),
  );
  return new Map(
    after.runs.flatMap((run) =>
      run.stops.map((stop) => [
        stop.stopId,
        stop.arriveSeconds - (was.get(stop.stopId) ?? stop.arriveSeconds),
      ]),
    ),
  );
}

function placeBefore(times: DayTimes, visitId: string) {
  for (const run of times.runs) {
    const stop = run.stops.find((one) => one.stopId === visitId);
    if (stop)
      return { vanId: run.vanId, fromSeconds: stop.startSeconds, toSeconds: stop.endSeconds };
  }
  return null;
}

const nothingMoved: ReadonlySet<string> = new Set();
