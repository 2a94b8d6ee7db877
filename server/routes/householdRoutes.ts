import { Router } from 'express';
import * as api from '#shared/api/households.ts';
import * as petApi from '#shared/api/pets.ts';
import { handle } from '#server/http/handle.ts';
import {
  presentHousehold,
  presentHouseholdDetail,
  presentHouseholdPage,
  presentPet,
  presentSite,
} from '#server/presenters/household.ts';
import { today } from '#server/services/days/today.ts';
import { openGate } from '#server/services/households/gateCode.ts';
import { getHousehold, getPet, lastVisitDates } from '#server/services/households/getHousehold.ts';
import {
  createHousehold,
  listHouseholds,
  pageSize,
  updateHousehold,
} from '#server/services/households/households.ts';
import { createPet, updatePet } from '#server/services/households/pets.ts';
import { lastCutsOf } from '#server/services/styles/lastCutsOf.ts';
import { stylesOf } from '#server/services/styles/stylesOf.ts';
import {
  createSite,
  listSites,
  removeSite,
  updateSite,
} from '#server/services/households/sites.ts';

export const householdRoutes = Router();

handle(householdRoutes, api.listHouseholds, 'households.read', async ({ actor, query, now }) => {
  const found = await listHouseholds(query.text, query.page, await today(actor.businessId, now));
  return presentHouseholdPage({ ...found, pageSize });
});
handle(householdRoutes, api.getHousehold, 'households.read', async ({ params }) =>
  presentHouseholdDetail(await getHousehold(params.householdId)),
);
handle(householdRoutes, api.createHousehold, 'households.edit', async ({ actor, body, now }) =>
  presentHousehold(await createHousehold(actor.businessId, body, now)),
);
handle(
  householdRoutes,
  api.updateHousehold,
  'households.edit',
  async ({ actor, params, body, now }) =>
    presentHousehold(await updateHousehold(actor.businessId, params.householdId, body, now)),
);
handle(householdRoutes, api.openGate, 'households.openGate', ({ actor, params, now }) =>
  openGate(actor, params.householdId, now),
);

handle(householdRoutes, api.listSites, 'households.read', async () =>
  (await listSites()).map(presentSite),
);
handle(householdRoutes, api.createSite, 'households.edit', async ({ actor, body }) =>
  presentSite(await createSite(actor.businessId, body)),
);
handle(householdRoutes, api.updateSite, 'households.edit', async ({ actor, params, body }) =>
  presentSite(await updateSite(actor.businessId, params.siteId, body)),
);
handle(householdRoutes, api.removeSite, 'households.edit', async ({ params }) => {
  await removeSite(params.siteId);
  return { done: true as const };
});

handle(householdRoutes, petApi.getPet, 'households.read', async ({ params }) => {
  const found = await getPet(params.petId);
  return {
    pet: presentPet(found.pet, found.style, found.lastVisitDate, found.lastCuts),
    householdName: found.household.name,
    past: found.visits.flatMap((visit) => {
      const clock = found.clocks.get(visit.id);
      if (!clock) return [];
      return [
        {
          visitId: visit.id,
          date: visit.date,
          groomerName: found.groomers.find((one) => one.id === clock.run.groomerId)?.name ?? '',
          forecastSeconds: visit.forecast.work.meanSeconds,
          clockSeconds: clock.workSeconds,
        },
      ];
    }),
  };
});
handle(
  householdRoutes,
  petApi.createPet,
  'households.edit',
  async ({ actor, params, body, now }) => {
    const pet = await createPet(params.householdId, body, now, actor.userName);
    return presentPet(pet, (await stylesOf([pet]))(pet), null, null);
  },
);
handle(
  householdRoutes,
  petApi.updatePet,
  'households.edit',
  async ({ actor, params, body, now }) => {
    const pet = await updatePet(params.petId, body, now, actor.userName);
    const lastVisits = await lastVisitDates([pet.id]);
    return presentPet(
      pet,
      (await stylesOf([pet]))(pet),
      lastVisits.get(pet.id) ?? null,
      (await lastCutsOf(actor.businessId, lastVisits)).get(pet.id) ?? null,
    );
  },
);
