import { app, useApp } from '../support/useApp.ts';
import { expect, it } from 'vitest';
import { getDay, moveVisit, undoMove } from '#shared/api/days.ts';
import { createSite, openGate, updateHousehold } from '#shared/api/households.ts';
import { getSession } from '#shared/api/session.ts';
import { inBusiness } from '#server/db/database.ts';
import { keyRing } from '#server/env.ts';
import { DayChange } from '#server/models/DayChange.ts';
import { Household } from '#server/models/Household.ts';
import { Proposal } from '#server/models/Proposal.ts';
import { RunFix } from '#server/models/RunFix.ts';
import { Session } from '#server/models/Session.ts';
import { resealGateCodes } from '#server/services/households/resealGateCodes.ts';
import { removeExpired } from '#server/services/upkeep/removeExpired.ts';
import { ApiClient } from '../support/apiClient.ts';
import { boardDay } from '../support/boardDay.ts';
import { addHousehold } from '../support/buildBusiness.ts';

useApp();

const days = (count: number) => new Date(Date.now() + count * 86_400_000);

it('removes what is over and nothing before its time', async () => {
  const { client, date, read, place, otter } = await boardDay(app, ['Rook']);
  const businessId = client.session!.business.id;
  const inside = <Result>(fn: () => Promise<Result>) => inBusiness(businessId, fn);
  const day = await place('Rook', otter);
  const fix = { runId: day.runs[0]!.runId, lat: 41, lon: -36, at: new Date(), accuracyMetres: 9 };
  await inside(() => RunFix.create(fix));
  const { dayId } = (await inside(() => DayChange.findOne()))!;
  await inside(() =>
    Proposal.create({
      dayId,
      scope: 'day',
      state: 'dropped',
      runVersions: {},
      plan: null,
      seed: 1,
      createdAt: new Date(),
      createdBy: 'Runa',
    }),
  );
  const counts = async () => ({
    fixes: await inside(() => RunFix.count()),
    offers: await inside(() => Proposal.count()),
    sessions: await Session.count({ where: { businessId } }),
    undo: (await read()).undo?.words ?? null,
    log: (await read()).log.length,
  });
  const full = await counts();
  expect(full).toMatchObject({ fixes: 1, offers: 1, sessions: 1, undo: 'Rook to Otter, first' });
  await removeExpired(new Date());
  expect(await counts()).toEqual(full);
  await removeExpired(days(2));
  expect(await counts()).toEqual({ ...full, fixes: 0 });
  await removeExpired(days(8));
  expect(await counts()).toEqual({ ...full, fixes: 0, offers: 0 });
  // A month on the sign-in is over; the log stays, but its moves cannot be taken back any more.
  await removeExpired(days(29));
  expect((await client.call(getSession)).status).toBe(200);
  await removeExpired(days(31));
  expect((await client.call(getSession)).status).toBe(401);
  const rows = await inside(() => DayChange.findAll());
  expect(rows.length).toBe(full.log);
  expect(rows.some((row) => row.move !== null || row.before !== null)).toBe(false);
  const again = await new ApiClient(app).signIn(client.session!.user.email, 'scissors and comb');
  expect((await again.must(getDay, { params: { date } })).undo).toBeNull();
  expect((await again.call(undoMove, { params: { date } })).status).toBe(409);
  const next = await again.must(getDay, { params: { date } });
  const visitId = next.problem.visits[0]!.id;
  const move = { kind: 'unplaceVisit' as const, visitId };
  const runVersions = Object.fromEntries(next.runs.map((run) => [run.vanId, run.version]));
  const moved = await again.must(moveVisit, { params: { date }, body: { move, runVersions } });
  expect(moved.undo).toMatchObject({ words: 'Rook to not placed' });
});

it('seals gate codes again with the first key, so that the old one can go', async () => {
  const { client } = await boardDay(app, []);
  const businessId = client.session!.business.id;
  const site = await client.must(createSite, {
    body: { name: 'Court', lat: 41, lon: -36, gateCode: '22#' },
  });
  const { household } = await addHousehold(client, { gateCode: '4711', siteId: site.id });
  const params = { householdId: household.id };
  const row = () => inBusiness(businessId, () => Household.findByPk(household.id));
  const old = (await row())!.gateCodeSealed!;
  const ring = keyRing();
  expect(await resealGateCodes()).toBe(0);
  expect((await row())!.gateCodeSealed).toBe(old);
  ring.keys.unshift({ id: 'new_key', secret: Buffer.alloc(32, 3) });
  try {
    expect(await resealGateCodes()).toBe(2);
    expect((await row())!.gateCodeSealed).toMatch(/^new_key\./);
    const [oldKey] = ring.keys.splice(1, 1);
    const person = await new ApiClient(app).signIn(client.session!.user.email, 'scissors and comb');
    expect(await person.must(openGate, { params })).toEqual({
      gateCode: '4711',
      siteGateCode: '22#',
    });
    // One sealed with a key that is gone stays as it is, and the others are still done.
    await inBusiness(businessId, () =>
      Household.update({ gateCodeSealed: old }, { where: { id: household.id } }),
    );
    expect(await resealGateCodes()).toBe(0);
    expect((await row())!.gateCodeSealed).toBe(old);
    ring.keys.push(oldKey!);
    await person.must(updateHousehold, { params, body: { gateCode: null } });
    expect(await resealGateCodes()).toBe(0);
    expect((await row())!.gateCodeSealed).toBeNull();
  } finally {
    ring.keys.splice(
      0,
      ring.keys.length,
      ring.keys.find(({ id }) => id !== 'new_key')!,
    );
  }
});
