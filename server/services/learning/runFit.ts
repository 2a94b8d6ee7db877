import { Op } from 'sequelize';
import { inBusiness } from '#server/db/database.ts';
import { GroomFit } from '#server/models/GroomFit.ts';
import { learnInWorker } from './learnInWorker.ts';
import { loadRecords } from './loadRecords.ts';

/** Kept fits whose effects stay at hand; older rows keep their figures only. */
const pairsHeld = 5;

/**
 * Does the learning of an opened row and writes what came of it. Reading and writing are two
 * transactions and none stays open over the arithmetic. What breaks off leaves the row failed, the fit
 * in force as it was, and throws.
 */
export async function runFit(businessId: string, fitId: string): Promise<void> {
  try {
    const { records, kept } = await inBusiness(
      businessId,
      async () => {
        const newest = await GroomFit.findOne({
          where: { kept: true, pair: { [Op.ne]: null } },
          order: [['fittedAt', 'DESC']],
        });
        return { records: await loadRecords(businessId), kept: newest?.pair ?? null };
      },
      { onlyReads: true },
    );
    const { pair, trial } = await learnInWorker({ records, kept });
    await close(businessId, fitId, {
      state: 'done',
      modelVersion: pair.fit.version,
      records: pair.fit.records,
      leftOut: pair.fit.leftOut,
      heldOut: trial.records,
      beforeSeconds: Math.round(trial.beforeSeconds),
      afterSeconds: Math.round(trial.afterSeconds),
      kept: trial.keep,
      pair: trial.keep ? pair : null,
    });
  } catch (error) {
    await close(businessId, fitId, { state: 'failed' });
    throw error;
  }
}

/** A row whose lease was taken over stays as it is: the later fit has the word. */
function close(businessId: string, fitId: string, result: Partial<GroomFit>): Promise<void> {
  return inBusiness(businessId, async () => {
    const [count] = await GroomFit.update(
      { ...result, leaseUntil: null },
      { where: { id: fitId, state: 'working' } },
    );
    if (count > 0 && result.kept) await dropOldPairs();
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
