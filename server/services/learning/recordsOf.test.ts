import { describe, expect, it } from 'vitest';
import { reduceEvents, type TapEvent } from '#shared/schedule/reduceEvents.ts';
import type { Pet } from '#server/models/Pet.ts';
import type { VisitForecast } from '#server/models/Visit.ts';
import { recordsOf } from './recordsOf.ts';

const steps = ['checkIn', 'bath', 'dry', 'scissor', 'wrap'].map((key) => ({
  key,
  family: (
    { checkIn: 'prep', bath: 'wash', dry: 'dry', scissor: 'scissor', wrap: 'wrap' } as const
  )[key]!,
  medianSeconds: 600,
  meanSeconds: 620,
  varianceSeconds2: 20_000,
}));
const plain = (petId: string) => ({
  petId,
  breedId: 'bichon-frise',
  styleId: 'teddy',
  coatStyle: 'curly, teddy',
  meanSeconds: 3100,
  varianceSeconds2: 400_000,
  steps,
});
const forecastFor = (...petIds: string[]) =>
  ({
    steps: [],
    work: { meanSeconds: 3100 * petIds.length, varianceSeconds2: 400_000 * petIds.length },
    setUpSeconds: 360,
    cleanDownSeconds: 360,
    coatStyle: 'curly, teddy',
    learning: {
      fitId: null,
      plain: petIds.map(plain),
      words: [],
      petVisits: 0,
      learnedPermille: 0,
    },
  }) as unknown as VisitForecast;

/** [kind, seconds after 9:00, fields] as one phone's taps on stop v. */
function happened(taps: [TapEvent['kind'], number, object?][]) {
  const events = taps.map(([kind, seconds, fields], index) => ({
    id: `e${index}`,
    deviceId: 'd',
    deviceSeq: index,
    deviceAt: new Date(Date.UTC(2026, 4, 4, 9) + seconds * 1000).toISOString(),
    offsetMs: 0,
    stopId: 'v',
    kind,
    ...fields,
  })) as TapEvent[];
  const run = reduceEvents(events, { vanId: 'otter', dayStartUtc: '2026-05-04T00:00:00.000Z' });
  return run.stops.get('v')!;
}

const learn = (taps: Parameters<typeof happened>[0], ...petIds: string[]) =>
  recordsOf(
    { groomerId: 'mika', date: '2026-05-04' },
    { id: 'v', forecast: forecastFor(...(petIds.length > 0 ? petIds : ['a'])) },
    happened(taps),
    new Map<string, Pet>(),
  );
const a = { petId: 'a' };
const step = (stepKey: string) => ({ petId: 'a', stepKey });
const done = ['stopDone', 5000, { note: '' }] as [TapEvent['kind'], number, object];

describe('recordsOf', () => {
  it('takes the pet’s own stopwatch', () => {
    const [record] = learn([['arrived', 0], ['petOnTable', 400, a], ['petDone', 3900, a], done]);
    expect(record).toMatchObject({
      visitId: 'v',
      petId: 'a',
      groomerId: 'mika',
      actualSeconds: 3500,
      restSeconds: 0,
      day: 2315,
    });
    expect(record!.steps.map(({ actualSeconds }) => actualSeconds)).toEqual(Array(5).fill(null));
  });

  it('three taps give the stay less set-up and clean-down, for one pet only', () => {
    expect(learn([['arrived', 0], done])[0]!.actualSeconds).toBe(5000 - 720);
    expect(learn([['arrived', 0], done], 'a', 'b')).toEqual([]);
    // Arrival was not tapped: nothing is known of the stay.
    expect(learn([done])).toEqual([]);
  });

  it('steps count from the tap before, rests apart', () => {
    const [record] = learn([
      ['arrived', 0],
      ['petOnTable', 100, a],
      ['stepDone', 700, step('checkIn')],
      ['stepDone', 1300, step('bath')],
      ['stepDone', 2000, step('dry')],
      ['stepDone', 2300, step('rest')],
      ['stepDone', 3000, step('scissor')],
      ['stepDone', 3500, step('wrap')],
      ['petDone', 3500, a],
      done,
    ]);
    expect(record!.steps.map(({ actualSeconds }) => actualSeconds)).toEqual([
      600, 600, 700, 700, 500,
    ]);
    expect(record).toMatchObject({ actualSeconds: 3400, restSeconds: 300 });
  });

  it('a forgotten step leaves itself and the next out', () => {
    const [record] = learn([
      ['arrived', 0],
      ['petOnTable', 100, a],
      ['stepDone', 700, step('checkIn')],
      ['stepDone', 2000, step('dry')],
      ['stepDone', 2002, step('scissor')],
      ['stepDone', 3500, step('wrap')],
      ['petDone', 3500, a],
      done,
    ]);
    // Bath was forgotten, so dry holds both; scissor was tapped with dry, so wrap holds both.
    expect(record!.steps.map(({ actualSeconds }) => actualSeconds)).toEqual([
      600,
      null,
      null,
      2,
      null,
    ]);
  });

  it('a stop given up teaches nothing', () => {
    const failed = learn([
      ['arrived', 0],
      ['petOnTable', 100, a],
      ['cannotDo', 900, { reason: 'petUnwell', note: '' }],
    ]);
    expect(failed).toEqual([]);
  });
});
