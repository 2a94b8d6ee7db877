import type { GroomFit as LearnedFit } from '#shared/grooming/learning/groomFit.ts';
import { GroomFit } from '#server/models/GroomFit.ts';

/** A kept fit with the id that visits booked with it remember. */
export interface KeptFit {
  fitId: string;
  fit: LearnedFit;
}

/** One per business: a fit is hundreds of kilobytes and every booking asks for it. */
const remembered = new Map<string, KeptFit>();
const mostRemembered = 50;

/** The fit in force in this business, or null: nothing was learned yet. */
export async function keptFit(businessId: string): Promise<KeptFit | null> {
  const newest = await GroomFit.findOne({
    where: { kept: true },
    order: [['fittedAt', 'DESC']],
    attributes: ['id', 'businessId'],
  });
  if (!newest) return null;
  const known = remembered.get(businessId);
  if (known?.fitId === newest.id) return known;
  const row = await GroomFit.findByPk(newest.id);
  if (!row?.pair) return null;
  const found = { fitId: row.id, fit: row.pair.fit };
  if (remembered.size >= mostRemembered) remembered.clear();
  remembered.set(businessId, found);
  return found;
}
