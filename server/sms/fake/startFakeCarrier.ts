import { randomBytes } from 'node:crypto';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { openDelivery } from './openDelivery.ts';
import type { FakeMessage } from './FakeMessage.ts';
import type { FakeSwitches } from './FakeSwitches.ts';
import { listThreads, type FakeThread } from './listThreads.ts';
import { answerMessages, refuse, type Answer } from './messagesResource.ts';
import { openMessageStore } from './openMessageStore.ts';
import { keywordReply, optOutsOf } from './optOutsOf.ts';
import { postWebhook } from './postWebhook.ts';
import { refusalFor, throttled, type Refusal } from './refusals.ts';

export interface FakeCarrierOptions {
  /** Where messages are kept over restarts; null keeps them in memory. */
  folder: string | null;
  now: () => Date;
  /** Milliseconds between two statuses of a message. */
  stepMs?: number;
  /** Address inbound texts are posted to, as the app's webhook sees itself. */
  inboundUrl?: string;
  port?: number;
}

export interface FakeCarrier {
  url: string;
  accountSid: string;
  authToken: string;
  switches: FakeSwitches;
  inboundUrl: string | null;
  messages(): FakeMessage[];
  listThreads(): FakeThread[];
  /**
   * Types a reply on a phone: a signed inbound webhook to whoever texted it last. Answers whether
   * the app took it; throws a RangeError when nobody texted this phone.
   */
  reply(phone: string, body: string): Promise<boolean>;
  /** Moves every message to its last status now, with all callbacks made. */
  settle(): Promise<void>;
  close(): Promise<void>;
}

/**
 * Starts a stand-in for the hosted SMS service on a loopback port: the messages resource behind
 * basic auth, statuses in time order with signed callbacks, documented errors. Like the real one
 * it never deduplicates.
 */
export async function startFakeCarrier(options: FakeCarrierOptions): Promise<FakeCarrier> {
  const { now } = options;
  const accountSid = `AC${'fa'.repeat(16)}`;
  const authToken = randomBytes(16).toString('hex');
  const store = openMessageStore(options.folder);
  const optOuts = optOutsOf(store.all());
  const switches: FakeSwitches = { mode: 'fine', slowMs: 2000, callbacks: 'inOrder' };
  const delivery = openDelivery({
    store,
    account: { accountSid, authToken },
    now,
    stepMs: options.stepMs ?? 400,
    switches,
  });

  const make = (fields: Pick<FakeMessage, 'direction' | 'from' | 'to' | 'body' | 'status'>) => {
    const at = now().toISOString();
    const message: FakeMessage = {
      sid: `SM${randomBytes(16).toString('hex')}`,
      ...fields,
      errorCode: null,
      statusCallback: null,
      createdAt: at,
      sentAt: fields.status === 'queued' ? null : at,
      updatedAt: at,
    };
    store.put(message);
    return message;
  };

  const create = (form: URLSearchParams): FakeMessage | Refusal => {
    const field = (name: string) => form.get(name) ?? '';
    const asked = { to: field('To'), from: field('From'), body: field('Body') };
    const refusal = refusalFor(asked, (phone, sender) => optOuts.has(`${sender} ${phone}`));
    if (refusal) return refusal;
    const message = make({ direction: 'outbound-api', ...asked, status: 'queued' });
    const withCallback = { ...message, statusCallback: form.get('StatusCallback') };
    store.put(withCallback);
    delivery.begin(withCallback);
    return withCallback;
  };

  const server = createServer(async (request, response) => {
    const { mode, slowMs } = switches;
    if (mode === 'down') return void request.socket.destroy();
    if (mode === 'slow') await new Promise((resolve) => setTimeout(resolve, slowMs));
    const isPost = request.method === 'POST';
    let answer: Answer;
    if (mode === 'throttled' && isPost) answer = refuse(throttled);
    else answer = await answerMessages(request, { accountSid, authToken }, store, create);
    if (mode === 'acceptThenDrop' && answer.made) return void request.socket.destroy();
    response.writeHead(answer.status, { 'Content-Type': 'application/json' });
    response.end(JSON.stringify(answer.json));
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(options.port ?? 0, '127.0.0.1', resolve);
  });

  const carrier: FakeCarrier = {
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    accountSid,
    authToken,
    switches,
    inboundUrl: options.inboundUrl ?? null,
    messages: () => store.all(),
    listThreads: () => listThreads(store.all()),
    async reply(phone, body) {
      const last = store.all().findLast((message) => message.to === phone);
      if (!last) throw new RangeError(`phone: nobody has texted ${phone} yet; send a text first`);
      const inbound = make({
        direction: 'inbound',
        from: phone,
        to: last.from,
        body,
        status: 'received',
      });
      const answer = keywordReply(optOuts, inbound);
      if (answer !== null)
        delivery.begin(
          make({
            direction: 'outbound-reply',
            from: last.from,
            to: phone,
            body: answer,
            status: 'queued',
          }),
        );
      if (carrier.inboundUrl === null) return false;
      return postWebhook(authToken, carrier.inboundUrl, inboundForm(inbound, accountSid));
    },
    settle: () => delivery.settle(),
    async close() {
      delivery.stop();
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
    },
  };
  return carrier;
}

function inboundForm(message: FakeMessage, accountSid: string): Record<string, string> {
  return {
    AccountSid: accountSid,
    ApiVersion: '2010-04-01',
    Body: message.body,
    From: message.from,
    MessageSid: message.sid,
    NumMedia: '0',
    NumSegments: '1',
    SmsMessageSid: message.sid,
    SmsSid: message.sid,
    SmsStatus: 'received',
    To: message.to,
  };
}
