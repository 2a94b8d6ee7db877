import { OutboxText } from '#server/models/OutboxText.ts';
import type { TextKind } from '#shared/texts/renderText.ts';

/**
 * Takes back a visit's texts that have not left yet because they are no longer true (the van has
 * arrived, the visit is off), in the caller's scope and transaction. Answers how many; one that is
 * just being sent cannot be taken back.
 */
export async function dropTexts(asked: {
  visitId: string;
  kinds: readonly TextKind[];
  /** For the desk: 'The van had arrived before the text could go.' */
  reason: string;
  now: Date;
}): Promise<number> {
  const { visitId, kinds, reason, now } = asked;
  const [count] = await OutboxText.update(
    { status: 'stale', reason, statusAt: now },
    { where: { visitId, kind: [...kinds], status: 'waiting' } },
  );
  return count;
}
