import { useEffect, useState, useSyncExternalStore } from 'react';
import { useSession } from '#src/api/sessionStore.ts';
import type { EventQueue, QueueSnapshot } from './EventQueue.ts';
import { ownerKeyOf, startQueue } from './startQueue.ts';

const empty: QueueSnapshot = { queued: [], taken: [], waiting: false };
const never = () => () => undefined;

/** The signed-in person's queue of taps (null until it is open) and what is in it. */
export function useEventQueue(): { queue: EventQueue | null } & QueueSnapshot {
  const ownerKey = ownerKeyOf(useSession());
  const [queue, setQueue] = useState<EventQueue | null>(null);
  useEffect(() => {
    let wanted = true;
    void startQueue(ownerKey).then((opened) => {
      if (wanted) setQueue(opened);
    });
    return () => {
      wanted = false;
    };
  }, [ownerKey]);
  const snapshot = useSyncExternalStore(
    queue?.subscribe ?? never,
    queue?.snapshot ?? (() => empty),
  );
  return { queue, ...snapshot };
}
