import type { DayProblem } from './types.ts';

/** Says in words what in a day contradicts itself, naming the field; null when all is well. */
export function badProblem(problem: DayProblem): string | null {
  const n = problem.points.length;
  const { baseSeconds, metres, bands } = problem.drive;
  if (baseSeconds.length !== n * n)
    return `drive.baseSeconds: has ${baseSeconds.length} numbers; ${n} points need ${n * n}`;
  if (metres.length !== n * n)
    return `drive.metres: has ${metres.length} numbers; ${n} points need ${n * n}`;
  if (bands.length < 1 || bands.length > 8 || bands[0]!.fromSeconds > 0)
    return 'drive.bands: needs 1 to 8 bands, the first from second 0';
  for (let i = 0; i < bands.length; i += 1) {
    if (!(bands[i]!.permille > 0)) return `drive.bands[${i}].permille: must be above 0`;
    if (i > 0 && bands[i]!.fromSeconds <= bands[i - 1]!.fromSeconds)
      return `drive.bands[${i}].fromSeconds: bands must ascend`;
  }
  const isPoint = (point: number) => Number.isInteger(point) && point >= 0 && point < n;
  const vanIds = new Set<string>();
  for (const van of problem.vans) {
    if (vanIds.has(van.vanId)) return `vans: '${van.vanId}' is there twice; one shift a van`;
    vanIds.add(van.vanId);
    if (!isPoint(van.startPoint) || !isPoint(van.endPoint))
      return `vans '${van.vanId}': startPoint and endPoint must be indices of points (0–${n - 1})`;
    if (van.endSeconds < van.startSeconds)
      return `vans '${van.vanId}'.endSeconds: the shift must not end before it starts`;
  }
  const visitIds = new Set<string>();
  for (const visit of problem.visits) {
    if (visitIds.has(visit.id)) return `visits: '${visit.id}' is there twice`;
    visitIds.add(visit.id);
    if (!isPoint(visit.point))
      return `visits '${visit.id}'.point: must be an index of points (0–${n - 1})`;
    if (visit.work.meanSeconds < 0 || visit.work.varianceSeconds2 < 0)
      return `visits '${visit.id}'.work: seconds and variance must be 0 or more`;
  }
  for (const place of problem.refills)
    if (!isPoint(place.point))
      return `refills '${place.id}'.point: must be an index of points (0–${n - 1})`;
  return null;
}
