import { type ErrorRequestHandler, Router } from 'express';
import * as api from '#shared/api/arrival.ts';
import { clock } from '#server/clock.ts';
import { knownError } from '#server/http/answerErrors.ts';
import { handlePublic } from '#server/http/handle.ts';
import { limitLinks } from '#server/http/limits.ts';
import { arrivalPage } from '#server/http/arrivalPage.ts';
import { log } from '#server/log.ts';
import { getArrival } from '#server/services/arrival/getArrival.ts';

export const arrivalRoutes = Router();

arrivalRoutes.use('/api/arrival', limitLinks);
handlePublic(arrivalRoutes, api.getArrival, ({ params, now }) => getArrival(params.token, now));

arrivalRoutes.use('/a', (_req, res, next) => {
  res.setHeader('Cache-Control', 'no-store');
  res.setHeader('Referrer-Policy', 'no-referrer');
  res.setHeader('X-Robots-Tag', 'noindex');
  next();
});

/** The page itself: its essential sentence is in the HTML, so that it reads without script. */
arrivalRoutes.get('/a/:token', limitLinks, async (req, res) => {
  const arrival = api.arrival.parse(await getArrival(String(req.params.token), clock.now()));
  res.type('html').send(await arrivalPage(arrival));
});

/** A pet owner is told in a page, whatever went wrong. */
const answerInPage: ErrorRequestHandler = async (error: unknown, req, res, _next) => {
  const known = knownError(error);
  if (!known) log.error({ err: error, requestId: req.id }, 'an arrival page failed');
  const words = known?.message ?? 'Something broke on our side. Open the link again in a minute.';
  res
    .status(known?.status ?? 500)
    .type('html')
    .send(await arrivalPage(null, words));
};
arrivalRoutes.use('/a', answerInPage);
