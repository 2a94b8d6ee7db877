import { useCallback, useEffect, useRef, useState } from 'react';
import type { EventQueue, Tap } from '#src/offline/EventQueue.ts';

/** A tap can be taken back for this long before it is sent: hands are wet. */
const holdMs = 4_000;
/** A second touch this soon after is the same touch. */
const restMs = 700;

export interface LastTap {
  ids: string[];
  words: string;
  kinds: string[];
}

/** Making taps on a run: `act` keeps and queues them, `undo` takes the last ones back while it can. */
export function useRunTaps(queue: EventQueue | null, run: { runId: string; version: number }) {
  const [resting, setResting] = useState(false);
  const [last, setLast] = useState<LastTap | null>(null);
  const busy = useRef(false);
  const timers = useRef<ReturnType<typeof setTimeout>[]>([]);
  useEffect(() => () => timers.current.forEach(clearTimeout), []);
  const later = (inMs: number, work: () => void) => timers.current.push(setTimeout(work, inMs));

  const act = useCallback(
    async (words: string, taps: readonly Tap[]) => {
      if (!queue || busy.current) return;
      busy.current = true;
      setResting(true);
      later(restMs, () => {
        busy.current = false;
        setResting(false);
      });
      navigator.vibrate?.(20);
      const ids = await queue.add({ runId: run.runId, version: run.version }, taps, holdMs);
      setLast({ ids, words, kinds: taps.map(({ kind }) => kind) });
      later(holdMs, () => setLast((now) => (now?.ids === ids ? null : now)));
    },
    [queue, run.runId, run.version],
  );
  const undo = useCallback(async () => {
    if (!queue || !last) return;
    await queue.undo(last.ids);
    setLast(null);
  }, [queue, last]);
  return { act, undo, last, resting };
}
