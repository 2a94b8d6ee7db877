import { dropDatabase, makeDatabase } from '../support/freshDatabase.ts';
import { seededRandom } from '../support/random.ts';
import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import express from 'express';
import request from 'supertest';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { inBusiness, unsafeAcrossBusinesses } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { env } from '#server/env.ts';
import { answerErrors } from '#server/http/answerErrors.ts';
import { startJobs } from '#server/jobs/startJobs.ts';
import { ArrivalLink } from '#server/models/ArrivalLink.ts';
import { Business } from '#server/models/Business.ts';
import { Household } from '#server/models/Household.ts';
import { InboundText } from '#server/models/InboundText.ts';
import { OptOut } from '#server/models/OptOut.ts';
import { OutboxText } from '#server/models/OutboxText.ts';
import { Pet } from '#server/models/Pet.ts';
import { Visit } from '#server/models/Visit.ts';
import { VisitPet } from '#server/models/VisitPet.ts';
import { textRoutes } from '#server/routes/textRoutes.ts';
import { webhookRoutes } from '#server/routes/webhookRoutes.ts';
import { startingWeights } from '#server/services/accounts/startingWeights.ts';
import { hashToken } from '#server/services/secrets/tokens.ts';
import { callbackUrl } from '#server/services/texts/callbackUrl.ts';
import { dropTexts } from '#server/services/texts/dropTexts.ts';
import { listTexts } from '#server/services/texts/listTexts.ts';
import { currentFake, openCarriers } from '#server/services/texts/openCarriers.ts';
import { queueOnTheWay } from '#server/services/texts/queueOnTheWay.ts';
import { queueText } from '#server/services/texts/queueText.ts';
import { sendDueTexts } from '#server/services/texts/sendDueTexts.ts';
import { magicNumbers } from '#server/sms/fake/refusals.ts';
import { signWebhook } from '#server/sms/fake/signWebhook.ts';

const app = express();
app.use(webhookRoutes);
app.use(express.json());
app.use(textRoutes);
app.use(answerErrors);

let server: Server;
let origin: string;
let carriers: Awaited<ReturnType<typeof openCarriers>>;
let business: Business;

beforeAll(async () => {
  await makeDatabase();
  server = await new Promise<Server>((resolve) => {
    const listening = app.listen(0, '127.0.0.1', () => resolve(listening));
  });
  origin = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
});
afterAll(async () => {
  await new Promise((resolve) => server.close(resolve));
  await dropDatabase();
});
beforeEach(async () => {
  carriers = await openCarriers({
    origin,
    now: () => new Date(),
    source: {},
    folder: null,
    // Statuses move only when a test says `settle`.
    fakeStepMs: 3_600_000,
  });
  business = await makeBusiness();
});
afterEach(async () => {
  await carriers.close();
  // The ticker works for every business, so what a test leaves would be sent by the next.
  await unsafeAcrossBusinesses(() => OutboxText.destroy({ where: {} }));
});

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

  it('knows no other business’s household', async () => {
    const household = await makeHousehold();
    const other = await makeBusiness();
    await expect(inBusiness(other.id, () => queueText(booked(household)))).rejects.toMatchObject({
      code: 'notFound',
    });
  });
});

