import { z } from 'zod';
import { dayProblem, plan } from './dayProblem.ts';
import { endpoint } from './endpoint.ts';
import { vanShape } from './vans.ts';
import { id, instant, latitude, localDate, longitude } from './values.ts';
import { visitCard } from './visits.ts';

export const cannotReason = z.enum([
  'noAnswer',
  'refused',
  'unsafe',
  'unwellPet',
  'mattingNeedsConsent',
  'nowhereToPark',
  'gateShut',
  'gear',
  'heat',
  'groomerUnwell',
]);
export type CannotReason = z.infer<typeof cannotReason>;

const mostCounted = 2 ** 31 - 1;
const mostOffsetMs = Date.UTC(2100, 0);

const common = {
  /** UUIDv7 made on the phone: the event's key, so sending twice applies once. */
  id: z.uuid(),
  v: z.literal(1),
  deviceId: z.uuid(),
  deviceSeq: z.int().min(0).max(mostCounted),
  /**
   * The phone's own clock at the tap, and how far the server was ahead of it then: decades, when
   * its clock was never set.
   */
  deviceAt: instant,
  offsetMs: z.int().min(-mostOffsetMs).max(mostOffsetMs),
  runVersion: z.int().min(0).max(mostCounted),
  stopId: z.string().min(1).max(64),
};

export const runEvent = z.discriminatedUnion('kind', [
  z.object({ ...common, kind: z.literal('startDriving') }),
  z.object({ ...common, kind: z.literal('arrived') }),
  z.object({ ...common, kind: z.literal('petOnTable'), petId: id }),
  z.object({
    ...common,
    kind: z.literal('stepDone'),
    petId: id,
    stepKey: z.string().min(1).max(60),
  }),
  z.object({ ...common, kind: z.literal('petDone'), petId: id }),
  z.object({ ...common, kind: z.literal('stopDone'), note: z.string().max(2000).default('') }),
  z.object({
    ...common,
    kind: z.literal('cannotDo'),
    reason: cannotReason,
    note: z.string().max(2000).default(''),
  }),
]);
export type RunEvent = z.infer<typeof runEvent>;

/** Visit card of the phone: access notes and the rest a groomer needs at the kerb. */
export const runVisit = visitCard.extend({
  accessNotes: z.string(),
  handoverNotes: z.string(),
  siteParkingNotes: z.string(),
  hasGateCode: z.boolean(),
  contactName: z.string(),
  secondContactName: z.string(),
  secondContactPhone: z.string().nullable(),
  lastTime: z.object({ date: z.string(), clockSeconds: z.int(), note: z.string() }).nullable(),
});

export const run = z.object({
  runId: id,
  date: z.string(),
  vanId: id,
  vanName: z.string(),
  shape: vanShape,
  groomerName: z.string(),
  /** 0 while nothing was sent. */
  version: z.int(),
  sentAt: z.string().nullable(),
  /** One van's problem and the sent plan; times are derived on the phone with the events so far. */
  problem: dayProblem.nullable(),
  plan: plan.nullable(),
  visits: z.array(runVisit),
  places: z.array(
    z.object({ id, name: z.string(), addressLabel: z.string(), phone: z.string().nullable() }),
  ),
  emergencyVets: z.array(
    z.object({ id, name: z.string(), phone: z.string().nullable(), hoursWords: z.string() }),
  ),
  events: z.array(runEvent),
  serverNow: z.string(),
});
export type RunDetail = z.infer<typeof run>;

/** Runs of a date the signed-in person may work: a groomer's own, all for operator and dispatcher. */
export const listRuns = endpoint({
  method: 'GET',
  path: '/api/runs',
  summary: 'Runs of a date (today when absent)',
  query: z.object({ date: localDate.optional() }),
  response: z.object({
    date: z.string(),
    runs: z.array(
      z.object({
        runId: id,
        vanName: z.string(),
        shape: vanShape,
        groomerName: z.string(),
        sentAt: z.string().nullable(),
        stopCount: z.int(),
        mine: z.boolean(),
      }),
    ),
  }),
});
const one = z.object({ runId: id });
export const getRun = endpoint({
  method: 'GET',
  path: '/api/runs/:runId',
  summary: 'One run as sent, with what happened so far',
  params: one,
  response: run,
});
/** Known event ids are accepted again without effect. */
export const addRunEvents = endpoint({
  method: 'POST',
  path: '/api/runs/:runId/events',
  summary: "Add the phone's taps, in order",
  params: one,
  body: z.object({ events: z.array(runEvent).min(1, 'must hold an event').max(200) }),
  response: run,
});
export const addRunFix = endpoint({
  method: 'POST',
  path: '/api/runs/:runId/fixes',
  summary: "The phone's place while the app is in front",
  params: one,
  body: z.object({
    lat: latitude,
    lon: longitude,
    at: instant,
    accuracyMetres: z.int().min(0).max(100_000),
  }),
  response: z.object({ done: z.literal(true) }),
});
