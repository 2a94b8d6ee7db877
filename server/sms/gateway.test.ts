import { appendFileSync, mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, describe, expect, it } from 'vitest';
import { magicNumbers } from './fake/refusals.ts';
import { startFakeCarrier, type FakeCarrierOptions } from './fake/startFakeCarrier.ts';
import { openGateway, type Gateway } from './gateway.ts';

const from = '+15550100001';
const to = '+15550109999';
const undo: (() => unknown)[] = [];
afterEach(async () => {
  for (const one of undo.splice(0).reverse()) await one();
});

describe('the carrier behind the SDK', () => {
  it('takes a text, moves it on and calls back signed, in order', async () => {
    const { carrier, gateway } = await open();
    const hook = await startHook(gateway);
    const sent = await gateway.sendText({ from, to, body: 'Hello €', statusCallback: hook.url });
    expect(sent).toEqual({ sid: expect.stringMatching(/^SM[0-9a-f]{32}$/), status: 'queued' });
    await carrier.settle();
    expect(hook.calls.map((call) => [call.valid, call.params.MessageStatus])).toEqual([
      [true, 'sent'],
      [true, 'delivered'],
    ]);
    expect(hook.calls[0]!.params).toMatchObject({ MessageSid: sent.sid, From: from, To: to });
    expect(carrier.messages()).toMatchObject([
      { sid: sent.sid, body: 'Hello €', status: 'delivered' },
    ]);
  });

  it('never deduplicates, and finds what it took', async () => {
    const { carrier, gateway } = await open();
    const since = new Date();
    for (const body of ['one', 'one', 'two'])
      await gateway.sendText({ from, to, body, statusCallback: 'http://127.0.0.1:9/x' });
    expect(carrier.messages()).toHaveLength(3);
    const all = await gateway.findTexts({ from, to, since });
    expect(all.map((text) => text.body)).toEqual(['two', 'one', 'one']);
    expect(await gateway.findTexts({ from, to, since, body: 'two' })).toHaveLength(1);
    expect(await gateway.findTexts({ from, to: '+15550100000', since })).toEqual([]);
    const later = new Date(Date.now() + 60_000);
    expect(await gateway.findTexts({ from, to, since: later })).toEqual([]);
  });

  // Codes as the hosted service documents them.
  it.each([
    [magicNumbers.invalid, 'refused', 21211],
    ['0041791234567', 'refused', 21211],
    [magicNumbers.notMobile, 'refused', 21614],
    [magicNumbers.optedOut, 'refused', 21610],
    [magicNumbers.throttled, 'notTaken', 20429],
  ])('answers %s with its documented code', async (number, outcome, code) => {
    const { carrier, gateway } = await open();
    await expect(
      gateway.sendText({ from, to: number, body: 'Hi', statusCallback: 'http://127.0.0.1:9/x' }),
    ).rejects.toMatchObject({ outcome, code });
    expect(carrier.messages()).toEqual([]);
  });

  it('says after the fact that a phone cannot be reached', async () => {
    const { carrier, gateway } = await open();
    const hook = await startHook(gateway);
    await gateway.sendText({
      from,
      to: magicNumbers.unreachable,
      body: 'Hi',
      statusCallback: hook.url,
    });
    await carrier.settle();
    expect(hook.calls.at(-1)!.params).toMatchObject({
      MessageStatus: 'undelivered',
      ErrorCode: '30003',
    });
  });

  it('tells lost answers from texts never taken', async () => {
    const { carrier, gateway } = await open();
    const send = () =>
      gateway.sendText({ from, to, body: 'Hi', statusCallback: 'http://127.0.0.1:9/x' });
    carrier.switches.mode = 'acceptThenDrop';
    await expect(send()).rejects.toMatchObject({ outcome: 'unknown' });
    expect(carrier.messages()).toHaveLength(1);
    carrier.switches.mode = 'down';
    await expect(send()).rejects.toMatchObject({ outcome: 'unknown' });
    carrier.switches.mode = 'slow';
    carrier.switches.slowMs = 1500;
    await expect(send()).rejects.toMatchObject({ outcome: 'unknown' });
    carrier.switches.mode = 'throttled';
    await expect(send()).rejects.toMatchObject({ outcome: 'notTaken', code: 20429 });
    await carrier.close();
    // The kept-alive connection breaks first, which leaves it open whether the text was taken.
    await expect(send()).rejects.toMatchObject({ outcome: 'unknown' });
    await expect(send()).rejects.toMatchObject({ outcome: 'notTaken', code: null });
  });

  it('refuses a wrong sign-in without blaming the text', async () => {
    const { carrier } = await open();
    const { accountSid, url: apiOrigin } = carrier;
    const stranger = openGateway({ accountSid, authToken: 'wrong', apiOrigin });
    await expect(
      stranger.sendText({ from, to, body: 'Hi', statusCallback: 'http://127.0.0.1:9/x' }),
    ).rejects.toMatchObject({ outcome: 'notTaken', code: 20003 });
  });
});

