import {
  business,
  callBack,
  fake,
  makeBusiness,
  makeHousehold,
  origin,
  queue,
  send,
  server,
  statuses,
  useTexts,
} from '../support/useTexts.ts';
import request from 'supertest';
import { afterEach, describe, expect, it } from 'vitest';
import { inBusiness } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { env } from '#server/env.ts';
import { startJobs } from '#server/jobs/startJobs.ts';
import { InboundText } from '#server/models/InboundText.ts';
import { OptOut } from '#server/models/OptOut.ts';
import { callbackUrl } from '#server/services/texts/callbackUrl.ts';
import { listTexts } from '#server/services/texts/listTexts.ts';
import { signWebhook } from '#server/sms/fake/signWebhook.ts';

useTexts();

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