describe('queueOnTheWay', () => {
  const until = new Date(Date.now() + 20 * 60_000);
  const onTheWay = (visitId: string) =>
    inBusiness(business.id, () =>
      queueOnTheWay({
        visitId,
        runId: newId(),
        groomerName: 'Mika',
        arrival: { from: '9:48', to: '9:56' },
        until,
        origin: 'https://vans.example.org',
        now: new Date(),
      }),
    );

  it('tells the household once, with a link only its hash is kept of', async () => {
    const household = await makeHousehold();
    const visitId = await makeVisit(household);
    await addPets(household, visitId, ['Pip', 'Juno']);
    const text = await onTheWay(visitId);
    const words =
      /^Saltmarsh: Mika is on the way for Pip and Juno\. Please open the door 9:48-9:56\. Live: https:\/\/vans\.example\.org\/a\/([\w-]{22})$/;
    const token = words.exec(text.body)![1]!;
    expect(text.staleAfter).toEqual(until);
    expect((await onTheWay(visitId)).id).toBe(text.id);
    const links = await inBusiness(business.id, () => ArrivalLink.findAll());
    expect(links).toMatchObject([{ visitId, tokenHash: hashToken(token) }]);
    await send();
    expect(fake().messages()).toMatchObject([{ to: household.phone, body: text.body }]);
  });

  it('makes no link for a text that stays', async () => {
    const household = await makeHousehold({ textsConsent: false });
    const text = await onTheWay(await makeVisit(household));
    expect(text.status).toBe('notSent');
    expect(await inBusiness(business.id, () => ArrivalLink.count())).toBe(0);
  });

  it('is taken back when the van has arrived first', async () => {
    const visitId = await makeVisit(await makeHousehold());
    await onTheWay(visitId);
    const dropped = await inBusiness(business.id, () =>
      dropTexts({ visitId, kinds: ['onTheWay'], reason: 'The van had arrived.', now: new Date() }),
    );
    expect(dropped).toBe(1);
    await send();
    expect(await rows()).toMatchObject([{ status: 'stale', reason: 'The van had arrived.' }]);
    expect(fake().messages()).toEqual([]);
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

describe('status callbacks', () => {
  it('move a text forward only', async () => {
    const text = await queue(await makeHousehold());
    await send();
    for (const [status, wanted] of [
      ['sent', 'sent'],
      ['delivered', 'delivered'],
      ['sent', 'delivered'],
      ['delivered', 'delivered'],
      ['receiving', 'delivered'],
    ]) {
      const answer = await callBack(callbackUrl(origin, text.id), { MessageStatus: status! });
      expect(answer.status).toBe(200);
      expect(await statuses()).toEqual([wanted]);
    }
  });

  it('are refused without the carrier’s signature or with another id', async () => {
    const text = await queue(await makeHousehold());
    await send();
    const form = { MessageStatus: 'delivered' };
    const url = callbackUrl(origin, text.id);
    expect((await callBack(url, form, 'bm90IHNpZ25lZA==')).status).toBe(403);
    expect((await callBack(url, form, signWebhook('other token', url, form))).status).toBe(403);
    expect((await callBack(url.replace(text.id, newId()), form)).status).toBe(403);
    expect((await request(server).post('/hooks/sms/status').send('x=1')).status).toBe(403);
    expect(await statuses()).toEqual(['queued']);
  });
});

describe('replies', () => {
  it('reach the thread of the household, once each', async () => {
    const household = await makeHousehold();
    await queue(household);
    await send();
    await fake().reply(household.phone!, 'Ring twice, please');
    const [inbound] = await inBusiness(business.id, () => InboundText.findAll());
    const { sid, sender: From, recipient: To, body: Body } = inbound!;
    const url = `${origin}/hooks/sms/inbound`;
    expect((await callBack(url, { MessageSid: sid, From, To, Body })).text).toBe('<Response/>');
    const lines = await inBusiness(business.id, () =>
      listTexts({ householdId: household.id, limit: 10 }),
    );
    expect(
      lines.map(({ text, household: whose }) => [text.body.slice(0, 18), whose?.name]),
    ).toEqual([
      ['Ring twice, please', 'Adeyemi'],
      ['Saltmarsh: booked ', 'Adeyemi'],
    ]);
    const other = await makeBusiness();
    expect(await inBusiness(other.id, () => listTexts({ limit: 10 }))).toEqual([]);
  });

  it('end texts at STOP, those waiting too, and resume at START', async () => {
    const household = await makeHousehold();
    await queue(household);
    await send();
    await queue(household);
    await fake().reply(household.phone!, 'Stop.');
    expect(await statuses()).toEqual(['queued', 'notSent']);
    expect((await queue(household)).reason).toBe('This phone ended texts with STOP: call instead.');
    await fake().reply(household.phone!, 'START');
    expect((await queue(household)).status).toBe('waiting');
    expect(await inBusiness(business.id, () => OptOut.count())).toBe(0);
  });

  it('to a number of nobody are taken and forgotten; unsigned ones are refused', async () => {
    const form = { MessageSid: 'SM1', From: '+15550100123', To: '+15559990000', Body: 'hi' };
    const url = `${origin}/hooks/sms/inbound`;
    expect((await callBack(url, form)).status).toBe(200);
    expect((await callBack(url, { ...form, To: business.senderPhone! }, 'x')).status).toBe(403);
    expect(await inBusiness(business.id, () => InboundText.count())).toBe(0);
  });
});

describe('the fake pages', () => {
  afterEach(() => {
    Object.assign(env, { fakesWanted: true, isLoopback: true, isProduction: false });
  });

  it('show phones and letters, and take replies', async () => {
    const household = await makeHousehold();
    await queue(household);
    await send();
    const reply = { phone: household.phone, body: 'We are home' };
    const answer = await request(server).post('/api/fake/phones/reply').send(reply);
    expect([answer.status, answer.body]).toEqual([200, { done: true }]);
    const phones = await request(server).get('/api/fake/phones');
    expect(phones.body).toMatchObject([
      {
        phone: household.phone,
        texts: [
          { direction: 'out', status: 'queued' },
          { direction: 'in', body: 'We are home', status: 'received' },
        ],
      },
    ]);
    const nobody = await request(server)
      .post('/api/fake/phones/reply')
      .send({ ...reply, phone: '+15550100000' });
    expect(nobody.body.error.fields).toEqual({ phone: 'must be a phone that has got a text' });
    expect((await request(server).get('/api/fake/letters')).body).toEqual([]);
  });

  it.each([{ fakesWanted: false }, { isLoopback: false }, { isProduction: true }])(
    'do not exist with %j',
    async (change) => {
      Object.assign(env, change);
      for (const path of ['/api/fake/phones', '/api/fake/letters'])
        expect((await request(server).get(path)).status).toBe(404);
      expect((await request(server).post('/api/fake/phones/reply').send({})).status).toBe(404);
    },
  );
});

describe('the ticker', () => {
  it('sends by itself, and stops when told', async () => {
    const jobs = startJobs(origin);
    await queue(await makeHousehold());
    await expect.poll(() => statuses(), { timeout: 8000 }).toEqual(['queued']);
    await jobs.stop();
    await queue(await makeHousehold());
    await new Promise((resolve) => setTimeout(resolve, 2500));
    expect(await statuses()).toEqual(['queued', 'waiting']);
  });
});

const fake = () => currentFake()!;

async function makeBusiness(): Promise<Business> {
  return Business.create({
    name: 'Saltmarsh',
    timeZone: 'Europe/Vaduz',
    currency: 'EUR',
    distanceUnit: 'km',
    weightUnit: 'kg',
    weights: startingWeights,
    createdAt: new Date(),
  });
}

async function makeHousehold(fields: Partial<Household> = {}): Promise<Household> {
  return inBusiness(business.id, () =>
    Household.create({
      name: 'Adeyemi',
      addressLabel: '12 Quay Lane',
      lat: 1,
      lon: 2,
      accessNotes: '',
      handoverNotes: '',
      contactName: 'Ade',
      phone: `+1555${String(Math.floor(Math.random() * 1e7)).padStart(7, '0')}`,
      textsConsent: true,
      createdAt: new Date(),
      ...fields,
    }),
  );
}

async function makeVisit(household: Household): Promise<string> {
  const visit = await inBusiness(business.id, () =>
    Visit.create({
      householdId: household.id,
      date: '2026-04-14',
      status: 'booked',
      allowed: [],
      note: '',
      forecast: {
        steps: [],
        work: { meanSeconds: 3600, varianceSeconds2: 0 },
        p10Seconds: 3600,
        p90Seconds: 3600,
        setUpSeconds: 0,
        cleanDownSeconds: 0,
        tankUse: [],
        needs: [],
        heaviestGrams: 9000,
        coatStyle: '',
      },
      modelVersion: 'test',
      createdAt: new Date(),
    }),
  );
  return visit.id;
}

async function addPets(household: Household, visitId: string, names: string[]): Promise<void> {
  await inBusiness(business.id, async () => {
    for (const [position, name] of names.entries()) {
      const pet = await Pet.create({
        householdId: household.id,
        name,
        species: 'dog',
        matting: 0,
        soil: 0,
        temperament: 'calm',
        cautions: [],
        cautionNote: 'bites when towelled',
        vetName: '',
        styleId: 'bath',
        styleNotes: '',
        intervalWeeks: 6,
      });
      await VisitPet.create({ visitId, petId: pet.id, position });
    }
  });
}

type Extra = {
  petNames?: string[];
  visitId?: string;
  promiseVersion?: number;
  dueAt?: Date;
  until?: Date;
};

function booked(household: Household, { petNames = ['Pip'], ...extra }: Extra = {}) {
  return {
    householdId: household.id,
    visitId: null,
    kind: 'booked' as const,
    promiseVersion: 1,
    fields: { petNames, date: '2026-04-14', promise: { from: '9:30', to: '11:30' } },
    now: new Date(),
    ...extra,
  };
}

async function queue(household: Household, extra: Extra = {}): Promise<OutboxText> {
  const text = await inBusiness(business.id, () => queueText(booked(household, extra)));
  await business.reload();
  return text;
}

async function send(afterMs = 0, dice = () => 0.5): Promise<number> {
  return sendDueTexts({ now: new Date(Date.now() + afterMs), dice, origin });
}

async function rows(): Promise<OutboxText[]> {
  return unsafeAcrossBusinesses(() =>
    OutboxText.findAll({ where: { businessId: business.id }, order: ['createdAt', 'id'] }),
  );
}

async function statuses(): Promise<string[]> {
  return (await rows()).map((row) => row.status);
}

async function callBack(url: string, form: Record<string, string>, signature?: string) {
  return request(server)
    .post(url.slice(origin.length))
    .set('Host', new URL(origin).host)
    .set('X-Twilio-Signature', signature ?? signWebhook(fake().authToken, url, form))
    .type('form')
    .send(form);
}
