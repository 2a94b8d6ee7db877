import { Groomer } from '#server/models/Groomer.ts';
import { keptFit } from '#server/services/learning/keptFit.ts';
import type { Learning } from './forecastOf.ts';

/** What the business in scope has learned and whose pace may be asked for; null: nothing yet. */
export async function learningOf(businessId: string): Promise<Learning> {
  const kept = await keptFit(businessId);
  return kept && { ...kept, groomers: await Groomer.findAll({ where: { active: true } }) };
}
