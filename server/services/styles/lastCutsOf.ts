import { styleForPet } from '#shared/grooming/styleForPet.ts';
import type { Style } from '#shared/grooming/types.ts';
import { localDateAt } from '#shared/time/dayStart.ts';
import { Business } from '#server/models/Business.ts';
import { PetStyle } from '#server/models/PetStyle.ts';
import { findStyles } from './findStyles.ts';
import { ownOf } from './stylesOf.ts';

/**
 * The cut plan each pet left its last finished visit with: the newest version of its style made by
 * the end of that date, keyed by pet id. Pets whose versions are all younger are absent, and count
 * as groomed in the style they have now. Three queries, however many pets.
 */
export async function lastCutsOf(
  businessId: string,
  lastVisits: ReadonlyMap<string, string>,
): Promise<Map<string, Style['cuts']>> {
  if (lastVisits.size === 0) return new Map();
  const [business, versions] = await Promise.all([
    Business.findByPk(businessId),
    PetStyle.findAll({ where: { petId: [...lastVisits.keys()] }, order: [['version', 'ASC']] }),
  ]);
  const worn = new Map<string, PetStyle>();
  for (const version of versions) {
    const madeOn = version.madeAt && localDateAt(version.madeAt.getTime(), business!.timeZone);
    if (!madeOn || madeOn <= lastVisits.get(version.petId)!) worn.set(version.petId, version);
  }
  const styles = await findStyles([...worn.values()].map(({ styleId }) => styleId));
  return new Map(
    [...worn].flatMap(([petId, version]) => {
      const known = styles.get(version.styleId);
      return known ? [[petId, styleForPet(known.style, ownOf(version)).cuts] as const] : [];
    }),
  );
}
