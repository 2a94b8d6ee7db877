import { app, useApp } from '../support/useApp.ts';
import { afterEach, describe, expect, it } from 'vitest';
import { moveVisit } from '#shared/api/days.ts';
import { updateHousehold } from '#shared/api/households.ts';
import { getRun } from '#shared/api/runs.ts';
import { cancelVisit, getVisit } from '#shared/api/visits.ts';
import { clock } from '#server/clock.ts';
import { inBusiness } from '#server/db/database.ts';
import { ArrivalLink } from '#server/models/ArrivalLink.ts';
import { versionsOf } from '../support/boardDay.ts';
import { workDay } from '../support/workDay.ts';

useApp({ carriers: true });
afterEach(() => {
  clock.offsetMs = 0;
});

describe('start driving', () => {
  it('queues one text with a link, due now and stale once the van should be there', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }]);
    const { client, household } = { client: work.client, ...work.visits.Rook! };
    const now = await work.at('8:10');
    await work.post([work.phone('startDriving', work.stopOf('Rook'), '8:10')]);
    const [text, ...more] = await work.texts();
    expect(more).toEqual([]);
    expect(text).toMatchObject({
      kind: 'onTheWay',
      status: 'waiting',
      reason: null,
      recipient: '+447700900123',
      householdId: household.id,
      visitId: work.stopOf('Rook'),
    });
    expect(text!.dueAt.getTime() - now.getTime()).toBeLessThan(60_000);
    expect(text!.staleAfter.getTime()).toBeGreaterThan(now.getTime());
    expect(text!.staleAfter.getTime()).toBeLessThan(now.getTime() + 3_600_000);
    expect(text!.body).toMatch(
      /^Saltmarsh \d+: Mika is on the way for Rook\. Please open the door 8:\d\d-8:\d\d\. Live: http:\/\/127\.0\.0\.1:\d+\/a\/[\w-]{22}$/,
    );
    // Of the link only a hash is stored.
    const token = text!.body.split('/a/')[1]!;
    const links = await inBusiness(work.businessId, () => ArrivalLink.findAll());
    expect(links).toHaveLength(1);
    expect(JSON.stringify(links)).not.toContain(token);
    expect((await client.must(getVisit, { params: { visitId: work.stopOf('Rook') } })).status).toBe(
      'booked',
    );
  });

  it('says it once, however often the tap or a second one comes', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }]);
    await work.at('8:10');
    const tap = work.phone('startDriving', work.stopOf('Rook'), '8:10');
    await Promise.all([work.post([tap]), work.post([tap]), work.post([tap, tap])]);
    await work.post([work.phone('startDriving', work.stopOf('Rook'), '8:11')]);
    expect(await work.texts()).toHaveLength(1);
    expect(await inBusiness(work.businessId, () => ArrivalLink.count())).toBe(1);
  });

  it('is silent without consent or phone, and says why; consent given later does not reach back', async () => {
    const work = await workDay(app, [
      { petName: 'Rook', textsConsent: false },
      { petName: 'Wren', phone: null },
    ]);
    await work.at('8:10');
    await work.post([work.phone('startDriving', work.stopOf('Rook'), '8:10')]);
    await work.at('9:40');
    await work.post([work.phone('startDriving', work.stopOf('Wren'), '9:40')]);
    expect((await work.texts()).map((text) => [text.status, text.reason])).toEqual([
      ['notSent', 'No consent to texts: call instead.'],
      ['notSent', 'No phone number: call or write instead.'],
    ]);
    await work.client.must(updateHousehold, {
      params: { householdId: work.visits.Rook!.household.id },
      body: { textsConsent: true },
    });
    expect((await work.texts()).map((text) => text.status)).toEqual(['notSent', 'notSent']);
  });

  it('is not told when the same batch already says arrived', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }]);
    await work.at('8:40');
    await work.post([
      work.phone('startDriving', work.stopOf('Rook'), '8:10'),
      work.phone('arrived', work.stopOf('Rook'), '8:25'),
    ]);
    expect(await work.texts()).toEqual([]);
  });

  it('is taken back unsent when the arrival comes before it could go', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }]);
    await work.at('8:10');
    await work.post([work.phone('startDriving', work.stopOf('Rook'), '8:10')]);
    await work.at('8:20');
    await work.post([work.phone('arrived', work.stopOf('Rook'), '8:20')]);
    expect((await work.texts()).map((text) => [text.status, text.reason])).toEqual([
      ['stale', 'The van had arrived before the text could go.'],
    ]);
  });

  it('to a refill or a meal tells nobody', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }]);
    const answer = await work.post([work.phone('startDriving', `meal:${work.otter}:1`, '8:10')]);
    // This run has no meal: a stop that never was is refused, and nothing is queued.
    expect(answer.status).toBe(400);
    expect(await work.texts()).toEqual([]);
  });
});

