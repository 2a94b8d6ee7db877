import { Router } from 'express';
import * as api from '#shared/api/visits.ts';
import { notFound } from '#server/errors.ts';
import { handle } from '#server/http/handle.ts';
import { presentVisit } from '#server/presenters/visit.ts';
import { createVisit } from '#server/services/visits/createVisit.ts';
import { findVisitFacts } from '#server/services/visits/findVisitFacts.ts';
import { cancelVisit, updateVisit } from '#server/services/visits/updateVisit.ts';

export const visitRoutes = Router();

handle(visitRoutes, api.createVisit, 'visits.edit', async ({ actor, body, now }) =>
  show((await createVisit(actor, body, now)).id),
);
handle(visitRoutes, api.getVisit, 'visits.edit', async ({ params }) => show(params.visitId));
handle(visitRoutes, api.updateVisit, 'visits.edit', async ({ actor, params, body, now }) =>
  show((await updateVisit(actor, params.visitId, body, now)).id),
);
handle(visitRoutes, api.cancelVisit, 'visits.edit', async ({ actor, params, body, now }) => {
  await cancelVisit(actor, params.visitId, body.reason, now);
  return { done: true as const };
});

async function show(visitId: string) {
  const facts = await findVisitFacts(visitId);
  if (!facts) throw notFound('visit');
  return presentVisit(facts);
}
