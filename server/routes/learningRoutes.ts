import { Router } from 'express';
import * as api from '#shared/api/learning.ts';
import { handle } from '#server/http/handle.ts';
import { presentFit } from '#server/presenters/learning.ts';
import { listFits } from '#server/services/learning/listFits.ts';
import { petLearned } from '#server/services/learning/petLearned.ts';
import { startLearning } from '#server/services/learning/startLearning.ts';

export const learningRoutes = Router();

handle(learningRoutes, api.listFits, 'review.read', async () => {
  const { fits, inForce } = await listFits();
  return { fits: fits.map(presentFit), inForce: inForce && presentFit(inForce) };
});
handle(learningRoutes, api.learnMinutes, 'setup.edit', async ({ actor, now }) =>
  presentFit(await startLearning(actor, now)),
);
handle(learningRoutes, api.getPetLearned, 'households.read', ({ actor, params, now }) =>
  petLearned(actor.businessId, params.petId, now),
);
