import {
  booked,
  business,
  carriers,
  fake,
  makeBusiness,
  makeHousehold,
  makeVisit,
  queue,
  rows,
  send,
  server,
  statuses,
  useTexts,
} from '../support/useTexts.ts';
import { seededRandom } from '../support/random.ts';
import request from 'supertest';
import { describe, expect, it } from 'vitest';
import { inBusiness } from '#server/db/database.ts';
import type { Business } from '#server/models/Business.ts';
import { Membership, type RoleName } from '#server/models/Membership.ts';
import { User } from '#server/models/User.ts';
import { newId } from '#server/db/newId.ts';
import { openSession } from '#server/services/accounts/openSession.ts';
import { dropTexts } from '#server/services/texts/dropTexts.ts';
import { queueText } from '#server/services/texts/queueText.ts';
import { magicNumbers } from '#server/sms/fake/refusals.ts';

useTexts();

describe('queueText', () => {
  it('goes only if the change it belongs to is kept', async () => {
    const household = await makeHousehold();
    await expect(
      inBusiness(business.id, async () => {
        await queueText(booked(household));
        throw new Error('the change failed');
      }),
    ).rejects.toThrow('the change failed');
    expect(await rows()).toEqual([]);
    await send();
    expect(fake().messages()).toEqual([]);
  });

  it('writes the same text once, and again for a new promise', async () => {
    const household = await makeHousehold();
    const visitId = await makeVisit(household);
    const first = await queue(household, { visitId });
    expect((await queue(household, { visitId })).id).toBe(first.id);
    expect((await queue(household, { visitId, promiseVersion: 2 })).id).not.toBe(first.id);
    expect(await rows()).toHaveLength(2);
  });

  it('writes once when two processes race', async () => {
    const household = await makeHousehold();
    const visitId = await makeVisit(household);
    const made = await Promise.all([1, 2, 3, 4].map(() => queue(household, { visitId })));
    expect(new Set(made.map((row) => row.id)).size).toBe(1);
  });

  it.each([
    [{ textsConsent: false }, 'No consent to texts: call instead.'],
    [{ phone: null }, 'No phone number: call or write instead.'],
  ])('stays quiet with %j', async (fields, reason) => {
    const household = await makeHousehold(fields);
    await queue(household);
    await send();
    expect(await rows()).toMatchObject([{ status: 'notSent', reason }]);
    expect(fake().messages()).toEqual([]);
  });

  it('says so when no carrier is connected', async () => {
    await carriers.close();
    const text = await queue(await makeHousehold());
    expect([text.status, text.reason]).toEqual(['notSent', 'No SMS carrier is connected.']);
    expect(await send()).toBe(0);
  });

  it('knows no other business’s household', async () => {
    const household = await makeHousehold();
    const other = await makeBusiness();
    await expect(inBusiness(other.id, () => queueText(booked(household)))).rejects.toMatchObject({
      code: 'notFound',
    });
  });
});

describe('dropTexts', () => {
  it('takes back what has not left yet', async () => {
    const household = await makeHousehold();
    const visitId = await makeVisit(household);
    await queue(household, { visitId });
    await queue(household);
    const dropped = await inBusiness(business.id, () =>
      dropTexts({ visitId, kinds: ['booked'], reason: 'The visit is off.', now: new Date() }),
    );
    expect(dropped).toBe(1);
    await send();
    expect(await rows()).toMatchObject([
      { status: 'stale', reason: 'The visit is off.' },
      { status: 'queued' },
    ]);
    expect(fake().messages()).toHaveLength(1);
  });
});

