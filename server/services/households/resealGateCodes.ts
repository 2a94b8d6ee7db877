import { Op } from 'sequelize';
import { unsafeAcrossBusinesses } from '#server/db/database.ts';
import { keyRing } from '#server/env.ts';
import { log } from '#server/log.ts';
import { Household } from '#server/models/Household.ts';
import { Site } from '#server/models/Site.ts';
import { openSeal, seal } from '#server/services/secrets/seal.ts';

const batch = 500;

/**
 * Seals gate codes of every business again that were sealed with an older key than the ring's first,
 * so that the old key can be taken out of FURLONG_KEYS. Answers how many; those whose key is missing
 * are logged and stay as they are.
 */
export async function resealGateCodes(): Promise<number> {
  return (await resealTable(Household)) + (await resealTable(Site));
}

async function resealTable(table: typeof Household | typeof Site): Promise<number> {
  const keyId = keyRing().keys[0]!.id;
  let count = 0;
  let after = '';
  for (;;) {
    const rows = await unsafeAcrossBusinesses(() =>
      (table as typeof Household).findAll({
        where: {
          id: { [Op.gt]: after || '00000000-0000-0000-0000-000000000000' },
          gateCodeSealed: { [Op.notLike]: `${keyId.replace(/_/g, '\\_')}.%` },
        },
        attributes: ['id', 'businessId', 'gateCodeSealed'],
        order: [['id', 'ASC']],
        limit: batch,
      }),
    );
    for (const row of rows) if (await reseal(table, row)) count += 1;
    if (rows.length < batch) return count;
    after = rows.at(-1)!.id;
  }
}

async function reseal(table: typeof Household | typeof Site, row: Household): Promise<boolean> {
  const place = { businessId: row.businessId, rowId: row.id, field: 'gateCode' };
  let gateCodeSealed: string;
  try {
    gateCodeSealed = seal(openSeal(row.gateCodeSealed!, place), place);
  } catch (error) {
    log.error({ err: error, rowId: row.id }, 'a gate code could not be sealed again');
    return false;
  }
  // Only while nobody has written another code meanwhile.
  const [count] = await unsafeAcrossBusinesses(() =>
    (table as typeof Household).update(
      { gateCodeSealed },
      { where: { id: row.id, gateCodeSealed: row.gateCodeSealed! } },
    ),
  );
  return count > 0;
}
