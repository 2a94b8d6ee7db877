import { notFound } from '#server/errors.ts';
import { GateOpening } from '#server/models/GateOpening.ts';
import { Household } from '#server/models/Household.ts';
import { Membership } from '#server/models/Membership.ts';
import { Site } from '#server/models/Site.ts';

export interface OpenedGate {
  household: Household;
  site: Site | null;
  /** When the person last had the code shown. */
  at: Date;
}

/**
 * Households whose gate code a person has had shown and where one is still kept, latest first: the
 * codes to change when the person leaves. Answers for people who have left, too; throws 'notFound'
 * for somebody who never was here.
 */
export async function listGateOpenings(userId: string): Promise<OpenedGate[]> {
  const openings = await GateOpening.findAll({ where: { userId }, order: [['at', 'ASC']] });
  if (openings.length === 0 && !(await Membership.findOne({ where: { userId } })))
    throw notFound('person');
  const latest = new Map(openings.map(({ householdId, at }) => [householdId, at]));
  const households = await Household.findAll({ where: { id: [...latest.keys()] } });
  const sites = await Site.findAll({
    where: { id: households.flatMap((one) => one.siteId ?? []) },
  });
  return households
    .map((household) => ({
      household,
      site: sites.find((one) => one.id === household.siteId) ?? null,
      at: latest.get(household.id)!,
    }))
    .filter(({ household, site }) => household.gateCodeSealed ?? site?.gateCodeSealed)
    .sort((a, b) => b.at.getTime() - a.at.getTime());
}
