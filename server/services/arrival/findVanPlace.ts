import { Op } from 'sequelize';
import type { RunHappened } from '#shared/schedule/reduceEvents.ts';
import type { DayProblem } from '#shared/schedule/types.ts';
import { distanceMetres } from '#shared/travel/distanceMetres.ts';
import { formatWall } from '#shared/time/formatWall.ts';
import { instantToSeconds } from '#shared/time/wallSeconds.ts';
import type { Area } from '#server/area/Area.ts';
import type { Run } from '#server/models/Run.ts';
import { RunFix } from '#server/models/RunFix.ts';
import { pointAlong } from './pointAlong.ts';

/** A fix counts as live this long. */
const liveMs = 2 * 60_000;
/** The van is shown only once it is this far, in metres and seconds, from where it came from. */
const awayMetres = 400;
const awaySeconds = 180;

export interface VanPlace {
  lat: number;
  lon: number;
  freshness: 'live' | 'expected';
  words: string;
}

/**
 * Where the van is on its way to a stop: a live fix, else the place expected along the route since it
 * set out, labelled so. null until it is away from the stop before, whose household is nobody's business.
 */
export async function findVanPlace(input: {
  problem: DayProblem;
  happened: RunHappened;
  stopId: string;
  run: Run;
  area: Area | null;
  now: Date;
}): Promise<VanPlace | null> {
  const { problem, happened, stopId, run, area, now } = input;
  const since = happened.stops.get(stopId)?.fact.drivingSinceSeconds;
  const visit = problem.visits.find((one) => one.id === stopId);
  if (since == null || !visit) return null;
  const elapsed = instantToSeconds(problem.dayStartUtc, now.toISOString()) - since;
  const from = originOf(problem, happened, stopId, since);
  const to = problem.points[visit.point]!;
  const fix = await RunFix.findOne({
    where: { runId: run.id, at: { [Op.gte]: new Date(now.getTime() - liveMs) } },
    order: [['at', 'DESC']],
  });
  const place = fix ?? (area ? pointAlong(area.route(from, to), elapsed) : null);
  if (!place || elapsed < awaySeconds || distanceMetres(place, from) < awayMetres) return null;
  if (fix)
    return {
      lat: fix.lat,
      lon: fix.lon,
      freshness: 'live',
      words: `Seen here ${formatWall(problem, instantToSeconds(problem.dayStartUtc, fix.at.toISOString()))}`,
    };
  return {
    lat: place.lat,
    lon: place.lon,
    freshness: 'expected',
    words: `Expected here along the route, set out ${formatWall(problem, since)}`,
  };
}

/** The place of the last stop left before the van set out, else where the run starts. */
function originOf(problem: DayProblem, happened: RunHappened, stopId: string, since: number) {
  let point = problem.vans[0]!.startPoint;
  let latest = -Infinity;
  for (const stop of happened.stops.values()) {
    const left = stop.fact.leftSeconds;
    if (stop.stopId === stopId || left === null || left > since || left < latest) continue;
    const visit = problem.visits.find((one) => one.id === stop.stopId);
    if (!visit || stop.fact.arrivedSeconds === null) continue;
    latest = left;
    point = visit.point;
  }
  return problem.points[point]!;
}
