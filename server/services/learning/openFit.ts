import { Business } from '#server/models/Business.ts';
import { GroomFit } from '#server/models/GroomFit.ts';

/** A fit takes seconds; a row that works longer than this lost its process. */
export const leaseMs = 120_000;

/**
 * The row of a new fit, or of the one under way: a business learns one at a time, in whatever process.
 * `isNew` tells whether the caller is to run it once this is committed.
 */
export async function openFit(
  businessId: string,
  now: Date,
): Promise<{ row: GroomFit; isNew: boolean }> {
  // Two calls at once must not both find nothing under way.
  await Business.findByPk(businessId, { lock: true });
  const working = await GroomFit.findOne({
    where: { state: 'working' },
    order: [['fittedAt', 'DESC']],
    attributes: { exclude: ['pair'] },
  });
  if (working?.leaseUntil && working.leaseUntil > now) return { row: working, isNew: false };
  if (working)
    await GroomFit.update({ state: 'failed', leaseUntil: null }, { where: { state: 'working' } });
  const row = await GroomFit.create({
    state: 'working',
    fittedAt: now,
    leaseUntil: new Date(now.getTime() + leaseMs),
    modelVersion: '',
    records: 0,
    leftOut: 0,
    heldOut: 0,
    beforeSeconds: 0,
    afterSeconds: 0,
    kept: false,
    pair: null,
  });
  return { row, isNew: true };
}
