import { along } from '@turf/along';
import { lineString } from '@turf/helpers';
import { length } from '@turf/length';

/** Where a van is expected `elapsedSeconds` into a route, at even speed; the end once it should be there. */
export function pointAlong(
  route: { seconds: number; line: [number, number][] },
  elapsedSeconds: number,
): { lat: number; lon: number } | null {
  const [first] = route.line;
  if (!first) return null;
  if (route.line.length < 2 || route.seconds <= 0) return { lat: first[0], lon: first[1] };
  // turf speaks GeoJSON: longitude first.
  const line = lineString(route.line.map(([lat, lon]) => [lon, lat]));
  const share = Math.min(1, Math.max(0, elapsedSeconds / route.seconds));
  const [lon, lat] = along(line, length(line) * share).geometry.coordinates;
  return { lat: lat!, lon: lon! };
}
