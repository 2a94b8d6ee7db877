const marginDegrees = 0.04;

/**
 * [minLon, minLat, maxLon, maxLat] around a few places with about 4 km to spare: how far this map
 * can be dragged.
 */
export function boundsAround(
  places: readonly { lat: number; lon: number }[],
): [number, number, number, number] {
  const lats = places.map(({ lat }) => lat);
  const lons = places.map(({ lon }) => lon);
  return [
    Math.min(...lons) - marginDegrees,
    Math.min(...lats) - marginDegrees,
    Math.max(...lons) + marginDegrees,
    Math.max(...lats) + marginDegrees,
  ];
}
