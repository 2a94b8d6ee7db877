import type { z } from 'zod';
import type { listTexts, textStatus } from '#shared/api/texts.ts';
import type { ChipTone } from '#src/components/Chip.tsx';

export type TextLine = z.infer<typeof listTexts.response>[number];
export type TextStatus = z.infer<typeof textStatus>;

/** A status in words, with the tone that says whether somebody has to do something. */
export const statusLook: Record<TextStatus, { words: string; tone: ChipTone }> = {
  waiting: { words: 'waiting to go out', tone: 'plain' },
  attempting: { words: 'going out', tone: 'plain' },
  queued: { words: 'with the carrier', tone: 'plain' },
  sent: { words: 'sent', tone: 'plain' },
  delivered: { words: 'delivered', tone: 'ok' },
  undelivered: { words: 'not delivered: call', tone: 'bad' },
  failed: { words: 'failed: call', tone: 'bad' },
  stale: { words: 'too late to send', tone: 'heed' },
  notSent: { words: 'not sent', tone: 'heed' },
};

const kindWords: Record<string, string> = {
  onTheWay: 'on the way',
  booked: 'booked',
  reminder: 'reminder',
  reply: 'reply',
  inbound: 'reply',
  stop: 'STOP',
  start: 'START',
};

/** 'on the way' of 'onTheWay'; a kind this page does not know is shown as it is. */
export function textKindWords(kind: string): string {
  return kindWords[kind] ?? kind;
}
