import { app, useApp } from '../support/useApp.ts';
import { afterEach, describe, expect, it } from 'vitest';
import { addRunFix, getRun, listRuns } from '#shared/api/runs.ts';
import { getVisit } from '#shared/api/visits.ts';
import { clock } from '#server/clock.ts';
import { inBusiness } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { RunEvent } from '#server/models/RunEvent.ts';
import { RunFix } from '#server/models/RunFix.ts';
import { instantAt } from '../support/setClock.ts';
import { phoneOf, workDay } from '../support/workDay.ts';

useApp({ carriers: true });
afterEach(() => {
  clock.offsetMs = 0;
});

type Work = Awaited<ReturnType<typeof workDay>>;

const storedEvents = ({ businessId, runId }: Work) =>
  inBusiness(businessId, () => RunEvent.findAll({ where: { runId }, order: ['deviceSeq'] }));

const statusOf = async ({ client, stopOf }: Work, petName: string) =>
  (await client.must(getVisit, { params: { visitId: stopOf(petName) } })).status;

describe('who may work a run', () => {
  it('shows a groomer the own runs only; others are refused, all is open to the desk', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }]);
    const { runId, date, groomers, read } = work;
    const plover = (await read()).runs.find((run) => run.vanName === 'Plover')!.runId;
    const mika = await work.member(['groomer'], groomers[0]!.id);
    const ines = await work.member(['groomer'], groomers[1]!.id);
    const nobody = await work.member(['groomer'], null);
    const desk = await work.member(['dispatcher']);
    const namesOf = async (as: typeof mika) =>
      (await as.must(listRuns)).runs.map((run) => [run.vanName, run.mine]);
    expect(await namesOf(mika)).toEqual([['Otter', true]]);
    expect(await namesOf(ines)).toEqual([['Plover', true]]);
    expect(await namesOf(nobody)).toEqual([]);
    expect(await namesOf(desk)).toEqual([
      ['Otter', false],
      ['Plover', false],
    ]);
    expect((await mika.must(listRuns)).date).toBe(date);
    const params = { runId };
    const tap = () => [work.phone('arrived', work.stopOf('Rook'), '9:00')];
    const fix = { lat: 41, lon: -36, at: instantAt(date, '6:00').toISOString(), accuracyMetres: 9 };
    for (const [as, status] of [
      [ines, 403],
      [nobody, 403],
      [mika, 200],
      [desk, 200],
    ] as const) {
      expect((await as.call(getRun, { params })).status).toBe(status);
      expect((await as.call(addRunFix, { params, body: fix })).status).toBe(status);
      expect((await work.post(tap(), as)).status).toBe(status);
    }
    expect((await mika.call(getRun, { params: { runId: plover } })).status).toBe(403);
    // Two taps were taken, those of Mika and the desk.
    expect(await storedEvents(work)).toHaveLength(2);
  });

  it('holds the sent version whole: its problem names one van and no other household', async () => {
    const { client, runId, stopOf } = await workDay(app, [
      { petName: 'Rook' },
      { petName: 'Wren' },
    ]);
    const run = await client.must(getRun, { params: { runId } });
    expect(run).toMatchObject({ version: 1, vanName: 'Otter', groomerName: 'Mika', events: [] });
    expect(run.problem!.vans.map((van) => van.vanName)).toEqual(['Otter']);
    expect(run.plan!.runs[0]!.stops.map((stop) => stop.id)).toEqual([
      stopOf('Rook'),
      stopOf('Wren'),
    ]);
    expect(run.visits.map((visit) => visit.contactName).sort()).toEqual([
      'Keeper of Rook',
      'Keeper of Wren',
    ]);
  });
});

describe('taps count exactly once', () => {
  it('sent twice, in one batch twice, and concurrently', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }]);
    const { phone, post, stopOf } = work;
    await work.at('8:30');
    const taps = [
      phone('startDriving', stopOf('Rook'), '8:10'),
      phone('arrived', stopOf('Rook'), '8:20'),
      phone('stopDone', stopOf('Rook'), '8:30', { note: 'calm' }),
    ];
    const answers = await Promise.all([post(taps), post(taps), post([...taps, ...taps])]);
    expect(answers.map((answer) => answer.status)).toEqual([200, 200, 200]);
    for (const answer of answers)
      expect(answer.body.events.map((event) => event.id)).toEqual(taps.map((tap) => tap.id));
    expect((await storedEvents(work)).map((row) => row.id)).toEqual(taps.map((tap) => tap.id));
    expect(await statusOf(work, 'Rook')).toBe('done');
    expect((await post(taps)).status).toBe(200);
    expect(await storedEvents(work)).toHaveLength(3);
  });

  it('in two batches that cross on the road: the order of the phone counts', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }, { petName: 'Wren' }]);
    const { phone, post, stopOf } = work;
    await work.at('10:00');
    const first = [
      phone('startDriving', stopOf('Rook'), '8:10'),
      phone('arrived', stopOf('Rook'), '8:20'),
    ];
    const second = [
      phone('stopDone', stopOf('Rook'), '9:30', { note: '' }),
      phone('startDriving', stopOf('Wren'), '9:35'),
    ];
    await post(second);
    expect(await statusOf(work, 'Rook')).toBe('done');
    const late = await post(first);
    expect(late.body.events.map((event) => event.id)).toEqual(
      [...first, ...second].map((tap) => tap.id),
    );
    const facts = (await work.read()).problem.facts;
    expect(
      facts.map(({ stopId, arrivedSeconds, leftSeconds }) => [stopId, arrivedSeconds, leftSeconds]),
    ).toEqual([
      [stopOf('Rook'), 8 * 3600 + 1200, 9 * 3600 + 1800],
      [stopOf('Wren'), null, null],
    ]);
  });

  it('from two phones at once, neither batch is lost', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }, { petName: 'Wren' }]);
    const { stopOf, post, date } = work;
    await work.at('10:00');
    const other = phoneOf(date);
    const answers = await Promise.all([
      post([work.phone('arrived', stopOf('Rook'), '8:20')]),
      post([other('stopDone', stopOf('Rook'), '9:20', { note: 'from the desk' })]),
      post([other('cannotDo', stopOf('Wren'), '9:25', { reason: 'noAnswer', note: '' })]),
    ]);
    expect(answers.map((answer) => answer.status)).toEqual([200, 200, 200]);
    expect(await storedEvents(work)).toHaveLength(3);
    expect([await statusOf(work, 'Rook'), await statusOf(work, 'Wren')]).toEqual([
      'done',
      'failed',
    ]);
  });

  it('the same tap id in another business is that business’s own', async () => {
    const one = await workDay(app, [{ petName: 'Rook' }]);
    const two = await workDay(app, [{ petName: 'Rook' }]);
    const tap = one.phone('arrived', one.stopOf('Rook'), '6:00');
    expect((await one.post([tap])).status).toBe(200);
    expect((await two.post([{ ...tap, stopId: two.stopOf('Rook') }])).status).toBe(200);
    expect([await storedEvents(one), await storedEvents(two)].map((rows) => rows.length)).toEqual([
      1, 1,
    ]);
  });
});

