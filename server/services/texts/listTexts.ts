import { Op } from 'sequelize';
import { Household } from '#server/models/Household.ts';
import { InboundText } from '#server/models/InboundText.ts';
import { OutboxText } from '#server/models/OutboxText.ts';

/** One line of the business's texts, out or in, with the household it belongs to. */
export interface TextLine {
  text: OutboxText | InboundText;
  household: Household | null;
}

/** Latest texts of the business in scope, newest first; of one household when named. */
export async function listTexts(asked: {
  householdId?: string | undefined;
  limit: number;
}): Promise<TextLine[]> {
  const { householdId, limit } = asked;
  const where = householdId === undefined ? {} : { householdId };
  const [out, inbound] = await Promise.all([
    OutboxText.findAll({ where: { ...where }, order: [['createdAt', 'DESC']], limit }),
    InboundText.findAll({ where: { ...where }, order: [['receivedAt', 'DESC']], limit }),
  ]);
  const texts = [...out, ...inbound].sort((a, b) => timeOf(b) - timeOf(a)).slice(0, limit);
  const ids = [...new Set(texts.flatMap((text) => text.householdId ?? []))];
  const households = await Household.findAll({ where: { id: { [Op.in]: ids } } });
  const byId = new Map(households.map((household) => [household.id, household]));
  return texts.map((text) => ({ text, household: byId.get(text.householdId ?? '') ?? null }));
}

function timeOf(text: OutboxText | InboundText): number {
  return (text instanceof OutboxText ? text.createdAt : text.receivedAt).getTime();
}