describe('sendDueTexts', () => {
  it('sends what is due and follows it to the phone', async () => {
    const household = await makeHousehold();
    await queue(household);
    await queue(household, { dueAt: new Date(Date.now() + 60_000) });
    await send();
    expect(fake().messages()).toMatchObject([
      {
        to: household.phone,
        from: business.senderPhone,
        body: 'Saltmarsh: booked for Pip on Tue 14 Apr, arrival 9:30-11:30. Reply STOP to end texts.',
      },
    ]);
    expect(await statuses()).toEqual(['queued', 'waiting']);
    await fake().settle();
    expect(await statuses()).toEqual(['delivered', 'waiting']);
    expect((await rows())[0]).toMatchObject({ sid: fake().messages()[0]!.sid, attempts: 1 });
  });

  it('sends each text once however many tickers run', async () => {
    const household = await makeHousehold();
    for (let n = 0; n < 40; n += 1) await queue(household);
    const untilNone = async (): Promise<number> => {
      const count = await send();
      return count === 0 ? 0 : count + (await untilNone());
    };
    const counts = await Promise.all([1, 2, 3, 4].map(untilNone));
    counts.push(await untilNone());
    expect(counts.reduce((sum, count) => sum + count, 0)).toBe(40);
    expect(fake().messages()).toHaveLength(40);
    expect(new Set(await statuses())).toEqual(new Set(['queued']));
  });

  it('learns from the callback when the answer was lost', async () => {
    await queue(await makeHousehold());
    fake().switches.mode = 'acceptThenDrop';
    await send();
    expect(await statuses()).toEqual(['attempting']);
    await fake().settle();
    expect(await rows()).toMatchObject([
      { status: 'delivered', sid: fake().messages()[0]!.sid, attempts: 1 },
    ]);
  });

  it('finds a lost text in the carrier’s list instead of sending it twice', async () => {
    await queue(await makeHousehold());
    fake().switches.mode = 'acceptThenDrop';
    await send();
    fake().switches.mode = 'fine';
    expect(await send(9_000)).toBe(0);
    expect(await send(11_000)).toBe(1);
    expect(await rows()).toMatchObject([
      { status: 'queued', sid: fake().messages()[0]!.sid, attempts: 1 },
    ]);
    expect(fake().messages()).toHaveLength(1);
  });

  it('does not take another text with the same words for the lost one', async () => {
    const household = await makeHousehold();
    await queue(household);
    await send();
    await queue(household);
    fake().switches.mode = 'down';
    await send();
    fake().switches.mode = 'fine';
    await send(11_000);
    expect(await statuses()).toEqual(['queued', 'attempting']);
  });

  it('sends again what is absent after two minutes, not before', async () => {
    await queue(await makeHousehold());
    fake().switches.mode = 'down';
    await send();
    expect(await statuses()).toEqual(['attempting']);
    fake().switches.mode = 'fine';
    for (const ms of [11_000, 60_000, 110_000]) await send(ms);
    expect(fake().messages()).toEqual([]);
    await send(125_000);
    expect(fake().messages()).toHaveLength(1);
    expect(await rows()).toMatchObject([{ status: 'queued', attempts: 2 }]);
  });

  it('takes over from a process killed between claiming and sending', async () => {
    const text = await queue(await makeHousehold());
    const past = (ms: number) => new Date(Date.now() - ms);
    await inBusiness(business.id, () =>
      text.update({ status: 'attempting', attemptedAt: past(180_000), leaseUntil: past(1000) }),
    );
    await send();
    expect(fake().messages()).toHaveLength(1);
    expect(await statuses()).toEqual(['queued']);
  });

  it('leaves to a person what nobody can know', async () => {
    await queue(await makeHousehold(), { until: new Date(Date.now() + 30_000) });
    fake().switches.mode = 'down';
    await send();
    await send(11_000);
    expect(await statuses()).toEqual(['attempting']);
    await send(31_000);
    expect(await rows()).toMatchObject([
      { status: 'failed', reason: 'Nobody knows whether this text went: call.' },
    ]);
  });

  it('backs off when the carrier is busy, by the dice', async () => {
    await queue(await makeHousehold());
    fake().switches.mode = 'throttled';
    await send(0, () => 0);
    expect(await statuses()).toEqual(['waiting']);
    expect(await send(2_000, () => 0)).toBe(0);
    expect(await send(3_000, () => 0.999)).toBe(1);
    fake().switches.mode = 'fine';
    expect(await send(12_000)).toBe(0);
    expect(await send(13_100)).toBe(1);
    expect(await rows()).toMatchObject([{ status: 'queued', attempts: 3 }]);
  });

  it('drops what is too late', async () => {
    await queue(await makeHousehold(), { until: new Date(Date.now() + 1000) });
    await send(1001);
    expect(await rows()).toMatchObject([{ status: 'stale', reason: 'Too late to be of use.' }]);
    expect(fake().messages()).toEqual([]);
  });

  it.each([
    [magicNumbers.invalid, 'failed', 'This is not a phone number: correct it.'],
    [magicNumbers.unreachable, 'undelivered', 'The phone could not be reached: call instead.'],
  ])('says why %s got nothing', async (phone, status, reason) => {
    await queue(await makeHousehold({ phone }));
    await send();
    await fake().settle();
    expect(await rows()).toMatchObject([{ status, reason }]);
  });

  it('believes the carrier about a STOP it never heard of', async () => {
    const household = await makeHousehold({ phone: magicNumbers.optedOut });
    await queue(household);
    await send();
    expect((await rows())[0]).toMatchObject({ status: 'failed' });
    expect((await queue(household)).status).toBe('notSent');
  });
});

