import type { z } from 'zod';
import type { listRuns, run } from '#shared/api/runs.ts';
import type { DayProblem, Plan } from '#shared/schedule/types.ts';
import type { Business } from '#server/models/Business.ts';
import type { Groomer } from '#server/models/Groomer.ts';
import type { Place } from '#server/models/Place.ts';
import type { Run } from '#server/models/Run.ts';
import type { RunEvent } from '#server/models/RunEvent.ts';
import type { Van } from '#server/models/Van.ts';
import { presentVisit } from './visit.ts';

interface RunFacts {
  run: Run;
  business: Business;
  van: Van;
  groomer: Groomer;
  version: { problem: DayProblem; plan: Plan; version: number; sentAt: Date } | null;
  visits: Parameters<typeof presentVisit>[0][];
  lastTimes: Map<string, { date: string; clock: { workSeconds: number; note: string } }>;
  places: Place[];
  rows: RunEvent[];
  now: Date;
}

export function presentRun(facts: RunFacts): z.input<typeof run> {
  const { run: row, van, groomer, version } = facts;
  return {
    runId: row.id,
    date: row.date,
    vanId: van.id,
    vanName: van.name,
    shape: van.shape,
    groomerName: groomer.name,
    version: version?.version ?? 0,
    sentAt: version?.sentAt.toISOString() ?? null,
    problem: version?.problem ?? null,
    plan: version?.plan ?? null,
    visits: facts.visits.map((visit) => ({
      ...presentVisit(visit),
      accessNotes: visit.household.accessNotes,
      handoverNotes: visit.household.handoverNotes,
      siteParkingNotes: visit.site?.parkingNotes ?? '',
      hasGateCode: visit.household.gateCodeSealed != null || visit.site?.gateCodeSealed != null,
      contactName: visit.household.contactName,
      secondContactName: visit.household.secondContactName,
      secondContactPhone: visit.household.secondContactPhone ?? null,
      lastTime: presentLastTime(facts.lastTimes.get(visit.visit.id)),
    })),
    places: facts.places
      .filter((place) => place.kind !== 'emergencyVet')
      .map(({ id, name, addressLabel, phone }) => ({
        id,
        name,
        addressLabel,
        phone: phone ?? null,
      })),
    emergencyVets: facts.places
      .filter((place) => place.kind === 'emergencyVet')
      .map((place) => ({
        id: place.id,
        name: place.name,
        phone: place.phone ?? null,
        hoursWords: hoursWords(place),
      })),
    events: facts.rows.map(presentEvent),
    serverNow: facts.now.toISOString(),
  };
}

export function presentRunList(facts: {
  date: string;
  runs: { run: Run; van: Van; groomer: Groomer; mine: boolean }[];
}): z.input<(typeof listRuns)['response']> {
  return {
    date: facts.date,
    runs: facts.runs.map(({ run: row, van, groomer, mine }) => ({
      runId: row.id,
      vanName: van.name,
      shape: van.shape,
      groomerName: groomer.name,
      sentAt: row.sentAt?.toISOString() ?? null,
      stopCount: row.stops.length,
      mine,
    })),
  };
}

function presentEvent(row: RunEvent): z.input<typeof run>['events'][number] {
  return {
    id: row.id,
    v: row.v,
    deviceId: row.deviceId,
    deviceSeq: row.deviceSeq,
    deviceAt: row.deviceAt.toISOString(),
    offsetMs: row.offsetMs,
    runVersion: row.runVersion,
    stopId: row.stopId,
    kind: row.kind,
    ...row.data,
  } as z.input<typeof run>['events'][number];
}

function presentLastTime(
  last: { date: string; clock: { workSeconds: number; note: string } } | undefined,
) {
  return last
    ? { date: last.date, clockSeconds: last.clock.workSeconds, note: last.clock.note }
    : null;
}

function hoursWords(place: Place): string {
  if (place.opensMinutes === 0 && place.closesMinutes === 1440) return 'open day and night';
  const wall = (minutes: number) =>
    `${Math.floor(minutes / 60)}:${String(minutes % 60).padStart(2, '0')}`;
  return `${wall(place.opensMinutes)}–${wall(place.closesMinutes)}`;
}
