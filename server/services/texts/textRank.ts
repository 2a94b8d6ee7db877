import type { TextStatus } from '#server/models/OutboxText.ts';

const ranks: Record<TextStatus, number> = {
  waiting: 0,
  attempting: 1,
  queued: 2,
  sent: 3,
  notSent: 4,
  stale: 4,
  failed: 4,
  undelivered: 4,
  delivered: 5,
};

/** Callbacks come in any order: a status counts only when it is further along than the one known. */
export function isForward(from: TextStatus, to: TextStatus): boolean {
  return ranks[to] > ranks[from];
}

/** Our word for a carrier's status, or null for one that tells nothing new. */
export function statusOfCarrier(status: string): TextStatus | null {
  switch (status) {
    case 'accepted':
    case 'scheduled':
    case 'queued':
    case 'sending':
      return 'queued';
    case 'sent':
      return 'sent';
    case 'delivered':
    case 'read':
      return 'delivered';
    case 'undelivered':
      return 'undelivered';
    case 'failed':
    case 'canceled':
      return 'failed';
    default:
      return null;
  }
}