describe('a bad day at the carrier', () => {
  it('delivers each text once through lost answers, outages and muddled callbacks', async () => {
    const household = await makeHousehold();
    for (let n = 0; n < 40; n += 1) await queue(household, { petNames: [`Pet ${n}`] });
    const draw = seededRandom(7);
    const oneOf = <Thing>(things: readonly Thing[]) => things[Math.floor(draw() * things.length)]!;
    const modes = ['fine', 'acceptThenDrop', 'down', 'throttled'] as const;
    for (let round = 0; round < 60; round += 1) {
      fake().switches.mode = oneOf(modes);
      fake().switches.callbacks = oneOf(['inOrder', 'duplicate', 'reversed'] as const);
      await Promise.all([send(round * 15_000, draw), send(round * 15_000, draw)]);
      if (draw() < 0.3) await fake().settle();
    }
    fake().switches.mode = 'fine';
    for (let n = 0; n < 6; n += 1) await send(3_600_000 + n * 300_000);
    await fake().settle();
    const bodies = fake()
      .messages()
      .map((message) => message.body);
    expect(bodies).toHaveLength(40);
    expect(new Set(bodies).size).toBe(40);
    expect(new Set(await statuses())).toEqual(new Set(['delivered']));
  });
});

describe('GET /api/texts', () => {
  it('shows the threads of the own business to its desk, nobody else', async () => {
    const household = await makeHousehold({ name: 'Okafor' });
    await queue(household);
    const mine = await enter(business, ['dispatcher']);
    const answer = await request(server).get('/api/texts').set('Cookie', mine);
    expect([answer.status, answer.body]).toEqual([
      200,
      [
        {
          id: expect.any(String),
          direction: 'out',
          kind: 'booked',
          body: expect.stringContaining('Saltmarsh: booked for Pip'),
          at: expect.any(String),
          status: 'waiting',
          reason: null,
          householdId: household.id,
          householdName: 'Okafor',
          phone: household.phone,
        },
      ],
    ]);
    const stranger = await enter(await makeBusiness(), ['operator']);
    const theirs = await request(server)
      .get(`/api/texts?householdId=${household.id}`)
      .set('Cookie', stranger);
    expect([theirs.status, theirs.body]).toEqual([200, []]);
    const groomer = await enter(business, ['groomer']);
    expect((await request(server).get('/api/texts').set('Cookie', groomer)).status).toBe(403);
    expect((await request(server).get('/api/texts')).status).toBe(401);
  });
});

/** Signs someone in to a business with these roles; answers the cookie. */
async function enter(where: Business, roles: RoleName[]): Promise<string> {
  const user = await User.create({
    name: 'Runa',
    email: `${newId()}@example.org`,
    passwordHash: 'unused',
    createdAt: new Date(),
  });
  await inBusiness(where.id, () =>
    Membership.create({ userId: user.id, roles, createdAt: new Date() }),
  );
  const { access } = await openSession(user.id, where.id, new Date());
  return `furlong_access=${access}`;
}
