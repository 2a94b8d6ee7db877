import { createHash } from 'node:crypto';
import { Business } from '#server/models/Business.ts';
import { currentFake } from './openCarriers.ts';

/**
 * The number a business's texts come from, or null when it has none. With the fake carrier a number
 * is allotted on first use, from the range 555-0100 to 555-0199 that is kept for made-up numbers.
 */
export async function senderPhoneOf(business: Business): Promise<string | null> {
  if (business.senderPhone !== null || !currentFake()) return business.senderPhone;
  for (let attempt = 0; ; attempt += 1) {
    const digest = createHash('sha256').update(`${business.id} ${attempt}`).digest();
    const area = 200 + (digest.readUInt16BE(0) % 790);
    const senderPhone = `+1${area}55501${String(digest[2]! % 100).padStart(2, '0')}`;
    if (await Business.findOne({ where: { senderPhone } })) continue;
    await business.update({ senderPhone });
    return senderPhone;
  }
}
