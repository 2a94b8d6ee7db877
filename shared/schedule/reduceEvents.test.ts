import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { orderEvents } from './orderEvents.ts';
import { reduceEvents, type TapEvent } from './reduceEvents.ts';

const day = { vanId: 'van', dayStartUtc: '2026-04-14T00:00:00.000Z' };
const midnight = Date.parse(day.dayStartUtc);

let seq = 0;
type Tap = TapEvent extends infer E
  ? E extends TapEvent
    ? Omit<E, 'id' | 'deviceId' | 'deviceSeq' | 'deviceAt' | 'offsetMs'>
    : never
  : never;

/** A tap at `minutes` past midnight on one phone whose clock is right. */
function tap(minutes: number, what: Tap, over: Partial<TapEvent> = {}): TapEvent {
  seq += 1;
  return {
    id: `e${String(seq).padStart(5, '0')}`,
    deviceId: 'phone',
    deviceSeq: seq,
    deviceAt: new Date(midnight + minutes * 60_000).toISOString(),
    offsetMs: 0,
    ...what,
    ...over,
  } as TapEvent;
}

describe('orderEvents', () => {
  it('corrects clocks, keeps a device in its own order and counts an id once', () => {
    const a = tap(600, { kind: 'startDriving', stopId: 'a' });
    // The clock was set back half an hour between the two taps.
    const b = tap(580, { kind: 'arrived', stopId: 'a' });
    // Another phone, ten minutes slow, tapped at 10:05 in truth.
    const c = tap(
      595,
      { kind: 'arrived', stopId: 'b' },
      { deviceId: 'other', offsetMs: 10 * 60_000 },
    );
    const ordered = orderEvents([c, b, a, b]);
    expect(ordered.map(({ event, atMs }) => [event.id, (atMs - midnight) / 60_000])).toEqual([
      [a.id, 600],
      [b.id, 600],
      [c.id, 605],
    ]);
  });

  it('names a bad time', () => {
    const bad = tap(0, { kind: 'arrived', stopId: 'a' }, { deviceAt: 'noon' });
    expect(() => orderEvents([bad])).toThrow(/deviceAt: 'noon'/);
  });
});

