import { useEffect } from 'react';
import type { Day } from '#shared/api/days.ts';
import { ApiError } from '#src/api/ApiError.ts';
import { useRedoMove, useUndoMove } from '#src/api/days.ts';
import { toast } from '#src/components/toast.ts';
import { errorWords } from '#src/lib/errorWords.ts';
import { dayInAnswer } from './useDayChange.ts';
import type { OpenProposal } from './useProposal.ts';

/** Undo, redo and asking for a proposal; each says what happened. Ctrl or Cmd with Z works too. */
export function useBoardActions(
  day: Day,
  mayMove: boolean,
  proposal: OpenProposal,
  onDay: (day: Day) => void,
  letGo: () => void,
) {
  const undo = useUndoMove();
  const redo = useRedoMove();
  const step = (mutation: typeof undo | typeof redo, offered: Day['undo'], words: string) =>
    mutation.mutate(
      { params: { date: day.date }, body: offered ? { changeId: offered.changeId } : {} },
      {
        onSuccess: (next) => {
          letGo();
          onDay(next);
          toast(words);
        },
        onError: (error) => {
          const now = error instanceof ApiError ? dayInAnswer(error.body) : null;
          if (now) onDay(now);
          toast(errorWords(error), 'bad');
        },
      },
    );
  const busy = undo.isPending || redo.isPending;
  const onUndo = () => step(undo, day.undo, `Taken back: ${day.undo?.words ?? 'the last move'}`);
  const onRedo = () => step(redo, day.redo, `Made again: ${day.redo?.words ?? 'the move'}`);
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== 'z') return;
      if ((event.target as Element).closest('input, textarea, select, dialog') || busy) return;
      event.preventDefault();
      if (event.shiftKey && day.redo) onRedo();
      else if (!event.shiftKey && day.undo) onUndo();
    };
    if (!mayMove) return;
    window.addEventListener('keydown', press);
    return () => window.removeEventListener('keydown', press);
  });
  const find = async (scope: 'day' | 'notPlaced') => {
    letGo();
    try {
      await proposal.start(scope);
    } catch (error) {
      toast(errorWords(error), 'bad');
    }
  };
  return { busy, onUndo, onRedo, find };
}
