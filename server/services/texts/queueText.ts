import { Op, UniqueConstraintError } from 'sequelize';
import { notFound } from '#server/errors.ts';
import { Business } from '#server/models/Business.ts';
import { Household } from '#server/models/Household.ts';
import { OptOut } from '#server/models/OptOut.ts';
import { OutboxText } from '#server/models/OutboxText.ts';
import { currentGateway } from '#server/sms/gateway.ts';
import { renderText, type TextFields, type TextKind } from '#shared/texts/renderText.ts';
import { staleAt } from '#shared/texts/staleAt.ts';
import { senderPhoneOf } from './senderPhoneOf.ts';
import { currentTextRules } from './textRules.ts';

export interface QueueTextInput<Kind extends TextKind> {
  householdId: string;
  /** null for texts about no visit; those are never taken for the same text twice. */
  visitId: string | null;
  kind: Kind;
  /** Version of the promise it speaks about: a new promise may be told again. */
  promiseVersion: number;
  fields: Omit<TextFields[Kind], 'businessName'>;
  now: Date;
  /** When it should leave; `now` when absent. */
  dueAt?: Date;
  /** When its words stop being true: late end of an arrival, start of a promise. */
  until?: Date | null;
}

/**
 * Writes one text into the outbox, in the caller's scope and transaction: it leaves only if the
 * caller's change is kept. The same text (visit, kind, promise, phone) is written once; asking
 * again answers the row there is. Without consent, phone or carrier the row says so and nothing
 * goes. Throws 'notFound' for another business's household.
 */
export async function queueText<Kind extends TextKind>(
  input: QueueTextInput<Kind>,
): Promise<OutboxText> {
  const { householdId, visitId, kind, promiseVersion, now, dueAt = now, until = null } = input;
  const household = await Household.findByPk(householdId);
  if (!household) throw notFound('household');
  const business = (await Business.findByPk(household.businessId))!;
  const sender = (await senderPhoneOf(business)) ?? '';
  const recipient = household.phone ?? '';
  const reason = await whyQuiet(household, sender, now);
  const fields = { ...input.fields, businessName: business.name } as unknown as TextFields[Kind];
  const state = {
    sender,
    body: renderText(kind, fields),
    status: reason === null ? ('waiting' as const) : ('notSent' as const),
    reason,
    dueAt,
    staleAfter: new Date(staleAt(kind, dueAt.getTime(), until?.getTime() ?? null)),
    statusAt: now,
  };
  const key = { visitId, kind, promiseVersion, recipient };
  const known = await findKnown(key, false);
  if (known) return known.status === 'notSent' ? known.update(state) : known;
  try {
    return await OutboxText.create({ ...key, ...state, householdId, createdAt: now });
  } catch (error) {
    // Another process wrote the same text between our look and our write.
    if (!(error instanceof UniqueConstraintError)) throw error;
    return (await findKnown(key, true))!;
  }
}

type Key = Pick<OutboxText, 'visitId' | 'kind' | 'promiseVersion' | 'recipient'>;

/**
 * Locking also sees rows committed after this transaction began. The first look must not lock: on
 * a row that is not there it would lock the gap, and texts of other visits would wait for each other.
 */
async function findKnown(key: Key, lock: boolean): Promise<OutboxText | null> {
  return key.visitId === null ? null : OutboxText.findOne({ where: { ...key }, lock });
}

async function whyQuiet(household: Household, sender: string, now: Date): Promise<string | null> {
  if (household.phone === null) return 'No phone number: call or write instead.';
  if (!household.textsConsent) return 'No consent to texts: call instead.';
  if (!currentGateway()) return 'No SMS carrier is connected.';
  if (sender === '') return 'The business has no number to text from.';
  const optOut = await OptOut.findOne({ where: { sender, phone: household.phone } });
  return optOut
    ? 'This phone ended texts with STOP: call instead.'
    : againstRules(household.phone, now);
}

/** With a real carrier: other countries, and more texts than a day's. The count may be out by a few. */
async function againstRules(phone: string, now: Date): Promise<string | null> {
  const rules = currentTextRules();
  if (!rules) return null;
  if (!rules.prefixes.some((prefix) => phone.startsWith(prefix)))
    return 'Texts to this country are not allowed here: call instead.';
  const since = new Date(now.getTime() - 86_400_000);
  const sent = await OutboxText.count({
    where: { createdAt: { [Op.gt]: since }, status: { [Op.ne]: 'notSent' } },
  });
  return sent < rules.perDay
    ? null
    : `All ${rules.perDay} texts the business may send in a day are used: call instead.`;
}