describe('replies from fake phones', () => {
  it('arrive signed, and STOP ends texts until START', async () => {
    const { carrier, gateway } = await open();
    const hook = await startHook(gateway);
    carrier.inboundUrl = hook.url;
    const send = () => gateway.sendText({ from, to, body: 'Hi', statusCallback: hook.url });
    await expect(carrier.reply(to, 'Hello?')).rejects.toThrow(/nobody has texted/);
    await send();
    expect(await carrier.reply(to, 'Stop')).toBe(true);
    expect(hook.calls).toMatchObject([
      { valid: true, params: { Body: 'Stop', From: to, To: from, SmsStatus: 'received' } },
    ]);
    await expect(send()).rejects.toMatchObject({ outcome: 'refused', code: 21610 });
    await carrier.reply(to, 'STOP');
    await carrier.reply(to, 'start');
    await send();
    await carrier.settle();
    const thread = carrier.listThreads()[0]!;
    expect(thread.phone).toBe(to);
    expect(thread.texts.map(({ direction, body }) => `${direction} ${body.slice(0, 17)}`)).toEqual([
      'out Hi',
      'in Stop',
      'out You will get no m',
      'in STOP',
      'in start',
      'out Texts from this n',
      'out Hi',
    ]);
  });

  it('outlive a restart, half-sent texts included', async () => {
    const folder = mkdtempSync(join(tmpdir(), 'furlong-sms-'));
    undo.push(() => rmSync(folder, { recursive: true }));
    const first = await open({ folder, stepMs: 60_000 });
    await first.gateway.sendText({ from, to, body: 'Hi', statusCallback: 'http://127.0.0.1:9/x' });
    await first.carrier.reply(to, 'STOP');
    await first.carrier.close();
    appendFileSync(join(folder, 'texts.jsonl'), '\n{"sid":"SM');
    const second = await open({ folder });
    await second.carrier.settle();
    expect(second.carrier.listThreads()[0]!.texts.map((text) => text.status)).toEqual([
      'delivered',
      'received',
      'delivered',
    ]);
    await expect(
      second.gateway.sendText({ from, to, body: 'Hi', statusCallback: 'http://127.0.0.1:9/x' }),
    ).rejects.toMatchObject({ code: 21610 });
  });
});

async function open(options: Partial<FakeCarrierOptions> = {}) {
  const carrier = await startFakeCarrier({
    folder: null,
    now: () => new Date(),
    stepMs: 5,
    ...options,
  });
  undo.push(() => carrier.close());
  const { accountSid, authToken, url } = carrier;
  const gateway = openGateway({ accountSid, authToken, apiOrigin: url, timeoutMs: 1000 });
  return { carrier, gateway };
}

/** A webhook that checks signatures with the SDK and remembers what it was told. */
async function startHook(gateway: Gateway) {
  const calls: { valid: boolean; params: Record<string, string> }[] = [];
  const server = createServer(async (request, response) => {
    let body = '';
    for await (const chunk of request) body += String(chunk);
    const params = Object.fromEntries(new URLSearchParams(body));
    const signature = String(request.headers['x-twilio-signature']);
    calls.push({ valid: await gateway.validSignature(url, params, signature), params });
    response.end();
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}/hook?outbox=1`;
  undo.push(() => new Promise((resolve) => server.close(resolve)));
  return { url, calls };
}
