import { afterCommit } from '#server/db/database.ts';
import { log } from '#server/log.ts';
import type { GroomFit } from '#server/models/GroomFit.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { openFit } from './openFit.ts';
import { runFit } from './runFit.ts';

/** Starts learning once the call has committed; a second click gets the fit already under way. */
export async function startLearning(actor: Actor, now: Date): Promise<GroomFit> {
  const { businessId } = actor;
  const { row, isNew } = await openFit(businessId, now);
  if (isNew)
    afterCommit(() => {
      runFit(businessId, row.id).catch((error: unknown) => {
        log.error({ err: error, businessId }, 'learning failed; the fit in force stays');
      });
    });
  return row;
}
