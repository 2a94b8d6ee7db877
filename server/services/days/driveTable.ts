import type { DayProblem } from '#shared/schedule/types.ts';
import { straightLineLeg } from '#shared/travel/straightLineLeg.ts';
import type { Area, DriveTable } from '#server/area/Area.ts';
import { areaFor } from '#server/area/openAreas.ts';

type Point = { id: string; lat: number; lon: number };

/** Points and drive matrix of a day: road seconds, or straight-line ones marked rough without an area. */
export async function driveTable(
  areaName: string,
  points: Point[],
  cvPermille: number,
): Promise<Pick<DayProblem, 'points' | 'drive'>> {
  const area = areaName ? areaFor(areaName) : null;
  const table = area ? roadTable(area, points) : straightTable(points);
  return {
    points: points.map((point, index) => ({
      ...point,
      rough: isRough(table.rough, index, points.length),
    })),
    drive: {
      baseSeconds: table.seconds,
      metres: table.metres,
      bands: [{ fromSeconds: 0, permille: 1000 }],
      cvPermille,
    },
  };
}

/** Legs kept in all, about 50 MB: a dozen days of fifty vans. */
const mostLegs = 2_000_000;
/** The one used longest ago first. */
const known = new Map<string, DriveTable>();
let knownLegs = 0;

/**
 * A day is loaded for every look and every move, under its lock, and its points hardly change, while
 * a table of 400 points takes half a second. Nobody changes a table: problems are only read.
 */
function roadTable(area: Area, points: Point[]): DriveTable {
  const places = points.map(({ lat, lon }) => `${lat},${lon}`).join(' ');
  const key = `${area.name} ${area.version} ${places}`;
  const table = known.get(key) ?? area.table(points);
  if (!known.delete(key)) knownLegs += table.seconds.length;
  known.set(key, table);
  for (const [oldest, { seconds }] of known) {
    if (knownLegs <= mostLegs || oldest === key) break;
    known.delete(oldest);
    knownLegs -= seconds.length;
  }
  return table;
}

/** A point is rough when no leg from it has a road answer. */
function isRough(rough: boolean[], index: number, size: number): boolean {
  if (size === 1) return false;
  for (let to = 0; to < size; to++) if (to !== index && !rough[index * size + to]) return false;
  return true;
}

function straightTable(points: Point[]): DriveTable {
  const legs = points.flatMap((from) => points.map((to) => straightLineLeg(from, to)));
  return {
    seconds: legs.map((leg) => leg.seconds),
    metres: legs.map((leg) => leg.metres),
    rough: legs.map(() => true),
  };
}
