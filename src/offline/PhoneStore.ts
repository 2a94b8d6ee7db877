import type { RunDetail, RunEvent } from '#shared/api/runs.ts';

/** A tap that the server has not taken yet. */
export interface QueuedEvent {
  event: RunEvent;
  runId: string;
  /** Person and business: somebody else's taps on a shared phone are never sent as mine. */
  ownerKey: string;
  /** Epoch ms by this phone's clock until which it may still be taken back. */
  holdUntilMs: number;
  /** Why the server will never take it, in words; null while it may. */
  refusedWhy: string | null;
}

export interface KeptRun {
  ownerKey: string;
  run: RunDetail;
  keptAtMs: number;
}

/** What the phone keeps through reloads: taps in order, and the runs as last seen. */
export interface PhoneStore {
  /** Numbers and stores a tap in one transaction, so no number is given twice. */
  append(make: (deviceId: string, deviceSeq: number) => QueuedEvent): Promise<QueuedEvent>;
  /** Every queued tap in the order it was made, whoever made it. */
  list(): Promise<QueuedEvent[]>;
  remove(ids: readonly string[]): Promise<void>;
  refuse(id: string, why: string): Promise<void>;
  keepRun(kept: KeptRun): Promise<void>;
  readRun(ownerKey: string, runId: string): Promise<KeptRun | null>;
  /** Runs of other days and, at sign-out, all of an owner's: gate notes do not stay on a phone. */
  forgetRuns(which: (kept: KeptRun) => boolean): Promise<void>;
}
