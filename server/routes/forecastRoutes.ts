import { Router } from 'express';
import * as api from '#shared/api/forecasts.ts';
import { handle } from '#server/http/handle.ts';
import { presentQuickForecast } from '#server/presenters/forecast.ts';
import { quickForecast } from '#server/services/forecasts/quickForecast.ts';

export const forecastRoutes = Router();

handle(forecastRoutes, api.quickForecast, 'households.edit', async ({ actor, body, now }) =>
  presentQuickForecast(await quickForecast(actor.businessId, body, now, api.mostOffers)),
);
