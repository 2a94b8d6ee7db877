import { distanceMetres, type LatLon } from './distanceMetres.ts';

/** Roads are this much longer than the straight line: mean 1.417, Boscoe, Henry & Zdeb 2012, Prof. Geographer 64(2). */
const DETOUR = 1.4;
/** Door-to-door town speed, common practice; only ever shown as rough. */
const METRES_PER_SECOND = 30 / 3.6;

/** A drive nobody looked up on a road map. Whole seconds and whole metres; always shown as rough. */
export interface StraightLineLeg {
  seconds: number;
  metres: number;
  rough: true;
}

/** What a drive might be where no road answer exists: straight line × 1.4 at 30 km/h. */
export function straightLineLeg(from: LatLon, to: LatLon): StraightLineLeg {
  const metres = Math.round(distanceMetres(from, to) * DETOUR);
  return { seconds: Math.round(metres / METRES_PER_SECOND), metres, rough: true };
}
