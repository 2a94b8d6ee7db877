import type { Express } from 'express';
import type { z } from 'zod';
import { type Day, getDay, moveVisit } from '#shared/api/days.ts';
import { createHousehold } from '#shared/api/households.ts';
import { createPet } from '#shared/api/pets.ts';
import { createVisit } from '#shared/api/visits.ts';
import type { ApiClient } from './apiClient.ts';
import { buildBusiness } from './buildBusiness.ts';
import { tomorrow } from './tomorrow.ts';

type WireMove = z.input<(typeof moveVisit)['body']>['move'];
type Promised = { startMinutes: number; endMinutes: number } | null;

/** A business with vans Otter and Plover on a date and one visit per pet name, none placed. */
export async function boardDay(
  app: Express,
  petNames: string[] = ['Rook', 'Wren', 'Sorrel'],
  date = tomorrow(),
) {
  const built = await buildBusiness(app, date);
  const { client, vans } = built;
  const visits: Record<string, string> = {};
  for (const [index, petName] of petNames.entries())
    visits[petName] = (await bookPet(client, date, petName, { lat: 41.01 + index / 100 })).visit.id;
  const [otter, plover] = vans.map((van) => van.id) as [string, string];
  const read = () => client.must(getDay, { params: { date } });
  /** One move with the given versions, the present ones when none are given. */
  const move = async (wanted: WireMove, versions?: Record<string, number>, as = client) =>
    as.call(moveVisit, {
      params: { date },
      body: { move: wanted, runVersions: versions ?? versionsOf(await read()) },
    });
  const place = async (petName: string, vanId: string, index = 500) => {
    const answer = await move({ kind: 'placeVisit', visitId: visits[petName]!, vanId, index });
    if (answer.status !== 200) throw new Error(answer.text);
    return answer.body;
  };
  return { ...built, date, visits, otter, plover, read, move, place };
}

/** A household near the depot with one bichon of the name and a visit for it. */
export async function bookPet(
  client: ApiClient,
  date: string,
  petName: string,
  options: {
    lat?: number;
    lon?: number;
    promise?: Promised;
    phone?: string | null;
    textsConsent?: boolean;
  } = {},
) {
  const household = await client.must(createHousehold, {
    body: {
      name: `The ${petName}s`,
      addressLabel: `${petName} Lane 1`,
      lat: options.lat ?? 41.01,
      lon: options.lon ?? -36.01,
      contactName: `Keeper of ${petName}`,
      phone: options.phone === undefined ? '+447700900123' : options.phone,
      textsConsent: options.textsConsent ?? true,
    },
  });
  const pet = await client.must(createPet, {
    params: { householdId: household.id },
    body: {
      name: petName,
      species: 'dog',
      breedId: 'bichon-frise',
      weightGrams: 6000,
      styleId: 'teddy',
    },
  });
  const visit = await client.must(createVisit, {
    body: { householdId: household.id, date, petIds: [pet.id], promise: options.promise ?? null },
  });
  return { household, pet, visit };
}

export function versionsOf(day: Pick<Day, 'runs'>): Record<string, number> {
  return Object.fromEntries(day.runs.map((run) => [run.vanId, run.version]));
}

/** The day as words: pet names in order per van, and who is not placed. */
export function ordersOf(day: Day): Record<string, string[]> {
  const label = (visitId: string) =>
    day.problem.visits.find((visit) => visit.id === visitId)?.label ?? visitId;
  return {
    ...Object.fromEntries(
      day.plan.runs.map((run) => [
        day.runs.find((one) => one.vanId === run.vanId)?.vanName ?? run.vanId,
        run.stops.flatMap((stop) => (stop.kind === 'visit' ? label(stop.visitId) : [])),
      ]),
    ),
    notPlaced: day.plan.notPlaced.map(label).sort(),
  };
}
