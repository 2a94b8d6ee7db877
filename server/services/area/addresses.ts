import { distanceMetres } from '#shared/travel/distanceMetres.ts';
import { straightLineLeg } from '#shared/travel/straightLineLeg.ts';
import { Place } from '#server/models/Place.ts';
import { areaOf, isOutside } from './areas.ts';

/** How far an address may lie from a pin to be called its address. */
const nearMetres = 300;

/** Addresses that match some text, those near the business's depot first among equals. */
export async function findAddresses(businessId: string, text: string, limit: number) {
  const area = await areaOf(businessId);
  if (!area) return [];
  const depot = await Place.findOne({ where: { kind: 'depot' } });
  return area.findAddresses(text, depot ?? undefined, limit);
}

export async function findNearestAddress(businessId: string, lat: number, lon: number) {
  const area = await areaOf(businessId);
  const found = area?.nearestAddress(lat, lon) ?? null;
  const near = found && distanceMetres(found, { lat, lon }) <= nearMetres ? found : null;
  return { address: near, outsideArea: isOutside(area, lat, lon) };
}

/** Road shapes of the legs through points in order; straight and rough without an area. */
export async function getRoadLines(businessId: string, points: [number, number][]) {
  const area = await areaOf(businessId);
  const at = points.map(([lat, lon]) => ({ lat, lon }));
  const legs = at.slice(1).map((to, index) => {
    const from = at[index]!;
    if (area) {
      const { line, seconds, metres, rough } = area.route(from, to);
      return { line, driveSeconds: seconds, driveMetres: metres, rough };
    }
    const { seconds, metres } = straightLineLeg(from, to);
    return {
      line: [points[index]!, points[index + 1]!],
      driveSeconds: seconds,
      driveMetres: metres,
      rough: true,
    };
  });
  return { legs };
}
