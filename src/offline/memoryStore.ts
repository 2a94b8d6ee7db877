import type { KeptRun, PhoneStore, QueuedEvent } from './PhoneStore.ts';

/** Lasts as long as the page: for browsers that refuse IndexedDB (private windows), and for tests. */
export function memoryStore(deviceId: string): PhoneStore {
  let queue: QueuedEvent[] = [];
  let runs: KeptRun[] = [];
  let nextSeq = 0;
  return {
    append: async (make) => {
      const queued = make(deviceId, nextSeq++);
      queue.push(queued);
      return queued;
    },
    list: async () => [...queue],
    remove: async (ids) => {
      queue = queue.filter(({ event }) => !ids.includes(event.id));
    },
    refuse: async (id, why) => {
      queue = queue.map((one) => (one.event.id === id ? { ...one, refusedWhy: why } : one));
    },
    keepRun: async (kept) => {
      runs = runs.filter(({ run }) => run.runId !== kept.run.runId);
      runs.push(kept);
    },
    readRun: async (ownerKey, runId) =>
      runs.find((kept) => kept.ownerKey === ownerKey && kept.run.runId === runId) ?? null,
    forgetRuns: async (which) => {
      runs = runs.filter((kept) => !which(kept));
    },
  };
}
