import { addRunEvents } from '#shared/api/runs.ts';
import { callApi } from '#src/api/callApi.ts';
import { queryClient } from '#src/api/queryClient.ts';
import { runQueries } from '#src/api/runs.ts';
import { readSession } from '#src/api/sessionStore.ts';
import type { Session } from '#shared/api/session.ts';
import { clockOffsetMs, noteServerNow } from './clockOffset.ts';
import { EventQueue } from './EventQueue.ts';
import { openPhoneStore } from './openPhoneStore.ts';

let started: { ownerKey: string; queue: Promise<EventQueue> } | null = null;

/** Person and business of a sign-in: whose taps and runs these are. */
export function ownerKeyOf(session: Session): string {
  return `${session.business.id}:${session.user.id}`;
}

/** The signed-in person's queue, sending by itself until somebody else signs in. */
export function startQueue(ownerKey: string): Promise<EventQueue> {
  if (started?.ownerKey === ownerKey) return started.queue;
  void started?.queue.then((queue) => queue.stop());
  started = { ownerKey, queue: open(ownerKey) };
  return started.queue;
}

async function open(ownerKey: string): Promise<EventQueue> {
  const store = await openPhoneStore();
  const queue = new EventQueue({
    store,
    ownerKey,
    send: async (runId, events) => {
      // Between sign-out and the next sign-in nothing may go out under the wrong name.
      const session = readSession();
      if (!session || ownerKeyOf(session) !== ownerKey)
        throw new Error('Not signed in as the owner');
      return callApi(addRunEvents, { params: { runId }, body: { events } });
    },
    onRun: (run) => {
      noteServerNow(run.serverNow, Date.now());
      queryClient.setQueryData(runQueries.one(run.runId).queryKey, run);
      void store.keepRun({ ownerKey, run, keptAtMs: Date.now() });
    },
    nowMs: () => Date.now(),
    offsetMs: clockOffsetMs,
    exclusively: oneTabAtATime,
  });
  window.addEventListener('online', () => void queue.wake());
  document.addEventListener('visibilitychange', () => {
    void (document.visibilityState === 'hidden' ? queue.flush(true) : queue.wake());
  });
  void queue.start();
  return queue;
}

function oneTabAtATime(work: () => Promise<void>): Promise<void> {
  // Locks exist only on secure pages; without them two tabs may send a tap twice, which is harmless.
  if (!('locks' in navigator) || !navigator.locks) return work();
  return navigator.locks.request('furlong-events', work) as unknown as Promise<void>;
}
