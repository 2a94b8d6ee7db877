import { app, useApp } from '../support/useApp.ts';
import { describe, expect, it } from 'vitest';
import { day as daySchema, getDay, moveVisit, pinVisit } from '#shared/api/days.ts';
import { removeShift, listShifts } from '#shared/api/groomers.ts';
import { cancelVisit } from '#shared/api/visits.ts';
import { inBusiness } from '#server/db/database.ts';
import { DayChange } from '#server/models/DayChange.ts';
import { Run } from '#server/models/Run.ts';
import { Visit } from '#server/models/Visit.ts';
import type { ApiClient } from '../support/apiClient.ts';
import { boardDay, ordersOf, versionsOf } from '../support/boardDay.ts';

useApp();

/** Visit ids of every run as stored, by van. */
function storedStops(client: ApiClient, date: string): Promise<Record<string, string[]>> {
  return inBusiness(client.session!.business.id, async () =>
    Object.fromEntries(
      (await Run.findAll({ where: { date } })).map((run) => [
        run.vanId,
        run.stops.flatMap((stop) => (stop.kind === 'visit' ? stop.visitId : [])),
      ]),
    ),
  );
}

describe('getDay', () => {
  it('holds problem, draft, cards and runs of a date nobody touched', async () => {
    const { read, visits, otter, date } = await boardDay(app, ['Rook', 'Wren']);
    const day = await read();
    expect(daySchema.parse(day)).toEqual(day);
    expect(ordersOf(day)).toEqual({ Otter: [], Plover: [], notPlaced: ['Rook', 'Wren'] });
    expect(day.runs[0]).toMatchObject({ vanId: otter, version: 1, sentVersion: null });
    expect(day.visits.map((card) => card.id).sort()).toEqual(Object.values(visits).sort());
    expect(day).toMatchObject({ date, undo: null, redo: null, openProposalId: null });
    expect(day.problem).toMatchObject({ nowSeconds: null, facts: [], sent: null });
    expect(day.log.map((line) => line.words)).toEqual(['Wren booked', 'Rook booked']);
  });

  it('answers an empty day for a date without shifts and visits', async () => {
    const { client } = await boardDay(app, []);
    const day = await client.must(getDay, { params: { date: '2031-02-28' } });
    expect(day.runs).toEqual([]);
    expect(day.plan).toEqual({ runs: [], notPlaced: [] });
  });

  it('answers 404 for what is no date, and for dates no calendar of ours holds', async () => {
    const { client } = await boardDay(app, []);
    for (const date of ['2026-02-30', '2026-2-3', 'today', '9999-12-31', '0001-01-01', "1' OR 1"])
      expect((await client.call(getDay, { params: { date } })).status, `${date}`).toBe(404);
  });
});

