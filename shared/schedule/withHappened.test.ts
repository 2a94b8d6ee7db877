import { describe, expect, it } from 'vitest';
import { reduceEvents, type TapEvent } from './reduceEvents.ts';
import type { DayProblem, Plan } from './types.ts';
import { withHappened } from './withHappened.ts';

const plan: Plan = {
  runs: [
    {
      vanId: 'otter',
      stops: ['a', 'b', 'c', 'd'].map((id) => ({ kind: 'visit', id, visitId: id }) as const),
    },
    { vanId: 'plover', stops: [{ kind: 'visit', id: 'x', visitId: 'x' }] },
  ],
  notPlaced: [],
};
const other = {
  stopId: 'x',
  vanId: 'plover',
  drivingSinceSeconds: 1,
  arrivedSeconds: null,
  workingSinceSeconds: null,
  leftSeconds: null,
  failedReason: null,
};
const problem = { nowSeconds: null, facts: [other] } as unknown as DayProblem;

const tap = (deviceSeq: number, kind: TapEvent['kind'], stopId: string) =>
  ({
    id: `e${deviceSeq}`,
    deviceId: 'phone',
    deviceSeq,
    deviceAt: new Date(Date.UTC(2026, 3, 14, 9, deviceSeq)).toISOString(),
    offsetMs: 0,
    kind,
    stopId,
    reason: 'noAnswer',
    note: '',
  }) as TapEvent;

describe('withHappened', () => {
  const happened = reduceEvents(
    [
      tap(0, 'startDriving', 'b'),
      tap(5, 'cannotDo', 'd'),
      tap(9, 'arrived', 'b'),
      tap(50, 'stopDone', 'b'),
      tap(55, 'startDriving', 'a'),
      tap(56, 'arrived', 'gone-from-the-plan'),
    ],
    { vanId: 'otter', dayStartUtc: '2026-04-14T00:00:00.000Z' },
  );
  const day = withHappened(problem, plan, 'otter', happened, 36_000);

  it('puts started stops first, as driven, and leaves what was given up from afar in its place', () => {
    expect(day.plan.runs[0]?.stops.map(({ id }) => id)).toEqual(['b', 'a', 'c', 'd']);
    expect(day.plan.runs[1]).toEqual(plan.runs[1]);
  });

  it('sets the clock and only facts the plan knows, keeping other vans’', () => {
    expect(day.problem.nowSeconds).toBe(36_000);
    expect(day.problem.facts.map(({ stopId }) => stopId)).toEqual(['x', 'b', 'd']);
  });
});
