import type { Express } from 'express';
import { createGroomer, setShift } from '#shared/api/groomers.ts';
import { createHousehold, type Household } from '#shared/api/households.ts';
import { createPet, type Pet } from '#shared/api/pets.ts';
import { createPlace } from '#shared/api/places.ts';
import { createVan } from '#shared/api/vans.ts';
import { createVisit } from '#shared/api/visits.ts';
import { ApiClient } from './apiClient.ts';

/** A business with a depot, two vans with shifts on `date`, and households east of the depot. */
export async function buildBusiness(app: Express, date: string) {
  const client = await new ApiClient(app).signUp();
  const depot = await client.must(createPlace, {
    body: { kind: 'depot', name: 'Yard', lat: 41, lon: -36 },
  });
  const vans = [];
  const groomers = [];
  for (const [name, groomerName, shape] of [
    ['Otter', 'Mika', 'square'],
    ['Plover', 'Ines', 'circle'],
  ] as const) {
    const van = await client.must(createVan, {
      body: {
        name,
        shape,
        startPlaceId: depot.id,
        endPlaceId: depot.id,
        tanks: [{ kind: 'fresh', capacityMl: 250_000 }],
        tableLimitGrams: 60_000,
      },
    });
    const groomer = await client.must(createGroomer, { body: { name: groomerName, skills: [] } });
    await client.must(setShift, {
      body: {
        date,
        vanId: van.id,
        groomerId: groomer.id,
        startMinutes: 480,
        endMinutes: 1020,
        mostOvertimeMinutes: 30,
        meal: null,
      },
    });
    vans.push(van);
    groomers.push(groomer);
  }
  return { client, depot, vans, groomers };
}

export async function addHousehold(
  client: ApiClient,
  fields: Partial<Household> & { gateCode?: string | null } = {},
): Promise<{ household: Household; pet: Pet }> {
  const household = await client.must(createHousehold, {
    body: {
      name: 'Adeyemi',
      addressLabel: '14 Heron Lane',
      lat: 41.01,
      lon: -36.01,
      contactName: 'Ade',
      phone: '+447700900123',
      textsConsent: true,
      ...fields,
    },
  });
  const pet = await client.must(createPet, {
    params: { householdId: household.id },
    body: {
      name: 'Clover',
      species: 'dog',
      breedId: 'bichon-frise',
      weightGrams: 6000,
      styleId: 'teddy',
    },
  });
  return { household, pet };
}

/** A household with one pet and a visit on the date, promised or not. */
export async function addVisit(
  client: ApiClient,
  date: string,
  options: {
    name?: string;
    lat?: number;
    promise?: { startMinutes: number; endMinutes: number } | null;
  } = {},
) {
  const { household, pet } = await addHousehold(client, {
    name: options.name ?? 'Adeyemi',
    lat: options.lat ?? 41.01,
  });
  const visit = await client.must(createVisit, {
    body: { householdId: household.id, date, petIds: [pet.id], promise: options.promise ?? null },
  });
  return { household, pet, visit };
}
