import type { RunHappened } from '#shared/schedule/reduceEvents.ts';
import { secondsToInstant } from '#shared/time/wallSeconds.ts';
import { wallRange } from '#shared/texts/wallRange.ts';
import { ArrivalLink } from '#server/models/ArrivalLink.ts';
import { Groomer } from '#server/models/Groomer.ts';
import type { Run } from '#server/models/Run.ts';
import { sentVersion } from '#server/services/runs/getRun.ts';
import { runTimes } from '#server/services/runs/runTimes.ts';
import { hashToken, makeToken } from '#server/services/secrets/tokens.ts';
import { doorRange } from './doorRange.ts';
import { queueText } from '#server/services/texts/queueText.ts';
import { findVisitFacts } from '#server/services/visits/findVisitFacts.ts';

/** A link outlives the visit by a day, for the report afterwards. */
const linkMs = 36 * 3600 * 1000;

/** Queues 'on the way' with a fresh arrival link; nothing for a stop that is no visit. */
export async function tellOnTheWay(input: {
  run: Run;
  visitId: string;
  happened: RunHappened;
  origin: string;
  now: Date;
}): Promise<void> {
  const { run, visitId, happened, origin, now } = input;
  const version = await sentVersion(run);
  const stop = version?.plan.runs[0]?.stops.find((one) => one.id === visitId);
  if (!version || stop?.kind !== 'visit') return;
  const facts = await findVisitFacts(stop.visitId);
  const times = runTimes(version, happened, now).stops.find((one) => one.stopId === visitId);
  if (!facts || !times || facts.visit.status === 'cancelled') return;
  const door = doorRange(version.problem, times);
  const token = makeToken();
  const link = `${origin}/a/${token}`;
  const groomer = await Groomer.findByPk(run.groomerId);
  const text = await queueText({
    householdId: facts.household.id,
    visitId: facts.visit.id,
    kind: 'onTheWay',
    promiseVersion: facts.promise?.version ?? 0,
    fields: {
      groomerName: groomer!.name,
      petNames: facts.pets.map(({ pet }) => pet.name),
      arrival: wallRange(version.problem, door.fromSeconds, door.toSeconds),
      link,
    },
    now,
    // Its words stop being true once the door should be open; a text after that helps nobody.
    until: new Date(secondsToInstant(version.problem.dayStartUtc, door.toSeconds)),
  });
  // Told before: the link the household already has stays the one.
  if (!text.body.includes(link)) return;
  await ArrivalLink.create({
    visitId: facts.visit.id,
    runId: run.id,
    tokenHash: hashToken(token),
    expiresAt: new Date(now.getTime() + linkMs),
    createdAt: now,
  });
}
