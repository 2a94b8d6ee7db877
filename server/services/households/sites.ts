import { fn, col } from 'sequelize';
import { newId } from '#server/db/newId.ts';
import { AppError, notFound } from '#server/errors.ts';
import { Household } from '#server/models/Household.ts';
import { Site } from '#server/models/Site.ts';
import { sealGateCode } from './gateCode.ts';

interface SiteInput {
  name: string;
  lat: number;
  lon: number;
  parkingNotes: string;
  gateCode: string | null;
}

export async function listSites() {
  const sites = await Site.findAll({ order: [['name', 'ASC']] });
  const counts = (await Household.findAll({
    attributes: ['siteId', [fn('COUNT', col('id')), 'households']],
    group: ['siteId'],
    raw: true,
  })) as unknown as { siteId: string | null; households: number }[];
  return sites.map((site) => ({
    site,
    householdCount: Number(counts.find((one) => one.siteId === site.id)?.households ?? 0),
  }));
}

export async function createSite(businessId: string, { gateCode, ...input }: SiteInput) {
  const id = newId();
  const site = await Site.create({
    id,
    ...input,
    gateCodeSealed: sealGateCode(businessId, id, gateCode),
  });
  return { site, householdCount: 0 };
}

export async function updateSite(businessId: string, siteId: string, change: Partial<SiteInput>) {
  const site = await needSite(siteId);
  const { gateCode, ...fields } = change;
  await site.update({
    ...fields,
    ...(gateCode !== undefined && { gateCodeSealed: sealGateCode(businessId, siteId, gateCode) }),
  });
  return { site, householdCount: await Household.count({ where: { siteId } }) };
}

export async function removeSite(siteId: string): Promise<void> {
  const site = await needSite(siteId);
  const count = await Household.count({ where: { siteId } });
  if (count > 0)
    throw new AppError(
      'alreadyThere',
      count === 1
        ? `1 household is at ${site.name}. Give it another site first.`
        : `${count} households are at ${site.name}. Give them another site first.`,
    );
  await site.destroy();
}

async function needSite(siteId: string): Promise<Site> {
  const site = await Site.findByPk(siteId);
  if (!site) throw notFound('site');
  return site;
}
