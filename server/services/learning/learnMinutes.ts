import { Op } from 'sequelize';
import { inBusiness } from '#server/db/database.ts';
import { GroomFit } from '#server/models/GroomFit.ts';
import { learnInWorker } from './learnInWorker.ts';
import { loadRecords } from './loadRecords.ts';

/** Kept fits whose effects stay at hand; older rows keep their figures only. */
const pairsHeld = 5;

/**
 * Learns from the business's finished visits. The new fit counts only when it forecasts held-out
 * visits better than the one in force (or than the plain model). Kept or not, the night leaves a row.
 * At night reading and writing are two transactions and none stays open over the arithmetic; on demand
 * the call's own transaction goes around all of it, holding no locks until the row is written.
 */
export async function learnMinutes(businessId: string, now: Date): Promise<GroomFit> {
  const { records, kept } = await inBusiness(businessId, async () => {
    const newest = await GroomFit.findOne({
      where: { kept: true, pair: { [Op.ne]: null } },
      order: [['fittedAt', 'DESC']],
    });
    return { records: await loadRecords(businessId), kept: newest?.pair ?? null };
  });
  const { pair, trial } = await learnInWorker({ records, kept });
  return inBusiness(businessId, async () => {
    const row = await GroomFit.create({
      fittedAt: now,
      modelVersion: pair.fit.version,
      records: pair.fit.records,
      leftOut: pair.fit.leftOut,
      heldOut: trial.records,
      beforeSeconds: Math.round(trial.beforeSeconds),
      afterSeconds: Math.round(trial.afterSeconds),
      kept: trial.keep,
      pair: trial.keep ? pair : null,
    });
    if (trial.keep) await dropOldPairs();
    return row;
  });
}

async function dropOldPairs(): Promise<void> {
  const held = await GroomFit.findAll({
    where: { kept: true },
    order: [['fittedAt', 'DESC']],
    attributes: ['id', 'businessId'],
    limit: pairsHeld,
  });
  await GroomFit.update(
    { pair: null },
    { where: { id: { [Op.notIn]: held.map(({ id }) => id) }, pair: { [Op.ne]: null } } },
  );
}
