import type { DayProblem, RunTimes } from '#shared/schedule/types.ts';

/** Where a run goes, in order, `[lat, lon]`: start, every stop with a place of its own, end. */
export function routePoints(problem: DayProblem, times: RunTimes): [number, number][] {
  const van = problem.vans.find((one) => one.vanId === times.vanId);
  if (!van || times.stops.length === 0) return [];
  const order = [van.startPoint, ...times.stops.map((stop) => stop.point), van.endPoint];
  const points: [number, number][] = [];
  let last = -1;
  for (const index of order) {
    const point = problem.points[index];
    if (!point || index === last) continue;
    last = index;
    points.push([point.lat, point.lon]);
  }
  return points;
}
