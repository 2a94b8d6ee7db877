import type { VisitCard } from '#shared/api/visits.ts';
import type {
  DayProblem,
  Run,
  RunTimes,
  StopTimes,
  Tank,
  VanShift,
  VisitFact,
} from '#shared/schedule/types.ts';
import { bracketLevels } from './bracketLevels.ts';
import { petWords } from './petWords.ts';
import { towersOf } from './towersOf.ts';
import type { Strip, StripStop } from './types.ts';

/** What of a day every strip is made from; look-ups are made once for all vans. */
export interface StripSource {
  problem: DayProblem;
  facts: ReadonlyMap<string, VisitFact>;
  cards: ReadonlyMap<string, VisitCard>;
  failedReasons: ReadonlyMap<string, string>;
}

/** One van’s strip. `safePermille`: a promise with a smaller chance is drawn as at risk. */
export function stripOf(
  source: StripSource,
  van: VanShift,
  run: Run,
  times: RunTimes,
  safePermille: number,
): Strip {
  const stops = times.stops.map((stop, index) =>
    stopOf(source, run, stop, index, times, safePermille),
  );
  let visitIndex = 0;
  for (const stop of stops) if (stop.kind === 'visit') stop.visitIndex = visitIndex++;
  const hanging = stops.filter((stop) => stop.promise !== null);
  const promised = hanging.flatMap((stop) => (stop.promise ? [stop.promise] : []));
  // An arrival bar that pokes out of its window must not lie in a neighbour's bracket.
  const levels = bracketLevels(
    hanging.map(({ promise, arrival }) => ({
      startSeconds: Math.min(promise!.startSeconds, arrival!.earlySeconds),
      endSeconds: Math.max(promise!.endSeconds, arrival!.lateSeconds),
    })),
  );
  promised.forEach((promise, index) => (promise.level = levels[index]!));
  const last = times.stops.at(-1);
  const first = times.stops[0];
  const homeFrom = last?.endSeconds ?? times.leaveSeconds;
  const finish = times.finishSeconds;
  return {
    vanId: van.vanId,
    vanName: van.vanName,
    groomerName: van.groomerName,
    shiftStartSeconds: van.startSeconds,
    shiftEndSeconds: van.endSeconds,
    load:
      first && van.loadSeconds > 0
        ? {
            fromSeconds: first.departSeconds - van.loadSeconds,
            toSeconds: first.departSeconds,
          }
        : null,
    washDown:
      first && van.washDownSeconds > 0
        ? { fromSeconds: finish - van.washDownSeconds, toSeconds: finish }
        : null,
    stops,
    home:
      last && times.homeDriveSeconds > 0
        ? {
            fromSeconds: homeFrom,
            toSeconds: homeFrom + times.homeDriveSeconds,
            metres: times.homeDriveMetres,
            rough: times.homeRough,
          }
        : null,
    finishSeconds: finish,
    overtimeSeconds: times.overtimeSeconds,
    driveMetres: times.driveMetres,
    bracketLevels: promised.length === 0 ? 0 : Math.max(...levels) + 1,
    water: waterOf(van.tanks, times),
  };
}

function stopOf(
  source: StripSource,
  run: Run,
  times: StopTimes,
  index: number,
  runTimes: RunTimes,
  safePermille: number,
): StripStop {
  const stop = run.stops[index];
  const visitId = stop?.kind === 'visit' ? stop.visitId : null;
  const fact = visitId === null ? undefined : source.facts.get(visitId);
  const card = visitId === null ? undefined : source.cards.get(visitId);
  const over = times.state === 'done' || times.state === 'failed';
  const workFrom = times.startSeconds + times.setUpSeconds;
  const names = new Map(card?.pets.map((pet) => [pet.id, pet.name]));
  return {
    stopId: times.stopId,
    visitId,
    kind: times.kind,
    label: fact?.label ?? placeName(source, stop) ?? times.kind,
    words: card ? petWords(card.pets) : '',
    state: times.state,
    visitIndex: -1,
    fromSeconds: times.startSeconds,
    toSeconds: times.endSeconds,
    drive:
      times.driveSeconds > 0
        ? {
            fromSeconds: times.departSeconds,
            toSeconds: times.arriveSeconds,
            metres: times.driveMetres,
            rough: times.rough,
          }
        : null,
    wait:
      times.waitSeconds > 0
        ? { fromSeconds: times.startSeconds - times.waitSeconds, toSeconds: times.startSeconds }
        : null,
    towers:
      times.state === 'failed'
        ? []
        : towersOf(
            card?.steps ?? [],
            names,
            workFrom,
            Math.min(times.workSeconds, times.endSeconds - workFrom),
          ),
    promise: fact?.promise
      ? {
          startSeconds: fact.promise.startSeconds,
          endSeconds: fact.promise.endSeconds,
          level: 0,
        }
      : null,
    arrival:
      visitId === null
        ? null
        : {
            earlySeconds: times.arriveEarlySeconds,
            meanSeconds: times.arriveSeconds,
            lateSeconds: times.arriveLateSeconds,
          },
    onTimePermille: times.onTimePermille,
    atRisk: isAtRisk(times, safePermille, over, fact),
    pinned: Boolean(stop?.pinned) || fact?.pin?.vanId === runTimes.vanId,
    failedReason: source.failedReasons.get(times.stopId) ?? null,
  };
}

/** A promise already kept or broken is a fact, no longer a risk: only a late arrival stays marked. */
function isAtRisk(times: StopTimes, safePermille: number, over: boolean, fact?: VisitFact) {
  if (!fact?.promise) return false;
  const here = over || times.state === 'arrived' || times.state === 'working';
  if (here) return times.arriveSeconds > fact.promise.endSeconds;
  return times.onTimePermille !== null && times.onTimePermille < safePermille;
}

function placeName(source: StripSource, stop: Run['stops'][number] | undefined) {
  if (stop?.kind !== 'refill') return undefined;
  return source.problem.refills.find((place) => place.id === stop.placeId)?.name;
}

function waterOf(tanks: readonly Tank[], times: RunTimes): Strip['water'] {
  const tank = tanks.find((one) => one.kind === 'fresh');
  if (!tank) return null;
  const used = times.stops.map(
    (stop) => stop.tanksUsedMl.find((one) => one.kind === 'fresh')?.usedMl ?? 0,
  );
  return {
    usedMl: Math.max(tank.usedAtStartMl, ...used),
    capacityMl: tank.capacityMl,
    refills: times.stops.filter((stop) => stop.kind === 'refill').length,
  };
}
