import { Op } from 'sequelize';
import { unsafeAcrossBusinesses } from '#server/db/database.ts';
import { claimDueTexts } from '#server/db/raw/claimDueTexts.ts';
import { log } from '#server/log.ts';
import { OptOut } from '#server/models/OptOut.ts';
import { OutboxText } from '#server/models/OutboxText.ts';
import { CarrierError } from '#server/sms/CarrierError.ts';
import { currentGateway, type Gateway } from '#server/sms/gateway.ts';
import { callbackUrl } from './callbackUrl.ts';
import { moveText } from './moveText.ts';
import { nextTryMs } from './nextTryMs.ts';
import { statusOfCarrier } from './textRank.ts';

export interface Tick {
  now: Date;
  /** Uniform in [0, 1). */
  dice: () => number;
  /** Where the carrier calls back, without a slash at the end. */
  origin: string;
}

const batch = 25;
/** Longer than any call to the carrier: past it the process that held the lease is gone. */
const leaseMs = 60_000;
/** A carrier's list may lag behind what it accepted. */
const absentAfterMs = 2 * 60_000;
const lookAgainMs = 10_000;

/**
 * Sends the texts whose turn it is, one batch; answers how many it claimed. Each is committed as
 * `attempting` before the carrier is called. When an answer is lost, the carrier's own list is
 * asked before a second try. Safe to run in several processes at once.
 */
export async function sendDueTexts(tick: Tick): Promise<number> {
  const gateway = currentGateway();
  if (!gateway) return 0;
  const claimed = await claim(tick.now);
  await Promise.all(
    claimed.map(async ({ text, isLost }) => {
      try {
        if (!isLost || (await isAbsent(gateway, text, tick))) await attempt(gateway, text, tick);
      } catch (error) {
        // The row keeps its lease and is looked at again; the others must not suffer.
        log.error({ err: error, outboxId: text.id }, 'a text could not be handled');
      }
    }),
  );
  return claimed.length;
}

async function claim(now: Date): Promise<{ text: OutboxText; isLost: boolean }[]> {
  return unsafeAcrossBusinesses(async () => {
    const ids = await claimDueTexts(now, batch);
    const texts = await OutboxText.findAll({
      where: { id: { [Op.in]: ids } },
      order: ['dueAt', 'id'],
    });
    const claimed: { text: OutboxText; isLost: boolean }[] = [];
    for (const text of texts) {
      const isLost = text.status === 'attempting';
      if (!isLost && (await isDropped(text, now))) continue;
      await text.update({
        status: 'attempting',
        leaseUntil: new Date(now.getTime() + leaseMs),
        ...(isLost ? {} : { attempts: text.attempts + 1, attemptedAt: now, statusAt: now }),
      });
      claimed.push({ text, isLost });
    }
    return claimed;
  });
}

/** Ends a text that must not leave any more. */
async function isDropped(text: OutboxText, now: Date): Promise<boolean> {
  const { businessId, sender, recipient: phone } = text;
  if (text.staleAfter <= now) {
    await text.update({ status: 'stale', reason: 'Too late to be of use.', statusAt: now });
    return true;
  }
  if (!(await OptOut.findOne({ where: { businessId, sender, phone } }))) return false;
  const reason = 'This phone ended texts with STOP: call instead.';
  await text.update({ status: 'notSent', reason, statusAt: now });
  return true;
}

async function attempt(gateway: Gateway, text: OutboxText, { now, dice, origin }: Tick) {
  const { sender: from, recipient: to, body } = text;
  try {
    const statusCallback = callbackUrl(origin, text.id);
    const { sid, status } = await gateway.sendText({ from, to, body, statusCallback });
    await moveText(text.id, { status: statusOfCarrier(status) ?? 'queued', sid, code: null }, now);
  } catch (error) {
    if (!(error instanceof CarrierError)) throw error;
    const { outcome, code } = error;
    if (outcome === 'refused') await moveText(text.id, { status: 'failed', sid: null, code }, now);
    else if (outcome === 'notTaken')
      await holdBack(text.id, 'waiting', now, nextTryMs(text.attempts, dice));
    else await holdBack(text.id, 'attempting', now, lookAgainMs);
  }
}

/**
 * Looks a lost text up at the carrier. True when it is surely not there and may be tried again,
 * which this claims; otherwise the row has been moved on or held back.
 */
async function isAbsent(gateway: Gateway, text: OutboxText, { now }: Tick): Promise<boolean> {
  const isStale = text.staleAfter <= now;
  let found;
  try {
    found = await gateway.findTexts({
      from: text.sender,
      to: text.recipient,
      body: text.body,
      since: new Date(text.createdAt.getTime() - absentAfterMs),
    });
  } catch (error) {
    if (!(error instanceof CarrierError)) throw error;
    if (isStale)
      await endLost(text.id, 'failed', 'Nobody knows whether this text went: call.', now);
    else await holdBack(text.id, 'attempting', now, lookAgainMs);
    return false;
  }
  const others = await unsafeAcrossBusinesses(() =>
    OutboxText.findAll({ where: { sid: { [Op.in]: found.map(({ sid }) => sid) } } }),
  );
  const mine = found.find(({ sid }) => !others.some((o) => o.sid === sid && o.id !== text.id));
  if (mine) {
    const status = statusOfCarrier(mine.status) ?? 'queued';
    await moveText(text.id, { status, sid: mine.sid, code: mine.errorCode }, now);
    return false;
  }
  if (now.getTime() < (text.attemptedAt ?? text.createdAt).getTime() + absentAfterMs) {
    await holdBack(text.id, 'attempting', now, lookAgainMs);
    return false;
  }
  if (isStale) {
    await endLost(text.id, 'stale', 'Too late to be of use.', now);
    return false;
  }
  return unsafeAcrossBusinesses(async () => {
    const row = await OutboxText.findByPk(text.id, { lock: true });
    if (row?.status !== 'attempting') return false;
    await row.update({ attempts: row.attempts + 1, attemptedAt: now });
    return true;
  });
}

/** Sets when a text is looked at next, unless a callback has meanwhile moved it on. */
async function holdBack(id: string, status: 'waiting' | 'attempting', now: Date, ms: number) {
  await unsafeAcrossBusinesses(() =>
    OutboxText.update(
      { status, leaseUntil: new Date(now.getTime() + ms), statusAt: now },
      { where: { id, status: 'attempting' } },
    ),
  );
}

async function endLost(id: string, status: 'stale' | 'failed', reason: string, now: Date) {
  await unsafeAcrossBusinesses(() =>
    OutboxText.update({ status, reason, statusAt: now }, { where: { id, status: 'attempting' } }),
  );
}