describe('what a tap may say', () => {
  it('names an unknown stop and saves nothing of the batch', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }]);
    const taps = [
      work.phone('arrived', work.stopOf('Rook'), '6:00'),
      work.phone('arrived', newId(), '6:00'),
    ];
    const answer = await work.post(taps);
    expect(answer.status).toBe(400);
    expect(answer.error.fields).toEqual({ 'events.1.stopId': 'must be a stop of this run' });
    expect(await storedEvents(work)).toEqual([]);
  });

  it('takes a phone whose clock is wrong by hours or decades at its corrected time', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }]);
    await work.at('9:00');
    const stopId = work.stopOf('Rook');
    const decades = instantAt(work.date, '8:10').getTime() - Date.UTC(1980, 0, 6);
    for (const [kind, wall, offsetMs] of [
      ['startDriving', '8:10', decades],
      ['arrived', '8:20', -3 * 3_600_000],
      ['stopDone', '8:55', 0],
    ] as const) {
      const answer = await work.post([work.phone(kind, stopId, wall, { note: '' }, offsetMs)]);
      expect(answer.status, `${answer.text}`).toBe(200);
      expect(answer.body.events.at(-1)).toMatchObject({ kind, offsetMs });
    }
    expect((await work.read()).problem.facts[0]).toMatchObject({
      drivingSinceSeconds: 8 * 3600 + 600,
      arrivedSeconds: 8 * 3600 + 1200,
      leftSeconds: 8 * 3600 + 3300,
    });
  });

  it('refuses numbers no phone makes, by name, and never breaks on them', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }]);
    const tap = work.phone('arrived', work.stopOf('Rook'), '6:00');
    for (const wrong of [
      { deviceSeq: 2 ** 40 },
      { deviceSeq: -1 },
      { offsetMs: 9e15 },
      { runVersion: 2 ** 33 },
      { deviceAt: '0000-01-01T00:00:00Z' },
      { deviceAt: 'yesterday' },
      { v: 2 },
      { kind: 'danced' },
      { kind: 'cannotDo', reason: 'bored' },
    ]) {
      const answer = await work.post([{ ...tap, id: newId(), ...wrong }]);
      expect(answer.status, `${JSON.stringify(wrong)}`).toBe(400);
      expect(Object.keys(answer.error.fields!)).toEqual([`events.0.${Object.keys(wrong).at(-1)}`]);
    }
    expect((await work.post([])).status).toBe(400);
    const many = Array.from({ length: 201 }, () => ({ ...tap, id: newId() }));
    expect((await work.post(many)).status).toBe(400);
    expect(await storedEvents(work)).toEqual([]);
    const most = Array.from({ length: 200 }, (_one, deviceSeq) => ({
      ...tap,
      id: newId(),
      deviceSeq,
    }));
    expect((await work.post(most)).status).toBe(200);
    expect(await storedEvents(work)).toHaveLength(200);
  });
});

describe('addRunFix', () => {
  it('keeps the latest twenty, and counts a time ahead of ours as now', async () => {
    const { client, runId, date, businessId } = await workDay(app, [{ petName: 'Rook' }]);
    const now = instantAt(date, '6:00').getTime();
    const post = (at: number, lat = 41) =>
      client.must(addRunFix, {
        params: { runId },
        body: { lat, lon: -36, at: new Date(at).toISOString(), accuracyMetres: 12 },
      });
    for (let minute = 25; minute > 0; minute -= 1) await post(now - minute * 60_000, minute);
    await post(now + 3 * 3_600_000, 60);
    const fixes = await inBusiness(businessId, () =>
      RunFix.findAll({ where: { runId }, order: [['at', 'DESC']] }),
    );
    expect(fixes.map((fix) => fix.lat)).toEqual([
      60,
      ...Array.from({ length: 19 }, (_, i) => i + 1),
    ]);
    expect(fixes[0]!.at.getTime()).toBeLessThan(now + 60_000);
  });
});
