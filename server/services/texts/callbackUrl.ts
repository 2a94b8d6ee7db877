import { signatureFits, signValue } from '#server/services/secrets/tokens.ts';

/**
 * Where the carrier reports a text's status. It carries the outbox row's own id, signed by us, so a
 * lost answer comes home even though its sid was never learned.
 */
export function callbackUrl(origin: string, outboxId: string): string {
  return `${origin}/hooks/sms/status?text=${outboxId}&mark=${signValue('outbox', outboxId)}`;
}

/** The outbox id a callback names, or null when we did not sign it. */
export function readCallback(query: { text?: unknown; mark?: unknown }): string | null {
  const { text, mark } = query;
  if (typeof text !== 'string' || typeof mark !== 'string') return null;
  return signatureFits('outbox', text, mark) ? text : null;
}
