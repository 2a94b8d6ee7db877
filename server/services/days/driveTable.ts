import type { DayProblem } from '#shared/schedule/types.ts';
import { straightLineLeg } from '#shared/travel/straightLineLeg.ts';
import { areaFor } from '#server/area/openAreas.ts';

/** Points and drive matrix of a day: road seconds, or straight-line ones marked rough without an area. */
export async function driveTable(
  areaName: string,
  points: { id: string; lat: number; lon: number }[],
  cvPermille: number,
): Promise<Pick<DayProblem, 'points' | 'drive'>> {
  const area = areaName ? areaFor(areaName) : null;
  const table = area ? area.table(points) : straightTable(points);
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

/** A point is rough when no leg from it has a road answer. */
function isRough(rough: boolean[], index: number, size: number): boolean {
  if (size === 1) return false;
  for (let to = 0; to < size; to++) if (to !== index && !rough[index * size + to]) return false;
  return true;
}

function straightTable(points: { lat: number; lon: number }[]) {
  const legs = points.flatMap((from) => points.map((to) => straightLineLeg(from, to)));
  return {
    seconds: legs.map((leg) => leg.seconds),
    metres: legs.map((leg) => leg.metres),
    rough: legs.map(() => true),
  };
}
