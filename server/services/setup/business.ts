import { UniqueConstraintError } from 'sequelize';
import { areaFor, listAreas } from '#server/area/openAreas.ts';
import { badField } from '#server/errors.ts';
import { Business } from '#server/models/Business.ts';

export async function getBusiness(businessId: string): Promise<Business> {
  return (await Business.findByPk(businessId))!;
}

export type BusinessChange = Partial<
  Pick<
    Business,
    | 'name'
    | 'timeZone'
    | 'currency'
    | 'distanceUnit'
    | 'weightUnit'
    | 'areaName'
    | 'senderPhone'
    | 'deskPhone'
    | 'setUpMinutes'
    | 'cleanDownMinutes'
    | 'priceCentsPerHour'
    | 'calloutCents'
  >
>;

/** The working area must be one that is imported here. */
export async function updateBusiness(
  businessId: string,
  change: BusinessChange,
): Promise<Business> {
  if (change.areaName !== undefined && !areaFor(change.areaName)) {
    const names = listAreas()
      .map((area) => area.name)
      .join(', ');
    throw badField('areaName', `must be an imported area (${names || 'none yet'})`);
  }
  // Inbound texts are routed by the number they were sent to, so it belongs to one business.
  const business = await getBusiness(businessId);
  try {
    return await business.update(change);
  } catch (error) {
    if (!(error instanceof UniqueConstraintError)) throw error;
    throw badField('senderPhone', 'is another business’s number');
  }
}
