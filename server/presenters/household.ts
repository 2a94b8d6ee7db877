import type { z } from 'zod';
import type { getHousehold, household, listHouseholds, site } from '#shared/api/households.ts';
import type { pet } from '#shared/api/pets.ts';
import type { Style } from '#shared/grooming/types.ts';
import type { Household } from '#server/models/Household.ts';
import type { Pet } from '#server/models/Pet.ts';
import type { Promise as PromiseRow } from '#server/models/Promise.ts';
import type { Run } from '#server/models/Run.ts';
import type { Site } from '#server/models/Site.ts';
import type { Van } from '#server/models/Van.ts';
import type { Visit } from '#server/models/Visit.ts';
import type { VisitPet } from '#server/models/VisitPet.ts';
import { presentStyleShape } from './style.ts';
import { breedNameOf } from './visit.ts';

/** The gate code itself never leaves by this door; only whether there is one. */
export function presentHousehold(row: Household): z.input<typeof household> {
  return {
    id: row.id,
    name: row.name,
    addressLabel: row.addressLabel,
    lat: row.lat,
    lon: row.lon,
    siteId: row.siteId ?? null,
    accessNotes: row.accessNotes,
    handoverNotes: row.handoverNotes,
    contactName: row.contactName,
    phone: row.phone ?? null,
    textsConsent: row.textsConsent,
    secondContactName: row.secondContactName,
    secondContactPhone: row.secondContactPhone ?? null,
    hasGateCode: row.gateCodeSealed != null,
    consentChangedAt: row.consentChangedAt?.toISOString() ?? null,
  };
}

export function presentSite(facts: { site: Site; householdCount: number }): z.input<typeof site> {
  const { site: row, householdCount } = facts;
  return {
    id: row.id,
    name: row.name,
    lat: row.lat,
    lon: row.lon,
    parkingNotes: row.parkingNotes,
    hasGateCode: row.gateCodeSealed != null,
    householdCount,
  };
}

export function presentPet(
  row: Pet,
  style: Style,
  lastVisitDate: string | null,
  lastCuts: Style['cuts'] | null,
): z.input<typeof pet> {
  return {
    id: row.id,
    householdId: row.householdId,
    name: row.name,
    species: row.species,
    breedId: row.breedId ?? null,
    breedName: breedNameOf(row),
    weightGrams: row.weightGrams ?? null,
    coatType: row.coatType ?? null,
    matting: row.matting,
    mattingByRegion: row.mattingByRegion ?? null,
    undercoatLoad: row.undercoatLoad,
    soil: row.soil,
    tableLimitMinutes: row.tableLimitMinutes ?? null,
    temperament: row.temperament,
    birthYear: row.birthYear ?? null,
    cautions: row.cautions,
    cautionNote: row.cautionNote,
    vetName: row.vetName,
    vetPhone: row.vetPhone ?? null,
    styleId: row.styleId,
    styleName: style.name,
    style: presentStyleShape(style),
    styleNotes: row.styleNotes,
    intervalWeeks: row.intervalWeeks,
    active: row.active,
    lastVisitDate,
    lastCuts,
  };
}

export function presentHouseholdPage(facts: {
  rows: Household[];
  count: number;
  page: number;
  pageSize: number;
  pets: Pet[];
  sites: Site[];
  visits: Visit[];
  today: string;
}): z.input<(typeof listHouseholds)['response']> {
  return {
    total: facts.count,
    page: facts.page,
    pageSize: facts.pageSize,
    households: facts.rows.map((row) => {
      const dates = facts.visits.filter((visit) => visit.householdId === row.id);
      const coming = dates.filter(
        (visit) => visit.status === 'booked' && visit.date >= facts.today,
      );
      const past = dates.filter((visit) => visit.status === 'done');
      return {
        id: row.id,
        name: row.name,
        addressLabel: row.addressLabel,
        siteName: facts.sites.find((one) => one.id === row.siteId)?.name ?? null,
        pets: facts.pets
          .filter((one) => one.householdId === row.id)
          .map((one) => ({ id: one.id, name: one.name, breedName: breedNameOf(one) })),
        nextVisitDate: coming.map((visit) => visit.date).sort()[0] ?? null,
        lastVisitDate:
          past
            .map((visit) => visit.date)
            .sort()
            .at(-1) ?? null,
      };
    }),
  };
}

export function presentHouseholdDetail(facts: {
  household: Household;
  pets: Pet[];
  visits: Visit[];
  visitPets: VisitPet[];
  promises: PromiseRow[];
  runs: Run[];
  vans: Van[];
  styleOf: (pet: Pet) => Style;
  lastVisits: ReadonlyMap<string, string>;
  lastCuts: ReadonlyMap<string, Style['cuts']>;
}): z.input<(typeof getHousehold)['response']> {
  const { lastVisits, lastCuts } = facts;
  return {
    household: presentHousehold(facts.household),
    pets: facts.pets.map((one) =>
      presentPet(
        one,
        facts.styleOf(one),
        lastVisits.get(one.id) ?? null,
        lastCuts.get(one.id) ?? null,
      ),
    ),
    visits: facts.visits.map((visit) => {
      const promise = facts.promises.findLast((one) => one.visitId === visit.id);
      const run = facts.runs.find(
        (one) =>
          one.date === visit.date &&
          one.stops.some((stop) => stop.kind === 'visit' && stop.visitId === visit.id),
      );
      return {
        id: visit.id,
        date: visit.date,
        status: visit.status,
        promiseWords:
          promise?.startMinutes == null || promise.endMinutes == null
            ? null
            : `${wall(promise.startMinutes)}–${wall(promise.endMinutes)}`,
        petNames: facts.visitPets
          .filter((one) => one.visitId === visit.id)
          .sort((a, b) => a.position - b.position)
          .map((one) => facts.pets.find((pet) => pet.id === one.petId)?.name ?? ''),
        vanName: facts.vans.find((van) => van.id === run?.vanId)?.name ?? null,
      };
    }),
  };
}

function wall(minutes: number): string {
  return `${Math.floor(minutes / 60)}:${String(minutes % 60).padStart(2, '0')}`;
}
