import { Op } from 'sequelize';
import { newId } from '#server/db/newId.ts';
import { badField, notFound } from '#server/errors.ts';
import { Household } from '#server/models/Household.ts';
import { Pet } from '#server/models/Pet.ts';
import { Site } from '#server/models/Site.ts';
import { Visit } from '#server/models/Visit.ts';
import { areaOf, isOutside } from '#server/services/area/areas.ts';
import { sealGateCode } from './gateCode.ts';

export interface HouseholdInput {
  name: string;
  addressLabel: string;
  lat: number;
  lon: number;
  siteId: string | null;
  accessNotes: string;
  handoverNotes: string;
  gateCode?: string | null | undefined;
  contactName: string;
  phone: string | null;
  textsConsent: boolean;
  secondContactName: string;
  secondContactPhone: string | null;
}

export const pageSize = 25;

/** One page of households whose name, pets, street, contact or phone match the text. */
export async function listHouseholds(text: string, page: number, today: string) {
  const where = text ? await matching(text) : {};
  const { rows, count } = await Household.findAndCountAll({
    where,
    order: [
      ['name', 'ASC'],
      ['id', 'ASC'],
    ],
    limit: pageSize,
    offset: (page - 1) * pageSize,
  });
  const ids = rows.map((row) => row.id);
  const [pets, sites, visits] = await Promise.all([
    Pet.findAll({ where: { householdId: ids, active: true }, order: [['name', 'ASC']] }),
    Site.findAll({ where: { id: rows.flatMap((row) => row.siteId ?? []) } }),
    Visit.findAll({
      where: { householdId: ids, status: { [Op.in]: ['booked', 'done'] } },
      attributes: ['id', 'householdId', 'date', 'status'],
    }),
  ]);
  return { rows, count, page, pets, sites, visits, today };
}

async function matching(text: string) {
  const like = `%${text.replace(/[\\%_]/g, '\\$&')}%`;
  // A number typed as it is dialled at home, 07700…, is stored with its country code instead.
  const digits = text.replace(/\D/g, '').replace(/^0+/, '');
  const pets = await Pet.findAll({
    where: { name: { [Op.like]: like } },
    attributes: ['householdId'],
  });
  return {
    [Op.or]: [
      { name: { [Op.like]: like } },
      { addressLabel: { [Op.like]: like } },
      { contactName: { [Op.like]: like } },
      ...(digits.length >= 3 ? [{ phone: { [Op.like]: `%${digits}%` } }] : []),
      { id: pets.map((pet) => pet.householdId) },
    ],
  };
}

export async function createHousehold(
  businessId: string,
  input: HouseholdInput,
  now: Date,
): Promise<Household> {
  await needSite(input.siteId);
  await needInside(businessId, input.lat, input.lon);
  const { gateCode, ...fields } = input;
  const id = newId();
  return Household.create({
    id,
    ...fields,
    gateCodeSealed: sealGateCode(businessId, id, gateCode ?? null),
    consentChangedAt: input.textsConsent ? now : null,
    createdAt: now,
  });
}

export async function updateHousehold(
  businessId: string,
  householdId: string,
  change: Partial<HouseholdInput>,
  now: Date,
): Promise<Household> {
  const household = await needHousehold(householdId);
  if (change.siteId !== undefined) await needSite(change.siteId);
  if (change.lat !== undefined || change.lon !== undefined)
    await needInside(businessId, change.lat ?? household.lat, change.lon ?? household.lon);
  const { gateCode, ...fields } = change;
  const consentMoved =
    change.textsConsent !== undefined && change.textsConsent !== household.textsConsent;
  return household.update({
    ...fields,
    ...(gateCode !== undefined && {
      gateCodeSealed: sealGateCode(businessId, householdId, gateCode),
    }),
    ...(consentMoved && { consentChangedAt: now }),
  });
}

export async function needHousehold(householdId: string): Promise<Household> {
  const household = await Household.findByPk(householdId);
  if (!household) throw notFound('household');
  return household;
}

async function needSite(siteId: string | null): Promise<void> {
  if (siteId !== null && !(await Site.findByPk(siteId)))
    throw badField('siteId', 'must be a site of this business');
}

async function needInside(businessId: string, lat: number, lon: number): Promise<void> {
  const area = await areaOf(businessId);
  if (isOutside(area, lat, lon))
    throw badField('lat', `must lie in the working area ${area!.name}; move the pin`);
}
