import type { Household } from '#server/models/Household.ts';
import { InboundText } from '#server/models/InboundText.ts';
import type { OutboxText } from '#server/models/OutboxText.ts';

/** A line of a thread as the contract shows it. */
export function presentText(line: { text: OutboxText | InboundText; household: Household | null }) {
  const { text, household } = line;
  const whose = { householdId: text.householdId, householdName: household?.name ?? null };
  if (text instanceof InboundText)
    return {
      id: text.id,
      direction: 'in' as const,
      kind: 'reply',
      body: text.body,
      at: text.receivedAt.toISOString(),
      status: 'delivered' as const,
      reason: null,
      phone: text.sender,
      ...whose,
    };
  return {
    id: text.id,
    direction: 'out' as const,
    kind: text.kind,
    body: text.body,
    at: text.createdAt.toISOString(),
    status: text.status,
    reason: text.reason,
    phone: text.recipient,
    ...whose,
  };
}
