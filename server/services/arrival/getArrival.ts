import {
  type ArrivalFacts,
  arrivalHeadline,
  arrivalSentence,
  haveReadyLines,
  promiseWords,
} from '#shared/texts/arrivalWords.ts';
import { nameList } from '#shared/texts/nameList.ts';
import { wallRange } from '#shared/texts/wallRange.ts';
import { formatWall } from '#shared/time/formatWall.ts';
import { wallToSeconds } from '#shared/time/wallSeconds.ts';
import type { DayProblem, StopTimes } from '#shared/schedule/types.ts';
import { areaFor } from '#server/area/openAreas.ts';
import { inBusiness, unsafeAcrossBusinesses } from '#server/db/database.ts';
import { AppError } from '#server/errors.ts';
import { ArrivalLink } from '#server/models/ArrivalLink.ts';
import { Business } from '#server/models/Business.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Run } from '#server/models/Run.ts';
import { Van } from '#server/models/Van.ts';
import { loadHappened } from '#server/services/runs/loadHappened.ts';
import { runTimes } from '#server/services/runs/runTimes.ts';
import { sentVersion } from '#server/services/runs/getRun.ts';
import { hashToken } from '#server/services/secrets/tokens.ts';
import { findVisitFacts } from '#server/services/visits/findVisitFacts.ts';
import type { VisitFacts } from '#server/services/visits/visitFacts.ts';
import { doorRange } from './doorRange.ts';
import { findVanPlace } from './findVanPlace.ts';

/** What a link shows: one household's facts and nobody else's. Throws linkUsedUp once expired. */
export async function getArrival(token: string, now: Date) {
  const link = await unsafeAcrossBusinesses(() =>
    ArrivalLink.findOne({ where: { tokenHash: hashToken(token) } }),
  );
  if (!link)
    throw new AppError('notFound', 'This link is not one of ours. Look at the text again.');
  if (link.expiresAt <= now)
    throw new AppError('linkUsedUp', 'This link has expired. The visit is over.');
  return inBusiness(link.businessId, () => describe(link, now), { onlyReads: true });
}

async function describe(link: ArrivalLink, now: Date) {
  const business = (await Business.findByPk(link.businessId))!;
  const run = link.runId ? await Run.findByPk(link.runId) : null;
  const [visit, van, groomer, version, happened] = await Promise.all([
    findVisitFacts(link.visitId),
    run && Van.findByPk(run.vanId),
    run && Groomer.findByPk(run.groomerId),
    run && sentVersion(run),
    run && loadHappened([run], business.timeZone).then((map) => map.get(run.id)!),
  ]);
  if (!visit || !run || !van || !groomer || !version || !happened)
    throw new AppError('linkUsedUp', 'This visit has changed. The business will be in touch.');
  const times = runTimes(version, happened, now);
  const stop = times.stops.find((one) => one.stopId === visit.visit.id) ?? null;
  const facts = arrivalFacts(business, visit, version.problem, stop, groomer.name, van.name);
  const area = business.areaName ? areaFor(business.areaName) : null;
  return {
    businessName: business.name,
    callPhone: business.deskPhone ?? null,
    petNames: nameList(facts.petNames),
    groomerName: groomer.name,
    vanName: van.name,
    shape: van.shape,
    state: facts.state,
    headline: arrivalHeadline(facts),
    sentence: arrivalSentence(facts),
    promiseWords: promiseWords(facts.promise),
    haveReady: haveReadyLines(visit.pets.map(({ pet }) => pet.species)),
    home: { lat: visit.household.lat, lon: visit.household.lon },
    van:
      facts.state === 'onTheWay'
        ? await findVanPlace({
            problem: version.problem,
            happened,
            stopId: visit.visit.id,
            run,
            area,
            now,
          })
        : null,
    steps: visit.visit.forecast.steps.map(({ family, medianSeconds, attentionPermille }) => ({
      family,
      seconds: medianSeconds,
      attentionPermille,
    })),
    areaName: business.areaName,
    areaVersion: area?.version ?? null,
    attribution: area?.attribution ?? null,
    updatedAt: now.toISOString(),
  };
}

function arrivalFacts(
  business: Business,
  facts: VisitFacts,
  problem: DayProblem,
  stop: StopTimes | null,
  groomerName: string,
  vanName: string,
): ArrivalFacts {
  const clock = (seconds: number) => formatWall(problem, seconds);
  const at = (wall: number) => wallToSeconds(problem.date, problem.timeZone, wall);
  const state = stateOf(facts, stop);
  const door = stop && doorRange(problem, stop);
  return {
    state,
    businessName: business.name,
    groomerName,
    vanName,
    petNames: facts.pets.map(({ pet }) => pet.name),
    date: facts.visit.date,
    promise:
      facts.promise &&
      wallRange(problem, at(facts.promise.startMinutes), at(facts.promise.endMinutes)),
    arrival:
      door && (state === 'onTheWay' || state === 'planned')
        ? wallRange(problem, door.fromSeconds, door.toSeconds)
        : null,
    arrivedAt: stop && (state === 'arrived' || state === 'done') ? clock(stop.arriveSeconds) : null,
    doneAt: stop && state === 'done' ? clock(stop.endSeconds) : null,
    finish:
      stop && state === 'arrived'
        ? wallRange(problem, stop.endSeconds, stop.endSeconds + 600)
        : null,
  };
}

function stateOf(facts: VisitFacts, stop: StopTimes | null): ArrivalFacts['state'] {
  if (!stop || facts.visit.status === 'cancelled' || stop.state === 'failed') return 'notToday';
  if (stop.state === 'done') return 'done';
  if (stop.state === 'arrived' || stop.state === 'working') return 'arrived';
  return stop.state === 'driving' ? 'onTheWay' : 'planned';
}