describe('what follows from the taps', () => {
  it('moves a visit booked → done, or failed with its reason and open again when taken up', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }, { petName: 'Wren' }]);
    const statusOf = async (petName: string) =>
      (await work.client.must(getVisit, { params: { visitId: work.stopOf(petName) } })).status;
    await work.at('10:00');
    const rook = work.stopOf('Rook');
    await work.post([work.phone('cannotDo', rook, '8:30', { reason: 'noAnswer', note: 'rang' })]);
    expect(await statusOf('Rook')).toBe('failed');
    expect((await work.read()).problem.facts[0]).toMatchObject({ failedReason: 'noAnswer' });
    await work.post([work.phone('arrived', rook, '8:50')]);
    expect(await statusOf('Rook')).toBe('booked');
    await work.post([work.phone('stopDone', rook, '9:50', { note: '' })]);
    expect(await statusOf('Rook')).toBe('done');
    // Done stays done.
    await work.post([work.phone('cannotDo', rook, '9:55', { reason: 'refused', note: '' })]);
    expect(await statusOf('Rook')).toBe('done');
    expect(await statusOf('Wren')).toBe('booked');
  });

  it('a started stop can neither be moved, swapped away nor cancelled', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }, { petName: 'Wren' }]);
    const { client, date, otter, vans, read } = work;
    await work.at('8:10');
    await work.post([work.phone('startDriving', work.stopOf('Rook'), '8:10')]);
    const before = await read();
    const move = (petName: string, vanId: string, index: number) =>
      client.call(moveVisit, {
        params: { date },
        body: {
          move: { kind: 'placeVisit', visitId: work.stopOf(petName), vanId, index },
          runVersions: versionsOf(before),
        },
      });
    const moved = await move('Rook', vans[1]!.id, 0);
    expect(moved.error).toMatchObject({
      code: 'refusedMove',
      message: 'The van is already driving to Rook; it cannot be moved.',
    });
    expect((await move('Wren', otter, 0)).error.message).toContain('already started');
    const cancelled = await client.call(cancelVisit, {
      params: { visitId: work.stopOf('Rook') },
      body: { reason: 'ill' },
    });
    expect(cancelled.error.message).toContain('already set out');
    expect(await read()).toEqual({ ...before, problem: (await read()).problem });
  });

  it('a stop worked out of order is no change to send: the phone knows it', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }, { petName: 'Wren' }]);
    await work.at('8:10');
    await work.post([work.phone('startDriving', work.stopOf('Wren'), '8:10')]);
    const day = await work.read();
    expect(day.plan.runs[0]!.stops.map((stop) => stop.id)).toEqual([
      work.stopOf('Wren'),
      work.stopOf('Rook'),
    ]);
    expect(day.runs[0]!.changedSinceSent).toBe(false);
    expect((await work.send()).runs[0]!.sentVersion).toBe(1);
  });

  it('a phone still on an older version may finish a stop that has left its run', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }, { petName: 'Wren' }]);
    const { client, date, read, runId } = work;
    await client.must(moveVisit, {
      params: { date },
      body: {
        move: { kind: 'unplaceVisit', visitId: work.stopOf('Wren') },
        runVersions: versionsOf(await read()),
      },
    });
    expect((await work.send()).runs[0]!.sentVersion).toBe(2);
    await work.at('8:40');
    const answer = await work.post([
      { ...work.phone('startDriving', work.stopOf('Wren'), '8:10'), runVersion: 1 },
      { ...work.phone('cannotDo', work.stopOf('Wren'), '8:30', { reason: 'gear', note: '' }) },
    ]);
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({ version: 2 });
    expect(answer.body.events.map((event) => event.runVersion)).toEqual([1, 1]);
    expect((await client.must(getRun, { params: { runId } })).visits).toHaveLength(1);
    expect(await work.texts()).toEqual([]);
  });
});
