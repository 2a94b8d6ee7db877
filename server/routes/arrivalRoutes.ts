import { Router } from 'express';
import * as api from '#shared/api/arrival.ts';
import { clock } from '#server/clock.ts';
import { AppError } from '#server/errors.ts';
import { handlePublic } from '#server/http/handle.ts';
import { limitLinks } from '#server/http/limits.ts';
import { arrivalPage } from '#server/http/arrivalPage.ts';
import { getArrival } from '#server/services/arrival/getArrival.ts';

export const arrivalRoutes = Router();

arrivalRoutes.use('/api/arrival', limitLinks);
handlePublic(arrivalRoutes, api.getArrival, ({ params, now }) => getArrival(params.token, now));

/** The page itself: its essential sentence is in the HTML, so that it reads without script. */
arrivalRoutes.get('/a/:token', limitLinks, async (req, res) => {
  res.setHeader('Cache-Control', 'no-store');
  res.setHeader('Referrer-Policy', 'no-referrer');
  try {
    const arrival = api.arrival.parse(await getArrival(String(req.params.token), clock.now()));
    res.type('html').send(await arrivalPage(arrival));
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    res
      .status(error.status)
      .type('html')
      .send(await arrivalPage(null, error.message));
  }
});
