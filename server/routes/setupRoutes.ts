import { Router } from 'express';
import * as businessApi from '#shared/api/business.ts';
import * as groomerApi from '#shared/api/groomers.ts';
import * as placeApi from '#shared/api/places.ts';
import * as vanApi from '#shared/api/vans.ts';
import { handle } from '#server/http/handle.ts';
import {
  presentBusiness,
  presentGroomer,
  presentPlace,
  presentShift,
  presentVan,
} from '#server/presenters/setup.ts';
import { listImportedAreas } from '#server/services/area/areas.ts';
import { today } from '#server/services/days/today.ts';
import { getBusiness, updateBusiness } from '#server/services/setup/business.ts';
import { createGroomer, listGroomers, updateGroomer } from '#server/services/setup/groomers.ts';
import {
  createPlace,
  listPlaces,
  removePlace,
  updatePlace,
} from '#server/services/setup/places.ts';
import { listShifts, removeShift, setShift } from '#server/services/setup/shifts.ts';
import { createVan, listVans, retireVan, updateVan } from '#server/services/setup/vans.ts';

export const setupRoutes = Router();
const done = { done: true } as const;

handle(setupRoutes, businessApi.getBusiness, 'signedIn', async ({ actor }) =>
  presentBusiness(await getBusiness(actor.businessId)),
);
handle(setupRoutes, businessApi.updateBusiness, 'business.edit', async ({ actor, body }) =>
  presentBusiness(await updateBusiness(actor.businessId, body)),
);
handle(setupRoutes, businessApi.listAreas, 'setup.read', async () => listImportedAreas());

handle(setupRoutes, placeApi.listPlaces, 'setup.read', async () =>
  (await listPlaces()).map(presentPlace),
);
handle(setupRoutes, placeApi.createPlace, 'setup.edit', async ({ body }) =>
  presentPlace(await createPlace(body)),
);
handle(setupRoutes, placeApi.updatePlace, 'setup.edit', async ({ params, body }) =>
  presentPlace(await updatePlace(params.placeId, body)),
);
handle(setupRoutes, placeApi.removePlace, 'setup.edit', async ({ params }) => {
  await removePlace(params.placeId);
  return done;
});

handle(setupRoutes, vanApi.listVans, 'setup.read', async () => (await listVans()).map(presentVan));
handle(setupRoutes, vanApi.createVan, 'setup.edit', async ({ body }) =>
  presentVan(await createVan(body)),
);
handle(setupRoutes, vanApi.updateVan, 'setup.edit', async ({ params, body }) =>
  presentVan(await updateVan(params.vanId, body)),
);
handle(setupRoutes, vanApi.retireVan, 'setup.edit', async ({ actor, params, now }) => {
  await retireVan(params.vanId, await today(actor.businessId, now));
  return done;
});

handle(setupRoutes, groomerApi.listGroomers, 'setup.read', async () =>
  (await listGroomers()).map(presentGroomer),
);
handle(setupRoutes, groomerApi.createGroomer, 'setup.edit', async ({ body }) =>
  presentGroomer(await createGroomer(body)),
);
handle(setupRoutes, groomerApi.updateGroomer, 'setup.edit', async ({ params, body }) =>
  presentGroomer(await updateGroomer(params.groomerId, body)),
);

handle(setupRoutes, groomerApi.listShifts, 'setup.read', async ({ query }) =>
  (await listShifts(query.from, query.to)).map(presentShift),
);
handle(setupRoutes, groomerApi.setShift, 'shifts.edit', async ({ body }) =>
  presentShift(await setShift(body)),
);
handle(setupRoutes, groomerApi.removeShift, 'shifts.edit', async ({ params }) => {
  await removeShift(params.shiftId);
  return done;
});
