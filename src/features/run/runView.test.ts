import { describe, expect, it } from 'vitest';
import type { RunEvent } from '#shared/api/runs.ts';
import type { Tap } from '#src/offline/EventQueue.ts';
import { dayStartMs, exampleRun, ids } from './exampleRun.ts';
import { atHousehold, householdWords } from './householdWords.ts';
import { mayFinish, nextAction } from './nextAction.ts';
import { runChange } from './runChange.ts';
import { runView } from './runView.ts';
import { stopStanding } from './stopStanding.ts';

const at = (hours: number, minutes: number) => dayStartMs + (hours * 60 + minutes) * 60_000;

/** Presses what the button offers, minute after minute, and gives the words pressed. */
function press(times: number, from = at(9, 40)) {
  const run = exampleRun();
  const events: RunEvent[] = [];
  const words: string[] = [];
  for (let turn = 0; turn < times; turn += 1) {
    const stop = runView(run, events, from + turn * 60_000)?.current;
    const action = stop && nextAction(stop);
    if (!action) break;
    words.push(action.words);
    for (const tap of action.taps) events.push(event(tap, events.length, from + turn * 60_000));
  }
  return { run, events, words };
}

function event(tap: Tap, seq: number, ms: number): RunEvent {
  return {
    ...tap,
    id: `01890000-0000-7000-9000-${String(seq).padStart(12, '0')}`,
    v: 1,
    deviceId: '11111111-1111-4111-8111-111111111111',
    deviceSeq: seq,
    deviceAt: new Date(ms).toISOString(),
    offsetMs: 0,
    runVersion: 1,
  } as RunEvent;
}

describe('the run as the phone shows it', () => {
  it('names the next stop and forecasts the rest', () => {
    const view = runView(exampleRun(), [], at(9, 40))!;
    expect(view.current?.title).toBe("Clover at the Adeyemis'");
    // 9:40 and 11 minutes' drive.
    expect(view.current?.times.arriveSeconds).toBe((9 * 60 + 51) * 60);
    expect(view.later.map(({ title }) => title)).toEqual([
      'Water at Quay Yard',
      "Rook and Wren at the Castellans'",
    ]);
    expect(stopStanding(view.current!)).toEqual({ words: 'promise safe', tone: 'ok' });
  });

  it('leads through a whole run with one button', () => {
    const { words, run, events } = press(30);
    expect(words).toEqual([
      'Start driving · text the Adeyemis',
      'Arrived',
      'Clover on the table',
      'Section done',
      'Section done',
      'Clover is done',
      'Done here',
      'Start driving',
      'Arrived',
      'Filled and emptied · done here',
      'Start driving',
      'Arrived',
      'Rook on the table',
      'Section done',
      'Rook is done',
      'Wren on the table',
      'Wren is done',
      'Done here',
    ]);
    const view = runView(run, events, at(12, 0))!;
    expect(view.current).toBeNull();
    expect(view.stops.map(({ state }) => state)).toEqual(['done', 'done', 'done']);
  });

  it('lets a stop be finished early once there, and only then', () => {
    const allowed = [0, 1, 2, 3, 6].map((presses) => {
      const { run, events } = press(presses);
      return mayFinish(runView(run, events, at(10, 0))!.current!);
    });
    // Before driving, driving, arrived, on the table, all pets done (the big button says so then).
    expect(allowed).toEqual([false, false, true, true, false]);
  });

  it('re-forecasts later stops from what happened', () => {
    const { run, events } = press(3);
    const early = runView(run, events, at(10, 0))!;
    const late = runView(run, events, at(12, 30))!;
    const terriers = (view: typeof early) => view.later.at(-1)!;
    expect(stopStanding(terriers(early))).toEqual({ words: 'promise safe', tone: 'ok' });
    expect(stopStanding(terriers(late))).toEqual({
      words: expect.stringMatching(/^about \d+ (min|h \d+) late$/),
      tone: 'bad',
    });
  });

  it('counts an event once that both the queue and the server know', () => {
    const { run, events } = press(2);
    expect(runView(run, [...events, ...events], at(10, 0))).toEqual(
      runView(run, events, at(10, 0)),
    );
  });

  it('is nothing before the run is sent', () => {
    expect(runView(exampleRun({ problem: null, plan: null }), [], at(9, 0))).toBeNull();
  });
});

describe('runChange', () => {
  it('says what the desk changed', () => {
    const seen = exampleRun();
    expect(runChange(seen, exampleRun())).toBeNull();
    const stops = seen.plan!.runs[0]!.stops;
    const plan = (changed: typeof stops) => ({
      version: 2,
      plan: { runs: [{ vanId: ids.van, stops: changed }], notPlaced: [] },
    });
    expect(runChange(seen, exampleRun(plan(stops.slice(0, 2))))).toBe(
      'no longer yours: Rook & Wren',
    );
    expect(runChange(seen, exampleRun(plan(stops.toReversed())))).toBe('the order changed');
    expect(runChange(seen, exampleRun({ version: 2 }))).toBe('same stops, other times');
  });
});

describe('household words', () => {
  it('speaks of a surname as a family and leaves phrases alone', () => {
    expect(householdWords('Adeyemi')).toBe('the Adeyemis');
    expect(householdWords('The Adeyemis')).toBe('the Adeyemis');
    expect(householdWords('Jones')).toBe('the Joneses');
    expect(householdWords('Ann & Bo')).toBe('Ann & Bo');
    expect(atHousehold('Adeyemi')).toBe("the Adeyemis'");
    expect(atHousehold('Ann & Bo')).toBe("Ann & Bo's");
  });
});
