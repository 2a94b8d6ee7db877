import { optOutWord } from '#shared/texts/optOutWord.ts';
import type { FakeMessage } from './FakeMessage.ts';

/** Who ended texts from which number, as 'sender phone', replayed from the messages kept. */
export function optOutsOf(messages: readonly FakeMessage[]): Set<string> {
  const optOuts = new Set<string>();
  for (const message of messages)
    if (message.direction === 'inbound') keywordReply(optOuts, message);
  return optOuts;
}

/**
 * What the carrier itself answers to a keyword, keeping `optOuts` true; null for other replies. A
 * confirmation comes once: STOP from someone who already ended texts is silent.
 */
export function keywordReply(optOuts: Set<string>, inbound: FakeMessage): string | null {
  const key = `${inbound.to} ${inbound.from}`;
  switch (optOutWord(inbound.body)) {
    case 'stop':
      if (optOuts.has(key)) return null;
      optOuts.add(key);
      return 'You will get no more texts from this number. Reply START to get them again.';
    case 'start':
      if (!optOuts.delete(key)) return null;
      return 'Texts from this number are on again. Reply STOP to end them.';
    case 'help':
      return 'Texts about your grooming visits. Reply STOP to end them.';
    case null:
      return null;
  }
}
