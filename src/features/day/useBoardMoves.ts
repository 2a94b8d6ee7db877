import { useCallback, useEffect, useMemo, useRef, useState, type PointerEvent } from 'react';
import type { Day } from '#shared/api/days.ts';
import { isGivenUp } from '#shared/schedule/stepFact.ts';
import type { DayTimes, Move } from '#shared/schedule/types.ts';
import { toast } from '#src/components/toast.ts';
import type { DayStripsHandle } from '#src/strips/DayStrips.tsx';
import { moveOf } from './DragGhost.tsx';
import { moveWords, placeOf } from './moveWords.ts';
import type { DayChange } from './useDayChange.ts';
import { useVisitDrag, type DragTarget } from './useVisitDrag.ts';
import { useVisitKeys } from './useVisitKeys.ts';

/** Every way a person moves a visit (drag, keys, dialog, "try"), ending in one change being weighed. */
export function useBoardMoves(
  day: Day,
  base: DayTimes,
  change: DayChange,
  about: { past: boolean; mayMove: boolean; onOpenVisit: (visitId: string) => void },
) {
  const { problem, plan } = day;
  const { past, mayMove, onOpenVisit } = about;
  const { pending, propose } = change;
  const strips = useRef<DayStripsHandle>(null);
  const keepBox = useRef<HTMLDivElement>(null);
  const [said, say] = useState('');

  const stays = useCallback(
    (visitId: string): string | null => {
      const fact = problem.facts.find((one) => one.stopId === visitId);
      const label = problem.visits.find((visit) => visit.id === visitId)?.label ?? 'It';
      if (past) return 'This day is over; it shows what happened.';
      if (fact && !isGivenUp(fact)) return `${label} has begun and stays where it is.`;
      return mayMove ? null : 'You may look at the day, not change it.';
    },
    [problem, past, mayMove],
  );
  const draw = useCallback(
    (visitId: string, move: Move) => {
      propose({ visitId, move, carried: false });
      say(`${moveWords(problem, plan, move)}. Keep the move, or put it back.`);
    },
    [propose, problem, plan],
  );
  const onDrop = useCallback(
    (visitId: string, target: Exclude<DragTarget, null>) => {
      const move = moveOf(visitId, target);
      const place = placeOf(plan, visitId);
      const stayed =
        move.kind === 'placeVisit'
          ? place?.vanId === move.vanId && place.index === move.index
          : place === null;
      if (stayed) propose(null);
      else draw(visitId, move);
    },
    [plan, propose, draw],
  );
  const drag = useVisitDrag(strips, onDrop);
  const { start, endedJustNow } = drag;
  const startDrag = useCallback(
    (visitId: string, event: PointerEvent) => {
      if (stays(visitId) === null) start(visitId, event);
    },
    [stays, start],
  );
  const openVisit = useCallback(
    (visitId: string) => {
      if (!endedJustNow()) onOpenVisit(visitId);
    },
    [endedJustNow, onOpenVisit],
  );
  const focusLater = useCallback((visitId: string) => {
    setTimeout(() => strips.current?.focusVisit(visitId), FOCUS_AFTER_MS);
  }, []);
  const keys = useMemo(
    () => ({
      mayMove: stays,
      say,
      onOpen: onOpenVisit,
      onDropped: () =>
        setTimeout(() => keepBox.current?.querySelector('button')?.focus(), FOCUS_AFTER_MS),
    }),
    [stays, onOpenVisit],
  );
  const onKeyDown = useVisitKeys(day, base, change, keys);
  // Keys must go on reaching a carried visit although each arrow draws it anew elsewhere.
  const carried = pending?.carried ? pending : null;
  useEffect(() => {
    if (carried) strips.current?.focusVisit(carried.visitId);
  }, [carried]);

  return {
    strips,
    keepBox,
    said,
    stays,
    draw,
    drag,
    startDrag,
    openVisit,
    onKeyDown,
    keep: async () => {
      if (!pending || !(await change.keep())) return;
      toast(`Kept: ${moveWords(problem, plan, pending.move)}.`);
      focusLater(pending.visitId);
    },
    putBack: () => {
      propose(null);
      if (pending) focusLater(pending.visitId);
    },
  };
}

/** After React has drawn what is to be focused. */
const FOCUS_AFTER_MS = 60;
