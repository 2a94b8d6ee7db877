import { v7 } from 'uuid';
import type { RunDetail, RunEvent } from '#shared/api/runs.ts';
import type { PhoneStore, QueuedEvent } from './PhoneStore.ts';
import { refusalOf } from './refusalOf.ts';

type Distribute<E> = E extends RunEvent
  ? Omit<E, 'id' | 'v' | 'deviceId' | 'deviceSeq' | 'deviceAt' | 'offsetMs' | 'runVersion'>
  : never;
/** What a tap says; the queue adds who, when and in which order. */
export type Tap = Distribute<RunEvent>;

export interface QueueSnapshot {
  /** In order, refused ones included. */
  queued: readonly QueuedEvent[];
  /** Taken by the server while this page was open: an older answer must not hide them. */
  taken: readonly { runId: string; event: RunEvent }[];
  /** The last try failed; the next comes by itself. */
  waiting: boolean;
}

export interface QueueParts {
  store: PhoneStore;
  ownerKey: string;
  send: (runId: string, events: RunEvent[]) => Promise<RunDetail>;
  /** Hears every run the server answers with. */
  onRun: (run: RunDetail) => void;
  nowMs: () => number;
  offsetMs: () => number;
  /** Runs one sender at a time among tabs. */
  exclusively?: (work: () => Promise<void>) => Promise<void>;
}

const MOST_A_CALL = 200;
const FIRST_WAIT_MS = 1_000;
const LONGEST_WAIT_MS = 60_000;

/**
 * The groomer's taps on their way to the server: kept first, then sent in order, again and again
 * with growing pauses until the server has taken them. Ids are made here once, so a tap whose
 * answer was lost is sent again without being applied twice.
 */
export class EventQueue {
  readonly #parts: QueueParts;
  readonly #listeners = new Set<() => void>();
  #snapshot: QueueSnapshot = { queued: [], taken: [], waiting: false };
  #timer: ReturnType<typeof setTimeout> | null = null;
  #waitMs = FIRST_WAIT_MS;
  #running: Promise<void> | null = null;
  #stopped = false;

  constructor(parts: QueueParts) {
    this.#parts = parts;
  }

  readonly snapshot = (): QueueSnapshot => this.#snapshot;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  };

  /** Reads what an earlier page left and starts sending. */
  async start(): Promise<void> {
    await this.#reload();
    await this.flush();
  }

  stop(): void {
    this.#stopped = true;
    if (this.#timer) clearTimeout(this.#timer);
  }

  /** Keeps taps made at one moment; sends them once `holdMs` is over. Gives the ids made. */
  async add(
    run: { runId: string; version: number },
    taps: readonly Tap[],
    holdMs = 0,
  ): Promise<string[]> {
    const { store, ownerKey, nowMs, offsetMs } = this.#parts;
    const tappedMs = nowMs();
    const ids: string[] = [];
    for (const tap of taps) {
      const { event } = await store.append((deviceId, deviceSeq) => ({
        event: {
          ...tap,
          id: v7(),
          v: 1,
          deviceId,
          deviceSeq,
          deviceAt: new Date(tappedMs).toISOString(),
          offsetMs: offsetMs(),
          runVersion: run.version,
        } as RunEvent,
        runId: run.runId,
        ownerKey,
        holdUntilMs: tappedMs + holdMs,
        refusedWhy: null,
      }));
      ids.push(event.id);
    }
    await this.#reload();
    this.#schedule(holdMs);
    return ids;
  }

  /** Takes taps back while they are held. False when one is already on its way. */
  async undo(ids: readonly string[]): Promise<boolean> {
    const held = this.#snapshot.queued.filter(({ event }) => ids.includes(event.id));
    if (held.length !== ids.length || held.some((one) => one.holdUntilMs <= this.#parts.nowMs()))
      return false;
    await this.#parts.store.remove(ids);
    await this.#reload();
    return true;
  }

  /** Forgets a tap the server refused, after the person has read why. */
  async dismiss(id: string): Promise<void> {
    const one = this.#snapshot.queued.find(({ event }) => event.id === id);
    if (!one?.refusedWhy) return;
    await this.#parts.store.remove([id]);
    await this.#reload();
  }

  /** Sends what may be sent now; `evenHeld` when the page goes to the background. */
  flush(evenHeld = false): Promise<void> {
    const exclusively = this.#parts.exclusively ?? ((work) => work());
    this.#running ??= exclusively(() => this.#sendAll(evenHeld)).finally(() => {
      this.#running = null;
    });
    return this.#running;
  }

  /** The network is back or the page in front again: no need to sit the pause out. */
  wake(): Promise<void> {
    this.#waitMs = FIRST_WAIT_MS;
    return this.flush();
  }

  async #sendAll(evenHeld: boolean): Promise<void> {
    for (;;) {
      await this.#reload();
      const batch = this.#nextBatch(evenHeld);
      if (batch.length === 0) return this.#scheduleHeld();
      if (!(await this.#sendBatch(batch))) return;
    }
  }

  async #sendBatch(batch: QueuedEvent[]): Promise<boolean> {
    const events = batch.map(({ event }) => event);
    try {
      const run = await this.#parts.send(batch[0]!.runId, events);
      this.#waitMs = FIRST_WAIT_MS;
      const now = batch.map(({ runId, event }) => ({ runId, event }));
      this.#set({ waiting: false, taken: [...this.#snapshot.taken, ...now].slice(-400) });
      this.#parts.onRun(run);
      await this.#parts.store.remove(events.map(({ id }) => id));
      return true;
    } catch (error) {
      const why = refusalOf(error);
      if (why === null) {
        this.#backOff();
        return false;
      }
      // One bad tap must not hold back the good ones it was sent with: the rest go alone.
      if (batch.length > 1) {
        for (const one of batch) if (!(await this.#sendBatch([one]))) return false;
        return true;
      }
      await this.#parts.store.refuse(events[0]!.id, why);
      return true;
    }
  }

  /** The next taps in order that belong to one run and are not held. */
  #nextBatch(evenHeld: boolean): QueuedEvent[] {
    const now = this.#parts.nowMs();
    const batch: QueuedEvent[] = [];
    for (const one of this.#snapshot.queued) {
      if (one.refusedWhy !== null) continue;
      if (!evenHeld && one.holdUntilMs > now) break;
      if (batch.length === MOST_A_CALL || (batch[0] && batch[0].runId !== one.runId)) break;
      batch.push(one);
    }
    return batch;
  }

  #backOff(): void {
    this.#set({ waiting: true });
    // Spread out, so that phones back from one dead spot do not all call at once.
    this.#schedule(this.#waitMs * (0.75 + Math.random() / 2));
    this.#waitMs = Math.min(LONGEST_WAIT_MS, this.#waitMs * 2);
  }

  #scheduleHeld(): void {
    const held = this.#snapshot.queued.find(({ refusedWhy }) => refusedWhy === null);
    if (held) this.#schedule(Math.max(0, held.holdUntilMs - this.#parts.nowMs()));
  }

  #schedule(inMs: number): void {
    if (this.#stopped) return;
    if (this.#timer) clearTimeout(this.#timer);
    this.#timer = setTimeout(() => void this.flush(), inMs);
  }

  async #reload(): Promise<void> {
    const all = await this.#parts.store.list();
    this.#set({ queued: all.filter(({ ownerKey }) => ownerKey === this.#parts.ownerKey) });
  }

  #set(change: Partial<QueueSnapshot>): void {
    this.#snapshot = { ...this.#snapshot, ...change };
    for (const listener of this.#listeners) listener();
  }
}
