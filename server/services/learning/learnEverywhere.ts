import { inTransaction } from '#server/db/database.ts';
import { log } from '#server/log.ts';
import { Business } from '#server/models/Business.ts';
import { learnMinutes } from './learnMinutes.ts';

/** One night: every business in turn; one that fails does not keep the others from learning. */
export async function learnEverywhere(now: Date): Promise<void> {
  const businesses = await inTransaction(() =>
    Business.findAll({ attributes: ['id'], order: [['id', 'ASC']] }),
  );
  for (const { id } of businesses) {
    try {
      await learnMinutes(id, now);
    } catch (error) {
      log.error({ err: error, businessId: id }, 'learning failed; the fit in force stays');
    }
  }
}
