import type { Area } from '#server/area/Area.ts';
import { areaFor, listAreas } from '#server/area/openAreas.ts';
import { Business } from '#server/models/Business.ts';

/** Areas imported on this server. */
export function listImportedAreas() {
  return listAreas().map(({ name, version, addressCount, bounds, attribution }) => ({
    name,
    version,
    addressCount,
    bounds: boxOf(bounds),
    attribution,
  }));
}

/** The working area of a business, or null before one is chosen. */
export async function areaOf(businessId: string): Promise<Area | null> {
  const business = await Business.findByPk(businessId);
  return business?.areaName ? areaFor(business.areaName) : null;
}

/** True when a point lies outside the area's box; false without an area (nothing to compare with). */
export function isOutside(area: Area | null, lat: number, lon: number): boolean {
  if (!area) return false;
  const { west, south, east, north } = area.bounds;
  return lat < south || lat > north || lon < west || lon > east;
}

/** A box in GeoJSON's order (RFC 7946 §5): west, south, east, north. */
export function boxOf(bounds: Area['bounds']): [number, number, number, number] {
  return [bounds.west, bounds.south, bounds.east, bounds.north];
}
