import type { RunView } from './runView.ts';

/** Where the run goes in order, `[lat, lon]`: start, every stop driven to, end. */
export function runPoints({ problem, times, stops }: RunView): [number, number][] {
  const van = problem.vans.find(({ vanId }) => vanId === times.vanId);
  if (!van) return [];
  // Nobody drives to a stop given up from afar; meals and rests are taken where the van stands.
  const driven = stops.filter(
    ({ state, happened }) => state !== 'failed' || happened?.fact.arrivedSeconds != null,
  );
  const order = [van.startPoint, ...driven.map((stop) => stop.times.point), van.endPoint];
  return order.flatMap((index, at): [number, number][] => {
    const point = problem.points[index];
    return point && index !== order[at - 1] ? [[point.lat, point.lon]] : [];
  });
}
