import { distance } from '@turf/distance';

/** A place on the globe in WGS84 degrees. */
export interface LatLon {
  lat: number;
  lon: number;
}

/**
 * Great-circle distance in metres (not rounded) on a sphere of 6371008.8 m. Over a city it is within
 * 0.3 % of the ellipsoid, far below what a road's shape is known to.
 */
export function distanceMetres(from: LatLon, to: LatLon): number {
  return distance([from.lon, from.lat], [to.lon, to.lat], { units: 'meters' });
}
