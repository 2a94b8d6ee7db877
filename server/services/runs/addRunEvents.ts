import type { RunHappened, TapEvent } from '#shared/schedule/reduceEvents.ts';
import { AppError } from '#server/errors.ts';
import { Business } from '#server/models/Business.ts';
import type { Run } from '#server/models/Run.ts';
import { RunEvent } from '#server/models/RunEvent.ts';
import { RunVersion } from '#server/models/RunVersion.ts';
import { Visit, type VisitStatus } from '#server/models/Visit.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { lockDay } from '#server/services/days/lockDay.ts';
import { tellOnTheWay } from '#server/services/arrival/tellOnTheWay.ts';
import { dropTexts } from '#server/services/texts/dropTexts.ts';
import { loadHappened } from './loadHappened.ts';
import { needRun } from './needRun.ts';

/** A tap as it came from the phone. */
export type PhoneEvent = TapEvent & { v: number; runVersion: number };

/**
 * Adds the phone's taps. The key is (business, event id), so what was sent twice counts once; what
 * each tap means is decided by the one reducer over all taps, in their own order. Setting out queues
 * the household's text in the same transaction.
 */
export async function addRunEvents(
  actor: Actor,
  runId: string,
  events: PhoneEvent[],
  origin: string,
  now: Date,
): Promise<Run> {
  const found = await needRun(actor, runId);
  await lockDay(found.date);
  const run = await needRun(actor, runId, true);
  const known = new Set(
    (
      await RunEvent.findAll({
        where: { id: events.map((event) => event.id) },
        attributes: ['id', 'businessId'],
      })
    ).map((row) => row.id),
  );
  const fresh = [...new Map(events.map((event) => [event.id, event])).values()].filter(
    (event) => !known.has(event.id),
  );
  if (fresh.length === 0) return run;
  await refuseUnknownStops(run, fresh);
  await RunEvent.bulkCreate(fresh.map((event) => rowOf(event, actor, run.id, now)));
  const business = (await Business.findByPk(actor.businessId))!;
  const happened = (await loadHappened([run], business.timeZone)).get(run.id)!;
  await followStatus(happened);
  await dropLateTexts(happened, now);
  for (const event of fresh)
    if (event.kind === 'startDriving' && happened.stops.get(event.stopId)?.state === 'driving')
      await tellOnTheWay({ run, visitId: event.stopId, happened, origin, now });
  return run;
}

/** Every version ever sent counts: a phone may still be working an older one. */
async function refuseUnknownStops(run: Run, events: PhoneEvent[]): Promise<void> {
  const versions = await RunVersion.findAll({
    where: { runId: run.id },
    attributes: ['id', 'businessId', 'plan'],
  });
  const stopIds = new Set(
    versions.flatMap((version) =>
      version.plan.runs.flatMap((one) => one.stops.map((stop) => stop.id)),
    ),
  );
  events.forEach((event, index) => {
    if (!stopIds.has(event.stopId))
      throw new AppError('badInput', 'This tap is for a stop that was never on this run.', {
        fields: { [`events.${index}.stopId`]: 'must be a stop of this run' },
      });
  });
}

function rowOf(event: PhoneEvent, actor: Actor, runId: string, now: Date) {
  const { id, v, deviceId, deviceSeq, deviceAt, offsetMs, runVersion, stopId, kind, ...data } =
    event;
  return {
    id,
    v,
    runId,
    userId: actor.userId,
    deviceId,
    deviceSeq,
    deviceAt: new Date(deviceAt),
    offsetMs,
    happenedAt: new Date(Date.parse(deviceAt) + offsetMs),
    receivedAt: now,
    runVersion,
    stopId,
    kind,
    data,
  };
}

/** Visits follow what happened: done, failed, or open again when a stop was taken up after all. */
async function followStatus(happened: RunHappened): Promise<void> {
  const visits = await Visit.findAll({
    where: { id: visitIds(happened), status: ['booked', 'done', 'failed'] },
    attributes: ['id', 'businessId', 'status'],
  });
  for (const visit of visits) {
    const { state } = happened.stops.get(visit.id)!;
    const status: VisitStatus =
      state === 'done' ? 'done' : state === 'failed' ? 'failed' : 'booked';
    if (visit.status !== status) await visit.update({ status });
  }
}

/** Stops that are visits: those carry the visit's id, made ones a name like "meal:…". */
function visitIds(happened: RunHappened): string[] {
  return [...happened.stops.keys()].filter((stopId) => !stopId.includes(':'));
}

/** A text still waiting when the van is already there would only confuse. */
async function dropLateTexts(happened: RunHappened, now: Date): Promise<void> {
  for (const visitId of visitIds(happened)) {
    const { state } = happened.stops.get(visitId)!;
    if (state === 'driving' || state === 'ahead') continue;
    await dropTexts({
      visitId,
      kinds: ['onTheWay'],
      reason: 'The van had arrived before the text could go.',
      now,
    });
  }
}
