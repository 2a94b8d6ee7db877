import { Visit } from '#server/models/Visit.ts';
import { loadVisitFacts, type VisitFacts } from './visitFacts.ts';

/** One visit with its surroundings, or null. */
export async function findVisitFacts(visitId: string): Promise<VisitFacts | null> {
  const visit = await Visit.findByPk(visitId);
  return visit ? ((await loadVisitFacts([visit]))[0] ?? null) : null;
}
