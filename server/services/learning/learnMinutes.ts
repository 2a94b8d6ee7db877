import { inBusiness } from '#server/db/database.ts';
import { openFit } from './openFit.ts';
import { runFit } from './runFit.ts';

/**
 * Learns from the business's finished visits and waits for it. The new fit counts only when it
 * forecasts held-out visits better than the one in force (or than the plain model); kept or not, the
 * night leaves a row. Does nothing when a fit is already under way. Not for use inside a transaction.
 */
export async function learnMinutes(businessId: string, now: Date): Promise<void> {
  const { row, isNew } = await inBusiness(businessId, () => openFit(businessId, now));
  if (isNew) await runFit(businessId, row.id);
}
