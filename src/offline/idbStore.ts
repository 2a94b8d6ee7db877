import { openDB, type DBSchema, type IDBPDatabase } from 'idb';
import { deviceId, newDeviceId } from './deviceId.ts';
import type { KeptRun, PhoneStore, QueuedEvent } from './PhoneStore.ts';

interface PhoneDb extends DBSchema {
  /** Keyed by deviceSeq: the order of sending is the order of the keys. */
  queue: { key: number; value: QueuedEvent };
  runs: { key: [string, string]; value: KeptRun };
  device: { key: 'counter'; value: { deviceId: string; nextSeq: number } };
}

/** The phone's store in IndexedDB. Throws when the browser refuses a database. */
export async function idbStore(): Promise<PhoneStore> {
  const db = await openDB<PhoneDb>('furlong-phone', 1, {
    upgrade(made) {
      made.createObjectStore('queue');
      made.createObjectStore('runs');
      made.createObjectStore('device');
    },
  });
  return {
    append: (make) => append(db, make),
    list: () => db.getAll('queue'),
    remove: async (ids) => {
      const tx = db.transaction('queue', 'readwrite');
      for (let at = await tx.store.openCursor(); at; at = await at.continue())
        if (ids.includes(at.value.event.id)) await at.delete();
      await tx.done;
    },
    refuse: async (id, why) => {
      const tx = db.transaction('queue', 'readwrite');
      for (let at = await tx.store.openCursor(); at; at = await at.continue())
        if (at.value.event.id === id) await at.update({ ...at.value, refusedWhy: why });
      await tx.done;
    },
    keepRun: async (kept) => {
      await db.put('runs', kept, [kept.ownerKey, kept.run.runId]);
    },
    readRun: async (ownerKey, runId) => (await db.get('runs', [ownerKey, runId])) ?? null,
    forgetRuns: async (which) => {
      const tx = db.transaction('runs', 'readwrite');
      for (let at = await tx.store.openCursor(); at; at = await at.continue())
        if (which(at.value)) await at.delete();
      await tx.done;
    },
  };
}

async function append(
  db: IDBPDatabase<PhoneDb>,
  make: (deviceId: string, deviceSeq: number) => QueuedEvent,
): Promise<QueuedEvent> {
  const mine = deviceId();
  const tx = db.transaction(['queue', 'device'], 'readwrite');
  const known = await tx.objectStore('device').get('counter');
  // Name and counter live apart; if either was cleared, an old name must not count from 0 again.
  const counter = known?.deviceId === mine ? known : { deviceId: newDeviceId(), nextSeq: 0 };
  const base = known?.nextSeq ?? 0;
  const seq = Math.max(counter.nextSeq, base);
  const queued = make(counter.deviceId, seq);
  await tx.objectStore('queue').add(queued, seq);
  await tx.objectStore('device').put({ deviceId: counter.deviceId, nextSeq: seq + 1 }, 'counter');
  await tx.done;
  return queued;
}
