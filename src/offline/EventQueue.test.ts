import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { RunDetail, RunEvent } from '#shared/api/runs.ts';
import { ApiError } from '#src/api/ApiError.ts';
import { EventQueue, type QueueParts } from './EventQueue.ts';
import { memoryStore } from './memoryStore.ts';

const run = { runId: '01890000-0000-7000-8000-000000000001', version: 3 };
const device = '11111111-1111-4111-8111-111111111111';
const arrived = { kind: 'arrived', stopId: 's' } as const;
const offline = () => new ApiError({ code: 'offline', status: 0, message: 'No connection.' });

/** A server that keeps what it takes, as the real one does: known ids have no effect. */
function fakeServer() {
  const taken = new Map<string, RunEvent>();
  const calls: string[][] = [];
  let failures: (Error | 'loseAnswer')[] = [];
  return {
    taken,
    calls,
    fail: (...next: (Error | 'loseAnswer')[]) => (failures = next),
    send: async (_runId: string, events: RunEvent[]): Promise<RunDetail> => {
      calls.push(events.map(({ kind }) => kind));
      const failure = failures.shift();
      if (failure && failure !== 'loseAnswer') throw failure;
      for (const event of events) taken.set(event.id, event);
      if (failure === 'loseAnswer') throw offline();
      return { runId: run.runId } as RunDetail;
    },
  };
}

function makeQueue(server: ReturnType<typeof fakeServer>, over: Partial<QueueParts> = {}) {
  return new EventQueue({
    store: memoryStore(device),
    ownerKey: 'mika',
    send: server.send,
    onRun: () => undefined,
    nowMs: () => Date.now(),
    offsetMs: () => 1500,
    ...over,
  });
}

beforeEach(() => {
  vi.useFakeTimers({ now: new Date('2026-04-14T09:41:00.000Z') });
});
afterEach(() => {
  vi.useRealTimers();
});

describe('EventQueue', () => {
  it('stamps a tap and sends it once its hold is over', async () => {
    const server = fakeServer();
    const queue = makeQueue(server);
    await queue.add(run, [arrived], 4000);
    expect(queue.snapshot().queued).toHaveLength(1);
    await vi.advanceTimersByTimeAsync(3900);
    expect(server.calls).toEqual([]);
    await vi.advanceTimersByTimeAsync(200);
    expect(queue.snapshot().queued).toEqual([]);
    expect([...server.taken.values()]).toEqual([
      {
        ...arrived,
        id: expect.stringMatching(/^[0-9a-f]{8}-[0-9a-f]{4}-7/),
        v: 1,
        deviceId: device,
        deviceSeq: 0,
        deviceAt: '2026-04-14T09:41:00.000Z',
        offsetMs: 1500,
        runVersion: 3,
      },
    ]);
    expect(queue.snapshot().taken).toHaveLength(1);
  });

  it('sends in order after an outage, each tap applied once although an answer was lost', async () => {
    const server = fakeServer();
    const queue = makeQueue(server);
    server.fail(offline(), 'loseAnswer', offline());
    await queue.add(run, [{ kind: 'startDriving', stopId: 's' }]);
    await vi.advanceTimersByTimeAsync(10);
    expect(queue.snapshot().waiting).toBe(true);
    await queue.add(run, [arrived]);
    await queue.add(run, [{ kind: 'stopDone', stopId: 's', note: '' }]);
    await vi.advanceTimersByTimeAsync(60_000);
    expect(queue.snapshot()).toMatchObject({ queued: [], waiting: false });
    expect([...server.taken.values()].map(({ kind, deviceSeq }) => [kind, deviceSeq])).toEqual([
      ['startDriving', 0],
      ['arrived', 1],
      ['stopDone', 2],
    ]);
  });

  it('waits longer after each failure, at most a minute, and at once when woken', async () => {
    const server = fakeServer();
    const queue = makeQueue(server);
    server.fail(...Array.from({ length: 30 }, offline));
    await queue.add(run, [arrived]);
    await vi.advanceTimersByTimeAsync(10 * 60_000);
    expect(server.calls.length).toBeGreaterThan(8);
    expect(server.calls.length).toBeLessThan(22);
    server.fail();
    await queue.wake();
    expect(queue.snapshot().queued).toEqual([]);
  });

  it('takes a held tap back, but not one that is on its way', async () => {
    const server = fakeServer();
    const queue = makeQueue(server);
    const ids = await queue.add(run, [arrived], 4000);
    expect(await queue.undo(ids)).toBe(true);
    await vi.advanceTimersByTimeAsync(10_000);
    expect(server.calls).toEqual([]);
    const sent = await queue.add(run, [arrived], 1000);
    await vi.advanceTimersByTimeAsync(1100);
    expect(await queue.undo(sent)).toBe(false);
  });

  it('puts a refused tap aside with its reason and sends the others', async () => {
    const server = fakeServer();
    const queue = makeQueue(server);
    const refused = new ApiError({ code: 'badInput', status: 400, message: 'stopId is unknown.' });
    server.fail(refused, refused);
    await queue.add(run, [arrived, { kind: 'stopDone', stopId: 's', note: '' }]);
    await vi.advanceTimersByTimeAsync(100);
    expect([...server.taken.values()].map(({ kind }) => kind)).toEqual(['stopDone']);
    const [left] = queue.snapshot().queued;
    expect(left?.refusedWhy).toBe('stopId is unknown.');
    await queue.dismiss(left!.event.id);
    expect(queue.snapshot().queued).toEqual([]);
  });

  it('sends after a reload, but never another person’s taps', async () => {
    const server = fakeServer();
    const store = memoryStore(device);
    server.fail(offline());
    const before = makeQueue(server, { store });
    await before.add(run, [arrived]);
    await vi.advanceTimersByTimeAsync(10);
    before.stop();

    const somebodyElse = makeQueue(server, { store, ownerKey: 'ines' });
    await somebodyElse.start();
    expect(server.taken.size).toBe(0);

    const after = makeQueue(server, { store });
    await after.start();
    expect(server.taken.size).toBe(1);
    expect(await store.list()).toEqual([]);
  });

  it('sends held taps when the page goes to the background', async () => {
    const server = fakeServer();
    const queue = makeQueue(server);
    await queue.add(run, [arrived], 4000);
    await queue.flush(true);
    expect(server.calls).toEqual([['arrived']]);
  });
});
