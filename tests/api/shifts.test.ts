import { app, useApp } from '../support/useApp.ts';
import { afterEach, describe, expect, it } from 'vitest';
import { sendRuns } from '#shared/api/days.ts';
import {
  listShifts,
  removeShift,
  setShift,
  type Shift,
  updateGroomer,
} from '#shared/api/groomers.ts';
import { addRunFix } from '#shared/api/runs.ts';
import { clock } from '#server/clock.ts';
import { newId } from '#server/db/newId.ts';
import { boardDay, ordersOf, versionsOf } from '../support/boardDay.ts';

useApp();
afterEach(() => {
  clock.offsetMs = 0;
});

async function shiftBoard() {
  const board = await boardDay(app);
  const { client, date, groomers, otter } = board;
  const list = () => client.must(listShifts, { query: { from: date, to: date } });
  const shiftOf = async (vanId: string) => (await list()).find((one) => one.vanId === vanId)!;
  const set = (fields: Partial<Shift>) =>
    client.call(setShift, {
      body: {
        date,
        vanId: otter,
        groomerId: groomers[0]!.id,
        startMinutes: 480,
        endMinutes: 1020,
        mostOvertimeMinutes: 30,
        meal: null,
        ...fields,
      },
    });
  const send = async () =>
    client.must(sendRuns, {
      params: { date },
      body: { runVersions: versionsOf(await board.read()) },
    });
  return { ...board, list, shiftOf, set, send };
}

describe('setShift', () => {
  it('changes the shift a van has; one per van and date', async () => {
    const { set, list, shiftOf, otter, read } = await shiftBoard();
    const before = await shiftOf(otter);
    const meal = {
      lengthMinutes: 30,
      earliestMinutes: 690,
      latestMinutes: 810,
      dueAfterMinutes: 360,
    };
    const changed = await set({ startMinutes: 540, meal });
    expect(changed.body).toEqual({ ...before, startMinutes: 540, meal });
    expect(await list()).toHaveLength(2);
    const van = (await read()).problem.vans.find((one) => one.vanId === otter)!;
    expect(van.startSeconds).toBe(540 * 60);
    expect(van.meal).toMatchObject({ lengthSeconds: 1800, earliestStartSeconds: 690 * 60 });
  });

  it('refuses a groomer in two vans, retired ones and foreign ids, and hours that are none', async () => {
    const { client, set, groomers, list } = await shiftBoard();
    const stranger = await shiftBoard();
    const before = await list();
    const meal = {
      lengthMinutes: 30,
      earliestMinutes: 800,
      latestMinutes: 700,
      dueAfterMinutes: 0,
    };
    await client.must(updateGroomer, {
      params: { groomerId: groomers[0]!.id },
      body: { active: false },
    });
    for (const [fields, field] of [
      [{ groomerId: groomers[1]!.id }, 'groomerId'],
      [{}, 'groomerId'],
      [{ groomerId: stranger.groomers[0]!.id }, 'groomerId'],
      [{ vanId: stranger.otter }, 'vanId'],
      [{ vanId: newId() }, 'vanId'],
      [{ startMinutes: 1020 }, 'endMinutes'],
      [{ endMinutes: 1441 }, 'endMinutes'],
      [{ mostOvertimeMinutes: 241 }, 'mostOvertimeMinutes'],
      [{ date: '2026-02-30' }, 'date'],
      [{ meal }, 'meal.latestMinutes'],
    ] as const) {
      const answer = await set(fields);
      expect(answer.status, `${JSON.stringify(fields)}`).toBe(400);
      expect(Object.keys(answer.error.fields!)).toEqual([field]);
    }
    expect(await list()).toEqual(before);
  });

  it('a groomer put into two vans at once gets into one', async () => {
    const { set, shiftOf, client, otter, plover, groomers, list } = await shiftBoard();
    for (const vanId of [otter, plover])
      await client.must(removeShift, { params: { shiftId: (await shiftOf(vanId)).id } });
    const groomerId = groomers[0]!.id;
    const answers = await Promise.all([
      set({ vanId: otter, groomerId }),
      set({ vanId: plover, groomerId }),
    ]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 400]);
    expect(await list()).toHaveLength(1);
  });

  it('a draft’s meal goes when the shift has none any more', async () => {
    const { set, otter, place, read } = await shiftBoard();
    const meal = {
      lengthMinutes: 30,
      earliestMinutes: 500,
      latestMinutes: 810,
      dueAfterMinutes: 60,
    };
    await set({ meal });
    await place('Rook', otter);
    await place('Wren', otter);
    const kinds = async () => (await read()).plan.runs[0]!.stops.map((stop) => stop.kind);
    expect(await kinds()).toContain('meal');
    await set({ meal: null });
    expect(await kinds()).toEqual(['visit', 'visit']);
  });
});

describe('a run already sent', () => {
  it('keeps its groomer and its shift; its hours may change and ask to be sent', async () => {
    const { client, otter, plover, groomers, place, send, set, shiftOf, read } = await shiftBoard();
    await place('Rook', otter);
    await send();
    const before = await read();
    const plovers = await shiftOf(plover);
    await client.must(removeShift, { params: { shiftId: plovers.id } });
    const other = await set({ groomerId: groomers[1]!.id });
    expect(other.error).toMatchObject({
      code: 'alreadyThere',
      fields: { groomerId: 'the run was already sent' },
    });
    const gone = await client.call(removeShift, { params: { shiftId: (await shiftOf(otter)).id } });
    expect(gone.error.code).toBe('alreadyThere');
    expect(ordersOf(await read())).toMatchObject({ Otter: ['Rook'] });
    expect((await shiftOf(otter)).groomerId).toBe(groomers[0]!.id);
    expect(before.runs[0]!.changedSinceSent).toBe(false);
    await set({ startMinutes: 540 });
    expect((await read()).runs[0]!.changedSinceSent).toBe(true);
    expect((await send()).runs[0]).toMatchObject({ sentVersion: 2, changedSinceSent: false });
  });

  it('is not one because a phone looked at it: an unsent run keeps no places and can go', async () => {
    const { client, otter, read, shiftOf } = await shiftBoard();
    const { runId } = (await read()).runs[0]!;
    await client.must(addRunFix, {
      params: { runId },
      body: { lat: 41, lon: -36, at: new Date().toISOString(), accuracyMetres: 5 },
    });
    await client.must(removeShift, { params: { shiftId: (await shiftOf(otter)).id } });
    expect((await read()).runs.map((run) => run.vanName)).toEqual(['Plover']);
  });
});

describe('listShifts', () => {
  it('spans at most 62 days, forwards', async () => {
    const { client } = await shiftBoard();
    const ask = (from: string, to: string) => client.call(listShifts, { query: { from, to } });
    expect((await ask('2026-03-01', '2026-05-02')).status).toBe(200);
    expect((await ask('2026-03-01', '2026-05-03')).error.fields).toEqual({
      to: 'must be at most 62 days after from',
    });
    expect((await ask('2026-03-02', '2026-03-01')).error.fields).toEqual({
      to: 'must not be before from',
    });
    expect((await ask('2026-03-02', 'soon')).status).toBe(400);
  });
});
