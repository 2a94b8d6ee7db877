import { inBusiness } from '#server/db/database.ts';
import { log } from '#server/log.ts';
import { Business } from '#server/models/Business.ts';
import { Household } from '#server/models/Household.ts';
import { InboundText } from '#server/models/InboundText.ts';
import { OptOut } from '#server/models/OptOut.ts';
import { OutboxText } from '#server/models/OutboxText.ts';
import { optOutWord } from '#shared/texts/optOutWord.ts';
import { isFromCarrier, type CarrierCall } from './receiveStatus.ts';

/**
 * Takes a text a phone sent to a business's number: into the household's thread, once per carrier
 * id; STOP ends texts to that phone at once, those waiting included, START resumes them. Answers
 * false, touching nothing, unless the carrier signed the call. The carrier itself confirms STOP.
 */
export async function receiveText(call: CarrierCall, now: Date): Promise<boolean> {
  if (!(await isFromCarrier(call))) return false;
  const { From: phone = '', To: sender = '', Body: body = '', MessageSid: sid = '' } = call.form;
  const business = await Business.findOne({ where: { senderPhone: sender } });
  if (!business) {
    log.warn({ sid }, 'a text came in to a number of no business');
    return true;
  }
  await inBusiness(business.id, async () => {
    const householdId = await findHousehold(sender, phone);
    const [, isNew] = await InboundText.findOrCreate({
      where: { sid },
      defaults: { householdId, sender: phone, recipient: sender, body, sid, receivedAt: now },
    });
    if (isNew) await obeyKeyword(sender, phone, body, now);
  });
  return true;
}

/** Two households may share a phone: the reply belongs to the one texted last. */
async function findHousehold(sender: string, phone: string): Promise<string | null> {
  const last = await OutboxText.findOne({
    where: { sender, recipient: phone },
    order: [
      ['createdAt', 'DESC'],
      ['id', 'DESC'],
    ],
  });
  if (last?.householdId) return last.householdId;
  return (await Household.findOne({ where: { phone }, order: ['id'] }))?.id ?? null;
}

async function obeyKeyword(sender: string, phone: string, body: string, now: Date) {
  const word = optOutWord(body);
  if (word === 'start') await OptOut.destroy({ where: { sender, phone } });
  if (word !== 'stop') return;
  await OptOut.findOrCreate({ where: { sender, phone }, defaults: { sender, phone, at: now } });
  await OutboxText.update(
    {
      status: 'notSent',
      reason: 'This phone ended texts with STOP: call instead.',
      statusAt: now,
    },
    { where: { sender, recipient: phone, status: 'waiting' } },
  );
}
