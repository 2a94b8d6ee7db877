import { AppError, notFound } from '#server/errors.ts';
import { GateOpening } from '#server/models/GateOpening.ts';
import { Household } from '#server/models/Household.ts';
import { Run } from '#server/models/Run.ts';
import { Site } from '#server/models/Site.ts';
import { Visit } from '#server/models/Visit.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { today } from '#server/services/days/today.ts';
import { sentVersion } from '#server/services/runs/getRun.ts';
import { isDesk } from '#server/services/runs/needRun.ts';
import { openSeal, seal } from '#server/services/secrets/seal.ts';

/** A gate code as it is stored: sealed to its row, or null. */
export function sealGateCode(
  businessId: string,
  rowId: string,
  code: string | null,
): string | null {
  return code ? seal(code, { businessId, rowId, field: 'gateCode' }) : null;
}

/**
 * Shows the gate codes of a household and its site; who asked and when is logged. Throws
 * 'notAllowed' for a groomer who is not there today: codes are for the door one stands at.
 */
export async function openGate(actor: Actor, householdId: string, now: Date) {
  const household = await Household.findByPk(householdId);
  if (!household) throw notFound('household');
  if (!isDesk(actor) && !(await isThereToday(actor, householdId, now)))
    throw new AppError(
      'notAllowed',
      'Gate codes show on the day of the visit, to the groomer whose run it is on. Ask the desk.',
    );
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

/** True when the household is on the groomer's run of today, as sent or as drafted since. */
async function isThereToday(actor: Actor, householdId: string, now: Date): Promise<boolean> {
  if (actor.groomerId === null) return false;
  const date = await today(actor.businessId, now);
  const visits = await Visit.findAll({
    where: { householdId, date },
    attributes: ['id', 'businessId'],
  });
  const runs = await Run.findAll({ where: { date, groomerId: actor.groomerId } });
  const versions = await Promise.all(runs.map(sentVersion));
  const stops = [
    ...runs.flatMap((run) => run.stops),
    ...versions.flatMap((version) => version?.plan.runs.flatMap((run) => run.stops) ?? []),
  ];
  return visits.some((visit) => stops.some((stop) => stop.id === visit.id));
}