describe('moveVisit', () => {
  it('places, reorders and changes vans; the rows hold the same order and only touched versions rise', async () => {
    const { client, date, visits, otter, plover, place, read } = await boardDay(app);
    await place('Rook', otter);
    await place('Wren', otter);
    const first = await place('Sorrel', otter, 0);
    expect(ordersOf(first).Otter).toEqual(['Sorrel', 'Rook', 'Wren']);
    expect(first.log[0]).toMatchObject({ words: 'Sorrel to Otter, first', who: 'Odile' });
    expect(versionsOf(first)).toEqual({ [otter]: 4, [plover]: 1 });
    const second = await place('Rook', plover);
    expect(ordersOf(second)).toEqual({
      Otter: ['Sorrel', 'Wren'],
      Plover: ['Rook'],
      notPlaced: [],
    });
    expect(versionsOf(second)).toEqual({ [otter]: 5, [plover]: 2 });
    expect(await storedStops(client, date)).toEqual({
      [otter]: [visits.Sorrel, visits.Wren],
      [plover]: [visits.Rook],
    });
    expect(await read()).toEqual(second);
  });

  it('takes a visit off the vans again, and a move to where it is changes nothing', async () => {
    const { visits, otter, place, move } = await boardDay(app, ['Rook']);
    const placed = await place('Rook', otter);
    const same = await move({ kind: 'placeVisit', visitId: visits.Rook!, vanId: otter, index: 0 });
    expect(same.status).toBe(200);
    expect(same.body.log).toEqual(placed.log);
    expect(versionsOf(same.body)).toEqual(versionsOf(placed));
    const off = await move({ kind: 'unplaceVisit', visitId: visits.Rook! });
    expect(ordersOf(off.body)).toEqual({ Otter: [], Plover: [], notPlaced: ['Rook'] });
    expect(off.body.log[0]!.words).toBe('Rook to not placed');
  });

  it('swaps the visits of two vans', async () => {
    const { otter, plover, place, move } = await boardDay(app);
    await place('Rook', otter);
    await place('Wren', otter);
    await place('Sorrel', plover);
    const swapped = await move({ kind: 'swapRuns', vanId: otter, otherVanId: plover });
    expect(ordersOf(swapped.body)).toEqual({
      Otter: ['Sorrel'],
      Plover: ['Rook', 'Wren'],
      notPlaced: [],
    });
    const self = await move({ kind: 'swapRuns', vanId: otter, otherVanId: otter });
    expect(versionsOf(self.body)).toEqual(versionsOf(swapped.body));
  });

  it('refuses ids the day does not know, and indices that are none, and changes nothing', async () => {
    const { visits, otter, move, read } = await boardDay(app, ['Rook']);
    const before = await read();
    const unknown = '01890000-0000-7000-8000-00000000abcd';
    const visitId = visits.Rook!;
    for (const [wanted, status] of [
      [{ kind: 'placeVisit', visitId: unknown, vanId: otter, index: 0 }, 404],
      [{ kind: 'placeVisit', visitId, vanId: unknown, index: 0 }, 404],
      [{ kind: 'unplaceVisit', visitId: unknown }, 404],
      [{ kind: 'swapRuns', vanId: otter, otherVanId: unknown }, 404],
      [{ kind: 'placeVisit', visitId, vanId: otter, index: -1 }, 400],
      [{ kind: 'placeVisit', visitId, vanId: otter, index: 1.5 }, 400],
      [{ kind: 'placeVisit', visitId, vanId: otter, index: 1e12 }, 400],
      [{ kind: 'replacePlan', plan: { runs: [], notPlaced: [] } }, 400],
    ] as const)
      expect((await move(wanted as never)).status, `${JSON.stringify(wanted)}`).toBe(status);
    expect(await read()).toEqual(before);
  });

  it('answers 409 with the day when a touched run moved on, and replays when another did', async () => {
    const { visits, otter, plover, place, move, read, client, date } = await boardDay(app);
    const seen = versionsOf(await read());
    const now = await place('Rook', otter);
    const late = await move(
      { kind: 'placeVisit', visitId: visits.Wren!, vanId: otter, index: 0 },
      seen,
    );
    expect(late.status).toBe(409);
    expect(late.error.code).toBe('versionMoved');
    expect((late.body as unknown as { day: unknown }).day).toEqual(now);
    expect(await read()).toEqual(now);
    const elsewhere = await move(
      { kind: 'placeVisit', visitId: visits.Wren!, vanId: plover, index: 0 },
      seen,
    );
    expect(ordersOf(elsewhere.body)).toMatchObject({ Otter: ['Rook'], Plover: ['Wren'] });
    // Leaving a run touches it too; without any version named it is as good as old.
    for (const runVersions of [{ ...seen }, {}])
      expect(
        (
          await client.call(moveVisit, {
            params: { date },
            body: { move: { kind: 'unplaceVisit', visitId: visits.Rook! }, runVersions },
          })
        ).status,
      ).toBe(409);
  });
});

