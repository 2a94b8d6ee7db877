import { useCallback, useMemo, useState } from 'react';
import type { Day } from '#shared/api/days.ts';
import { day as daySchema } from '#shared/api/days.ts';
import type { DayTimes, Move } from '#shared/schedule/types.ts';
import { ApiError } from '#src/api/ApiError.ts';
import { useMoveVisit } from '#src/api/days.ts';
import { runVersionsOf } from './runVersionsOf.ts';
import { tryMove, type Trial } from './tryMove.ts';

/** A change drawn on the strips and not yet kept. `carried`: still held by the keyboard. */
export interface PendingChange {
  visitId: string;
  move: Move;
  carried: boolean;
}

export interface DayChange {
  pending: PendingChange | null;
  trial: Trial | null;
  /** Something to know before going on: the day moved on, or the move was refused. */
  notice: string | null;
  keeping: boolean;
  propose: (change: PendingChange | null) => void;
  keep: () => Promise<boolean>;
}

/**
 * The one change being weighed. It is tried anew on every newer day that arrives, so what stands on
 * the screen is always what keeping it would do now.
 */
export function useDayChange(
  day: Day,
  before: DayTimes,
  onDay: (day: Day) => void,
  readAgain: () => Promise<unknown>,
): DayChange {
  const [pending, setPending] = useState<PendingChange | null>(null);
  const [notice, setNotice] = useState<string | null>(null);
  const moveVisit = useMoveVisit();
  const trial = useMemo(
    () => (pending ? tryMove(day.problem, day.plan, before, pending.move) : null),
    [pending, day.problem, day.plan, before],
  );
  const propose = useCallback((change: PendingChange | null) => {
    setPending(change);
    setNotice(null);
  }, []);
  const { mutateAsync } = moveVisit;
  const keep = useCallback(async () => {
    if (!pending || pending.move.kind === 'replacePlan') return false;
    try {
      const kept = await mutateAsync({
        params: { date: day.date },
        body: { move: pending.move, runVersions: runVersionsOf(day, day.plan, pending.move) },
      });
      onDay(kept);
      setPending(null);
      setNotice(null);
      return true;
    } catch (error) {
      if (error instanceof ApiError && error.code === 'versionMoved') {
        const now = dayInAnswer(error.body);
        if (now) onDay(now);
        else await readAgain();
        setNotice(
          'Someone changed this run a moment ago. The strips show the day as it is now, with your move tried on it. Nothing was kept.',
        );
      } else setNotice(error instanceof Error ? error.message : 'The move could not be kept.');
      return false;
    }
  }, [pending, mutateAsync, day, onDay, readAgain]);
  return { pending, trial, notice, keeping: moveVisit.isPending, propose, keep };
}

/** The day as it is now, when the refusal carries it. */
export function dayInAnswer(body: unknown): Day | null {
  const holder = body as { day?: unknown } | null;
  const parsed = daySchema.safeParse(holder?.day ?? null);
  return parsed.success ? parsed.data : null;
}
