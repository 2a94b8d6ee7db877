import type { FakeMessage, FakeStatus } from './FakeMessage.ts';
import type { FakeSwitches } from './FakeSwitches.ts';
import type { MessageStore } from './openMessageStore.ts';
import { postWebhook } from './postWebhook.ts';
import { deliveryError } from './refusals.ts';

export interface Delivery {
  begin(message: FakeMessage): void;
  settle(): Promise<void>;
  stop(): void;
}

/**
 * Walks accepted messages from queued over sent to delivered (or undelivered), one step after
 * another, with a signed callback for each step; none for the first status, as documented.
 * Messages a stopped server left half-way go on.
 */
export function openDelivery(parts: {
  store: MessageStore;
  account: { accountSid: string; authToken: string };
  now: () => Date;
  stepMs: number;
  switches: FakeSwitches;
}): Delivery {
  const { store, account, now, stepMs, switches } = parts;
  const running = new Map<string, { timer: NodeJS.Timeout; step: () => Promise<void> }>();
  const calls = new Set<Promise<unknown>>();
  const held = new Map<string, (() => Promise<unknown>)[]>();

  const call = async (message: FakeMessage) => {
    if (message.statusCallback === null) return;
    const url = message.statusCallback;
    const form = callbackForm(message, account.accountSid);
    const post = () => postWebhook(account.authToken, url, form);
    if (switches.callbacks === 'reversed') {
      const list = [post, ...(held.get(message.sid) ?? [])];
      held.set(message.sid, list);
      if (isLast(message.status)) for (const one of list) await one();
      return;
    }
    await post();
    if (switches.callbacks === 'duplicate') await post();
  };

  const schedule = (sid: string) => {
    const step = async () => {
      running.delete(sid);
      const message = store.find(sid);
      if (!message || isLast(message.status)) return;
      const at = now().toISOString();
      const errorCode = message.status === 'sent' ? deliveryError(message.to) : null;
      const status = nextStatus(message.status, errorCode);
      const moved = { ...message, status, errorCode, sentAt: message.sentAt ?? at, updatedAt: at };
      store.put(moved);
      const made = call(moved);
      calls.add(made);
      await made.finally(() => calls.delete(made));
      if (!isLast(status)) schedule(sid);
    };
    const timer = setTimeout(() => void step(), stepMs);
    timer.unref();
    running.set(sid, { timer, step });
  };

  for (const message of store.all()) if (!isLast(message.status)) schedule(message.sid);
  return {
    begin: (message) => schedule(message.sid),
    async settle() {
      while (running.size > 0 || calls.size > 0) {
        for (const { timer, step } of Array.from(running.values())) {
          clearTimeout(timer);
          await step();
        }
        await Promise.all(calls);
      }
    },
    stop() {
      for (const { timer } of running.values()) clearTimeout(timer);
      running.clear();
    },
  };
}

function nextStatus(status: FakeStatus, errorCode: number | null): FakeStatus {
  if (status === 'queued') return 'sent';
  return errorCode === null ? 'delivered' : 'undelivered';
}

function isLast(status: FakeStatus): boolean {
  return status !== 'queued' && status !== 'sent';
}

function callbackForm(message: FakeMessage, accountSid: string): Record<string, string> {
  return {
    AccountSid: accountSid,
    ApiVersion: '2010-04-01',
    From: message.from,
    MessageSid: message.sid,
    MessageStatus: message.status,
    SmsSid: message.sid,
    SmsStatus: message.status,
    To: message.to,
    ...(message.errorCode === null ? {} : { ErrorCode: String(message.errorCode) }),
  };
}
