import { Router } from 'express';
import * as api from '#shared/api/learning.ts';
import { handle } from '#server/http/handle.ts';
import { presentFit } from '#server/presenters/learning.ts';
import { learnMinutes } from '#server/services/learning/learnMinutes.ts';
import { listFits } from '#server/services/learning/listFits.ts';

export const learningRoutes = Router();

handle(learningRoutes, api.listFits, 'review.read', async () => ({
  fits: (await listFits()).map(presentFit),
}));
handle(learningRoutes, api.learnMinutes, 'setup.edit', async ({ actor, now }) =>
  presentFit(await learnMinutes(actor.businessId, now)),
);
