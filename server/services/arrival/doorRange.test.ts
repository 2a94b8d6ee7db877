import { describe, expect, it } from 'vitest';
import { doorRange } from './doorRange.ts';

const stop = {
  stopId: 'v1',
  arriveEarlySeconds: 28_440,
  arriveLateSeconds: 28_740,
  waitSeconds: 0,
  startSeconds: 28_560,
};
const promised = (startSeconds: number) => ({
  visits: [{ id: 'v1', promise: { startSeconds, endSeconds: startSeconds + 7200 } }] as never,
});

describe('doorRange', () => {
  it('is the forecast arrival inside the promise', () => {
    expect(doorRange(promised(27_000), stop)).toEqual({ fromSeconds: 28_440, toSeconds: 28_740 });
  });

  it('begins no earlier than the promise, however early the van is', () => {
    const early = { ...stop, waitSeconds: 2040, startSeconds: 30_600 };
    expect(doorRange(promised(30_600), early)).toEqual({ fromSeconds: 30_600, toSeconds: 30_600 });
  });

  it('keeps the late end when only the early one lies before the promise', () => {
    expect(doorRange(promised(28_500), stop)).toEqual({ fromSeconds: 28_500, toSeconds: 28_740 });
  });

  it('waits for an hour from which work may start, without a promise', () => {
    const waiting = { ...stop, waitSeconds: 240, startSeconds: 28_800 };
    expect(doorRange({ visits: [] }, waiting)).toEqual({
      fromSeconds: 28_800,
      toSeconds: 28_800,
    });
  });
});