describe('reduceEvents', () => {
  it('needs three taps a stop', () => {
    const { facts, stops, currentStopId } = reduceEvents(
      [
        tap(580, { kind: 'startDriving', stopId: 'clover' }),
        tap(591, { kind: 'arrived', stopId: 'clover' }),
        tap(640, { kind: 'stopDone', stopId: 'clover', note: 'mats behind the ears' }),
      ],
      day,
    );
    expect(facts).toEqual([
      {
        stopId: 'clover',
        vanId: 'van',
        drivingSinceSeconds: 580 * 60,
        arrivedSeconds: 591 * 60,
        workingSinceSeconds: null,
        leftSeconds: 640 * 60,
        failedReason: null,
      },
    ]);
    expect(stops.get('clover')).toMatchObject({
      state: 'done',
      note: 'mats behind the ears',
      implied: [],
    });
    expect(currentStopId).toBeNull();
  });

  it('keeps a stopwatch per pet and step', () => {
    const { stops, currentStopId } = reduceEvents(
      [
        tap(600, { kind: 'arrived', stopId: 's' }),
        tap(606, { kind: 'petOnTable', stopId: 's', petId: 'rook' }),
        tap(613, { kind: 'stepDone', stopId: 's', petId: 'rook', stepKey: 'nails' }),
        tap(643, { kind: 'stepDone', stopId: 's', petId: 'rook', stepKey: 'bath' }),
        tap(644, { kind: 'stepDone', stopId: 's', petId: 'rook', stepKey: 'bath' }),
        tap(650, { kind: 'petDone', stopId: 's', petId: 'rook' }),
        tap(652, { kind: 'petOnTable', stopId: 's', petId: 'wren' }),
      ],
      day,
    );
    expect(currentStopId).toBe('s');
    expect(stops.get('s')?.state).toBe('working');
    expect(stops.get('s')?.pets).toEqual([
      {
        petId: 'rook',
        startedSeconds: 606 * 60,
        startImplied: false,
        doneSeconds: 650 * 60,
        doneImplied: false,
        steps: [
          { stepKey: 'nails', endSeconds: 613 * 60, tookSeconds: 7 * 60 },
          { stepKey: 'bath', endSeconds: 643 * 60, tookSeconds: 30 * 60 },
        ],
      },
      expect.objectContaining({ petId: 'wren', startedSeconds: 652 * 60, doneSeconds: null }),
    ]);
  });

  it('fills a forgotten done from the next drive, a forgotten arrival from the table', () => {
    const { stops, currentStopId } = reduceEvents(
      [
        tap(600, { kind: 'petOnTable', stopId: 'a', petId: 'p' }),
        tap(660, { kind: 'startDriving', stopId: 'b' }),
      ],
      day,
    );
    expect(stops.get('a')).toMatchObject({
      state: 'done',
      implied: ['arrived', 'left'],
      fact: { arrivedSeconds: 600 * 60, leftSeconds: 660 * 60 },
      pets: [{ doneSeconds: 660 * 60, doneImplied: true }],
    });
    expect(currentStopId).toBe('b');
  });

  it('calls a drive off when another begins', () => {
    const { facts, currentStopId } = reduceEvents(
      [
        tap(600, { kind: 'startDriving', stopId: 'a' }),
        tap(603, { kind: 'startDriving', stopId: 'b' }),
      ],
      day,
    );
    expect(facts.map(({ stopId }) => stopId)).toEqual(['b']);
    expect(currentStopId).toBe('b');
  });

  it('takes a given-up stop up again, but never undoes work', () => {
    const taps = [
      tap(600, { kind: 'arrived', stopId: 'a' }),
      tap(610, { kind: 'cannotDo', stopId: 'a', reason: 'noAnswer', note: 'rang twice' }),
    ];
    expect(reduceEvents(taps, day).stops.get('a')).toMatchObject({
      state: 'failed',
      note: 'rang twice',
      fact: { failedReason: 'noAnswer', leftSeconds: 610 * 60 },
    });
    taps.push(tap(612, { kind: 'petOnTable', stopId: 'a', petId: 'p' }));
    taps.push(tap(660, { kind: 'stopDone', stopId: 'a', note: '' }));
    taps.push(tap(661, { kind: 'cannotDo', stopId: 'a', reason: 'refused', note: '' }));
    expect(reduceEvents(taps, day).stops.get('a')).toMatchObject({
      state: 'done',
      fact: { arrivedSeconds: 600 * 60, failedReason: null, leftSeconds: 660 * 60 },
    });
  });

  it('lets a later stop be given up without leaving the present one', () => {
    const { currentStopId, stops } = reduceEvents(
      [
        tap(600, { kind: 'petOnTable', stopId: 'a', petId: 'p' }),
        tap(610, { kind: 'cannotDo', stopId: 'c', reason: 'refused', note: '' }),
      ],
      day,
    );
    expect(currentStopId).toBe('a');
    expect(stops.get('c')?.state).toBe('failed');
  });

  it('gives the same answer for any arrival order and any repeats', () => {
    fc.assert(
      fc.property(
        anyTaps.chain((events) =>
          fc.tuple(
            fc.constant(events),
            fc.shuffledSubarray(events, { minLength: events.length, maxLength: events.length }),
            fc.subarray(events),
          ),
        ),
        ([events, shuffled, repeats]) => {
          const once = reduceEvents(events, day);
          expect(reduceEvents([...shuffled, ...repeats], day)).toEqual(once);
          expect(reduceEvents([...repeats, ...shuffled], day)).toEqual(once);
        },
      ),
      { numRuns: 400, seed: 20260414 },
    );
  });

  it('keeps facts in order of time and at most one stop open', () => {
    fc.assert(
      fc.property(anyTaps, (events) => {
        const { stops, currentStopId } = reduceEvents(events, day);
        for (const { fact, state, stopId, pets } of stops.values()) {
          const times = [
            fact.drivingSinceSeconds,
            fact.arrivedSeconds,
            fact.workingSinceSeconds,
            fact.leftSeconds,
          ].filter((time) => time !== null);
          expect(times).toEqual([...times].sort((a, b) => a - b));
          if (['driving', 'arrived', 'working'].includes(state)) expect(stopId).toBe(currentStopId);
          for (const pet of pets)
            for (const step of pet.steps) expect(step.tookSeconds).toBeGreaterThanOrEqual(0);
        }
      }),
      { numRuns: 400, seed: 14042026 },
    );
  });
});

/** Taps of two phones, clocks jumping, kinds in any order. */
const anyTaps: fc.Arbitrary<TapEvent[]> = fc
  .uniqueArray(
    fc.record({
      id: fc.integer({ min: 0, max: 9999 }),
      device: fc.constantFrom('a', 'b'),
      deviceSeq: fc.integer({ min: 0, max: 40 }),
      minutes: fc.integer({ min: 500, max: 700 }),
      offsetMs: fc.integer({ min: -600_000, max: 600_000 }),
      stopId: fc.constantFrom('s1', 's2', 's3'),
      petId: fc.constantFrom('p1', 'p2'),
      stepKey: fc.constantFrom('bath', 'dry', 'clip'),
      kind: fc.constantFrom(
        'startDriving',
        'arrived',
        'petOnTable',
        'stepDone',
        'petDone',
        'stopDone',
        'cannotDo',
      ),
    }),
    { selector: (raw) => raw.id, maxLength: 25 },
  )
  .map((raws) =>
    raws.map(
      (raw) =>
        ({
          ...raw,
          id: String(raw.id),
          deviceId: raw.device,
          deviceAt: new Date(midnight + raw.minutes * 60_000).toISOString(),
          note: '',
          reason: 'heat',
        }) as unknown as TapEvent,
    ),
  );
