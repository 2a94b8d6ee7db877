import { notFound } from '#server/errors.ts';
import { GateOpening } from '#server/models/GateOpening.ts';
import { Household } from '#server/models/Household.ts';
import { Site } from '#server/models/Site.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { openSeal, seal } from '#server/services/secrets/seal.ts';

/** A gate code as it is stored: sealed to its row, or null. */
export function sealGateCode(
  businessId: string,
  rowId: string,
  code: string | null,
): string | null {
  return code ? seal(code, { businessId, rowId, field: 'gateCode' }) : null;
}

/** Shows the gate codes of a household and its site; who asked and when is logged. */
export async function openGate(actor: Actor, householdId: string, now: Date) {
  const household = await Household.findByPk(householdId);
  if (!household) throw notFound('household');
  const site = household.siteId ? await Site.findByPk(household.siteId) : null;
  await GateOpening.create({ householdId, userId: actor.userId, at: now });
  const open = (row: Household | Site | null) =>
    row?.gateCodeSealed
      ? openSeal(row.gateCodeSealed, {
          businessId: actor.businessId,
          rowId: row.id,
          field: 'gateCode',
        })
      : null;
  return { gateCode: open(household), siteGateCode: open(site) };
}
