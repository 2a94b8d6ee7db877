import { Router } from 'express';
import * as api from '#shared/api/addresses.ts';
import { handle } from '#server/http/handle.ts';
import {
  findAddresses,
  findNearestAddress,
  getRoadLines,
} from '#server/services/area/addresses.ts';

export const areaRoutes = Router();

handle(areaRoutes, api.findAddresses, 'households.read', ({ actor, query }) =>
  findAddresses(actor.businessId, query.text, query.limit),
);
handle(areaRoutes, api.findNearestAddress, 'households.read', ({ actor, query }) =>
  findNearestAddress(actor.businessId, query.lat, query.lon),
);
handle(areaRoutes, api.getRoadLines, 'runs.work', ({ actor, body }) =>
  getRoadLines(actor.businessId, body.points as [number, number][]),
);
