import type { DayProblem, RunTimes } from '#shared/schedule/types.ts';
import { distanceMetres } from '#shared/travel/distanceMetres.ts';

/**
 * Where a van ought to be at a moment, `[lat, lon]`: at its stop, or along the road to the next one
 * by the share of the drive's time gone. `legs` are the run's road lines in order; without them the
 * straight line is taken. null before it leaves and after it is home. A forecast, never a fix.
 */
export function expectedPlace(
  problem: DayProblem,
  run: RunTimes,
  legs: readonly { line: [number, number][] }[] | null,
  nowSeconds: number,
): [number, number] | null {
  const van = problem.vans.find((one) => one.vanId === run.vanId);
  const last = run.stops.at(-1);
  if (!van || !last || nowSeconds < run.leaveSeconds) return null;
  let from = van.startPoint;
  let leg = 0;
  for (const stop of run.stops) {
    if (stop.driveSeconds > 0 && nowSeconds < stop.arriveSeconds)
      return along(problem, from, stop.point, legs?.[leg], shareOf(stop, nowSeconds));
    if (stop.point !== from) leg += 1;
    from = stop.point;
    if (nowSeconds < stop.endSeconds) return placeOfPoint(problem, from);
  }
  const home = last.endSeconds + run.homeDriveSeconds;
  if (nowSeconds >= home || run.homeDriveSeconds === 0) return null;
  const share = (nowSeconds - last.endSeconds) / run.homeDriveSeconds;
  return along(problem, from, van.endPoint, legs?.[leg], share);
}

function shareOf(stop: RunTimes['stops'][number], nowSeconds: number): number {
  const whole = stop.arriveSeconds - stop.departSeconds;
  return whole <= 0 ? 1 : Math.min(1, Math.max(0, (nowSeconds - stop.departSeconds) / whole));
}

function along(
  problem: DayProblem,
  from: number,
  to: number,
  leg: { line: [number, number][] } | undefined,
  share: number,
): [number, number] | null {
  const ends = [placeOfPoint(problem, from), placeOfPoint(problem, to)];
  const line =
    leg && leg.line.length > 1 ? leg.line : ends.flatMap((end) => (end === null ? [] : [end]));
  const lengths = line
    .slice(1)
    .map((point, index) => distanceMetres(latLon(line[index]!), latLon(point)));
  let left = share * lengths.reduce((sum, metres) => sum + metres, 0);
  for (const [index, metres] of lengths.entries()) {
    if (left <= metres && metres > 0) {
      const [a, b] = [line[index]!, line[index + 1]!];
      return [a[0] + ((b[0] - a[0]) * left) / metres, a[1] + ((b[1] - a[1]) * left) / metres];
    }
    left -= metres;
  }
  return line.at(-1) ?? null;
}

function placeOfPoint(problem: DayProblem, index: number): [number, number] | null {
  const point = problem.points[index];
  return point ? [point.lat, point.lon] : null;
}

function latLon([lat, lon]: [number, number]) {
  return { lat, lon };
}