describe('two dispatchers at the same moment', () => {
  it('on one van: one is made, the other told; nothing is lost or doubled', async () => {
    const { visits, otter, move, read, client, date } = await boardDay(app, [
      'Rook',
      'Wren',
      'Kit',
    ]);
    const seen = versionsOf(await read());
    const answers = await Promise.all(
      ['Rook', 'Wren', 'Kit'].map((name) =>
        move({ kind: 'placeVisit', visitId: visits[name]!, vanId: otter, index: 0 }, seen),
      ),
    );
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409, 409]);
    const day = await read();
    expect(ordersOf(day).Otter).toHaveLength(1);
    expect(ordersOf(day).notPlaced).toHaveLength(2);
    expect((await storedStops(client, date))[otter]).toHaveLength(1);
    expect(day.log.filter((line) => line.words.includes('to Otter'))).toHaveLength(1);
  });

  it('on different vans, on a date no row exists for yet: both are made', async () => {
    const { visits, otter, plover, move, read, client, date } = await boardDay(app);
    const seen = versionsOf(await read());
    const answers = await Promise.all([
      move({ kind: 'placeVisit', visitId: visits.Rook!, vanId: otter, index: 0 }, seen),
      move({ kind: 'placeVisit', visitId: visits.Wren!, vanId: plover, index: 0 }, seen),
    ]);
    expect(answers.map((answer) => answer.status)).toEqual([200, 200]);
    expect(await storedStops(client, date)).toEqual({
      [otter]: [visits.Rook],
      [plover]: [visits.Wren],
    });
    const seqs = await inBusiness(client.session!.business.id, async () =>
      (await DayChange.findAll({ order: ['seq'] })).map((change) => change.seq),
    );
    expect(seqs).toEqual([...new Set(seqs)]);
  });
});

describe('what closes a run', () => {
  it('pins a visit to a van of the day and frees it', async () => {
    const { client, date, visits, otter, read } = await boardDay(app, ['Rook']);
    const params = { date, visitId: visits.Rook! };
    const pinned = await client.must(pinVisit, { params, body: { vanId: otter } });
    expect(pinned.problem.visits[0]!.pin).toEqual({ vanId: otter });
    expect(pinned.log[0]!.words).toBe('Rook pinned to Otter');
    const freed = await client.must(pinVisit, { params, body: { vanId: null } });
    expect(freed.problem.visits[0]!.pin).toBeNull();
    const bad = await client.call(pinVisit, { params, body: { vanId: params.visitId } });
    expect(bad.error.fields).toEqual({ vanId: 'must be a van with a shift that day' });
    expect((await read()).undo).toBeNull();
  });

  it('a cancelled visit leaves its run, which closes up and gets a new version', async () => {
    const { client, date, visits, otter, place, read } = await boardDay(app);
    await place('Rook', otter);
    await place('Wren', otter);
    const before = await place('Sorrel', otter);
    await client.must(cancelVisit, { params: { visitId: visits.Wren! }, body: { reason: 'ill' } });
    const day = await read();
    expect(ordersOf(day)).toEqual({ Otter: ['Rook', 'Sorrel'], Plover: [], notPlaced: [] });
    expect(versionsOf(day)[otter]).toBe(versionsOf(before)[otter]! + 1);
    expect(day.log[0]!.words).toBe('Wren cancelled: ill');
    expect((await storedStops(client, date))[otter]).toEqual([visits.Rook, visits.Sorrel]);
    const row = await inBusiness(client.session!.business.id, () => Visit.findByPk(visits.Wren!));
    expect(row).toMatchObject({ status: 'cancelled', cancelReason: 'ill' });
    const again = await client.call(cancelVisit, {
      params: { visitId: visits.Wren! },
      body: { reason: 'ill' },
    });
    expect(again.error.message).toContain('cancelled');
  });

  it('a removed shift leaves its visits not placed', async () => {
    const { client, date, otter, plover, place, read } = await boardDay(app);
    await place('Rook', otter);
    await place('Wren', plover);
    const shifts = await client.must(listShifts, { query: { from: date, to: date } });
    const shiftId = shifts.find((shift) => shift.vanId === otter)!.id;
    await client.must(removeShift, { params: { shiftId } });
    expect(ordersOf(await read())).toEqual({ Plover: ['Wren'], notPlaced: ['Rook', 'Sorrel'] });
    expect((await client.call(removeShift, { params: { shiftId } })).status).toBe(404);
  });
});
