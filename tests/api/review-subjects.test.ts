import { app, useApp } from '../support/useApp.ts';
import { afterEach, describe, expect, it } from 'vitest';
import { listShifts, removeShift, setShift } from '#shared/api/groomers.ts';
import { openGate, updateHousehold } from '#shared/api/households.ts';
import { listGateOpenings, removeMember } from '#shared/api/members.ts';
import { cancelVisit, createVisit } from '#shared/api/visits.ts';
import { clock } from '#server/clock.ts';
import { inBusiness } from '#server/db/database.ts';
import { Day } from '#server/models/Day.ts';
import { GateOpening } from '#server/models/GateOpening.ts';
import { Run } from '#server/models/Run.ts';
import { Visit } from '#server/models/Visit.ts';
import { addHousehold, addVisit, buildBusiness } from '../support/buildBusiness.ts';
import { setClock } from '../support/setClock.ts';
import { tomorrow } from '../support/tomorrow.ts';
import { workDay } from '../support/workDay.ts';

useApp({ carriers: true });
afterEach(() => {
  clock.offsetMs = 0;
});

describe('a gate code', () => {
  it('shows to the desk always, to a groomer only for stops of the own run today', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }]);
    const { client, groomers, businessId, date } = work;
    const householdId = work.visits.Rook!.household.id;
    const other = (await addHousehold(client, { gateCode: '1111' })).household.id;
    await client.must(updateHousehold, { params: { householdId }, body: { gateCode: '4711' } });
    const open = (as: typeof client, id = householdId) =>
      as.call(openGate, { params: { householdId: id } });
    const mika = await work.member(['groomer'], groomers[0]!.id);
    const ines = await work.member(['groomer'], groomers[1]!.id);
    expect((await open(mika)).body).toEqual({ gateCode: '4711', siteGateCode: null });
    expect((await open(mika, other)).error.code).toBe('notAllowed');
    expect((await open(ines)).error.code).toBe('notAllowed');
    expect((await open(client, other)).body.gateCode).toBe('1111');
    const log = await inBusiness(businessId, () => GateOpening.findAll());
    expect(log.map((row) => row.householdId).sort()).toEqual([householdId, other].sort());
    // The day before, the groomer has no business at the door.
    setClock(new Date(Date.parse(date) - 86_400_000).toISOString().slice(0, 10), '12:00');
    const early = await work.member(['groomer'], null);
    expect((await open(early)).error.code).toBe('notAllowed');
  });
});

describe('who leaves', () => {
  it('is told with the households whose codes they have seen, as long as those have one', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }, { petName: 'Wren' }]);
    const { client, groomers } = work;
    const [rook, wren] = ['Rook', 'Wren'].map((pet) => work.visits[pet]!.household.id);
    const setCode = (householdId: string, gateCode: string | null) =>
      client.must(updateHousehold, { params: { householdId }, body: { gateCode } });
    await setCode(rook!, '4711');
    await setCode(wren!, '1111');
    const mika = await work.member(['groomer'], groomers[0]!.id);
    for (const householdId of [rook!, wren!, rook!])
      await mika.must(openGate, { params: { householdId } });
    const params = { userId: mika.session!.user.id };
    const names = async () =>
      (await client.must(listGateOpenings, { params })).map((one) => one.householdName);
    expect(await names()).toEqual(['The Rooks', 'The Wrens']);
    await client.must(removeMember, { params });
    expect(await names()).toEqual(['The Rooks', 'The Wrens']);
    await setCode(rook!, null);
    expect(await names()).toEqual(['The Wrens']);
    const stranger = (await buildBusiness(app, work.date)).client;
    expect((await stranger.call(listGateOpenings, { params })).status).toBe(404);
    expect((await mika.call(listGateOpenings, { params })).status).toBe(401);
  });
});

describe('double clicks', () => {
  it('book a pet once; after a cancellation it can be booked again', async () => {
    const date = tomorrow();
    const { client } = await buildBusiness(app, date);
    const { household, pet } = await addHousehold(client);
    const book = () =>
      client.call(createVisit, { body: { householdId: household.id, date, petIds: [pet.id] } });
    const answers = await Promise.all([book(), book(), book()]);
    expect(answers.map((one) => one.status).sort()).toEqual([200, 409, 409]);
    const refused = answers.find((one) => one.status === 409)!;
    expect(refused.error.fields).toEqual({ petIds: 'Clover already has a visit on this day' });
    const visitId = answers.find((one) => one.status === 200)!.body.id;
    await client.must(cancelVisit, { params: { visitId }, body: { reason: 'moved away' } });
    expect((await book()).status).toBe(200);
  });

  it('removing a shift leaves alone the run of a shift set since', async () => {
    const date = tomorrow();
    const { client, vans, groomers } = await buildBusiness(app, date);
    const businessId = client.session!.business.id;
    const body = {
      date,
      vanId: vans[0]!.id,
      groomerId: groomers[0]!.id,
      startMinutes: 480,
      endMinutes: 1020,
      mostOvertimeMinutes: 0,
      meal: null,
    };
    const all = await client.must(listShifts, { query: { from: date, to: date } });
    const shift = all.find((one) => one.vanId === vans[0]!.id)!;
    const remove = () => client.call(removeShift, { params: { shiftId: shift.id } });
    const both = await Promise.all([remove(), remove()]);
    expect(both.map((one) => one.status).sort()).toEqual([200, 404]);
    await client.must(setShift, { body });
    expect((await remove()).status).toBe(404);
    const runs = await inBusiness(businessId, () => Run.findAll({ where: { date } }));
    expect(runs).toHaveLength(2);
  });
});

describe('what Sequelize runs no hook for', () => {
  it('is refused, so that nothing escapes the business', async () => {
    const date = tomorrow();
    const { client } = await buildBusiness(app, date);
    await addVisit(client, date);
    const inside = <Result>(fn: () => Promise<Result>) =>
      inBusiness(client.session!.business.id, fn);
    for (const escape of [
      () => Day.increment('version', { where: { date } }),
      () => Visit.max('date'),
      () => Visit.sum('id'),
      () => Day.upsert({ date }),
      () => Visit.truncate(),
    ])
      await expect(inside(async () => escape())).rejects.toThrow('would escape the business');
  });
});
