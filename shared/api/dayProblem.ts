import { z } from 'zod';
import type { DayProblem, Move, Plan } from '../schedule/types.ts';

/** The wire form of shared/schedule/types.ts; the casts below fail to compile when they drift. */
const seconds = z.int();
const spread = z.object({ meanSeconds: seconds, varianceSeconds2: z.int() });
const tankKind = z.enum(['fresh', 'grey', 'energy', 'towels']);

const stop = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('visit'),
    id: z.string(),
    visitId: z.string(),
    pinned: z.boolean().optional(),
  }),
  z.object({
    kind: z.literal('refill'),
    id: z.string(),
    placeId: z.string(),
    pinned: z.boolean().optional(),
  }),
  z.object({ kind: z.literal('meal'), id: z.string(), pinned: z.boolean().optional() }),
  z.object({
    kind: z.literal('rest'),
    id: z.string(),
    lengthSeconds: seconds,
    pinned: z.boolean().optional(),
  }),
  z.object({
    kind: z.literal('errand'),
    id: z.string(),
    point: z.int(),
    lengthSeconds: seconds,
    pinned: z.boolean().optional(),
  }),
]);

export const plan: z.ZodType<Plan> = z.object({
  runs: z.array(z.object({ vanId: z.string(), stops: z.array(stop) })),
  notPlaced: z.array(z.string()),
});

export const move: z.ZodType<Exclude<Move, { kind: 'replacePlan' }>> = z.discriminatedUnion(
  'kind',
  [
    z.object({
      kind: z.literal('placeVisit'),
      visitId: z.uuid(),
      vanId: z.uuid(),
      index: z.int().min(0).max(500),
    }),
    z.object({ kind: z.literal('unplaceVisit'), visitId: z.uuid() }),
    z.object({ kind: z.literal('swapRuns'), vanId: z.uuid(), otherVanId: z.uuid() }),
  ],
);

export const dayProblem: z.ZodType<DayProblem> = z.object({
  v: z.literal(1),
  date: z.string(),
  dayStartUtc: z.string(),
  timeZone: z.string(),
  dayLengthSeconds: seconds,
  points: z.array(
    z.object({ id: z.string(), lat: z.number(), lon: z.number(), rough: z.boolean() }),
  ),
  drive: z.object({
    baseSeconds: z.array(seconds),
    metres: z.array(z.int()),
    bands: z.array(z.object({ fromSeconds: seconds, permille: z.int() })),
    cvPermille: z.int(),
  }),
  vans: z.array(
    z.object({
      vanId: z.string(),
      vanName: z.string(),
      groomerId: z.string(),
      groomerName: z.string(),
      startSeconds: seconds,
      endSeconds: seconds,
      mostOvertimeSeconds: seconds,
      mostDriveSeconds: seconds.nullable(),
      loadSeconds: seconds,
      washDownSeconds: seconds,
      startPoint: z.int(),
      endPoint: z.int(),
      skills: z.array(z.string()),
      tableLimitGrams: z.int(),
      tanks: z.array(z.object({ kind: tankKind, capacityMl: z.int(), usedAtStartMl: z.int() })),
      meal: z
        .object({
          lengthSeconds: seconds,
          earliestStartSeconds: seconds,
          latestStartSeconds: seconds,
          dueAfterSeconds: seconds,
        })
        .nullable(),
    }),
  ),
  visits: z.array(
    z.object({
      id: z.string(),
      householdId: z.string(),
      label: z.string(),
      point: z.int(),
      siteId: z.string().nullable(),
      work: spread,
      workByGroomer: z.record(z.string(), spread),
      setUpSeconds: seconds,
      cleanDownSeconds: seconds,
      allowed: z.array(
        z.object({
          startSeconds: seconds,
          endSeconds: seconds,
          binds: z.enum(['arrival', 'stay']),
        }),
      ),
      promise: z
        .object({ startSeconds: seconds, endSeconds: seconds, version: z.int() })
        .nullable(),
      tankUse: z.array(z.object({ kind: tankKind, ml: z.int() })),
      needs: z.array(z.string()),
      heaviestGrams: z.int(),
      preferredGroomerIds: z.array(z.string()),
      barredGroomerIds: z.array(z.string()),
      valueSeconds: seconds,
      pin: z
        .object({
          vanId: z.string().optional(),
          position: z.enum(['first', 'last']).optional(),
          startSeconds: seconds.optional(),
        })
        .nullable(),
    }),
  ),
  refills: z.array(
    z.object({
      id: z.string(),
      name: z.string(),
      point: z.int(),
      kinds: z.array(tankKind),
      lengthSeconds: seconds,
      opensSeconds: seconds,
      closesSeconds: seconds,
    }),
  ),
  weights: z.object({
    lateFactor: z.int(),
    waitFactorPermille: z.int(),
    overtimeFactor: z.int(),
    otherGroomerSeconds: z.int(),
    disturbSeconds: z.int(),
  }),
  nowSeconds: seconds.nullable(),
  facts: z.array(
    z.object({
      stopId: z.string(),
      vanId: z.string(),
      drivingSinceSeconds: seconds.nullable(),
      arrivedSeconds: seconds.nullable(),
      workingSinceSeconds: seconds.nullable(),
      leftSeconds: seconds.nullable(),
      failedReason: z.string().nullable(),
    }),
  ),
  sent: plan.nullable(),
});
