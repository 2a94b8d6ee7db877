import { unsafeAcrossBusinesses } from '#server/db/database.ts';
import { OptOut } from '#server/models/OptOut.ts';
import { OutboxText, type TextStatus } from '#server/models/OutboxText.ts';
import { carrierCodeWords } from '#server/sms/carrierCodes.ts';
import { isForward } from './textRank.ts';

/**
 * Takes in what the carrier said of a text: moves its status forward, never back, and keeps the
 * carrier's id. Answers the row, or null when there is none.
 */
export async function moveText(
  id: string,
  said: { status: TextStatus; sid: string | null; code: number | null },
  now: Date,
): Promise<OutboxText | null> {
  return unsafeAcrossBusinesses(async () => {
    const text = await OutboxText.findByPk(id, { lock: true });
    if (!text) return null;
    if (said.sid !== null && text.sid === null) text.sid = said.sid;
    if (isForward(text.status, said.status)) {
      text.status = said.status;
      text.statusAt = now;
      text.leaseUntil = null;
      const isBad = said.status === 'failed' || said.status === 'undelivered';
      text.reason = isBad ? carrierCodeWords(said.code) : null;
    }
    if (said.code === 21610) await noteOptOut(text, now);
    return text.save();
  });
}

/** The carrier knows of a STOP we have not heard: believe it. */
async function noteOptOut(text: OutboxText, now: Date): Promise<void> {
  const { businessId, sender, recipient: phone } = text;
  await OptOut.findOrCreate({
    where: { businessId, sender, phone },
    defaults: { businessId, sender, phone, at: now },
  });
}
