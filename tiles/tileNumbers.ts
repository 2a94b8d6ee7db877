/**
 * Which Web Mercator tile a place lies in (OSM wiki, "Slippy map tilenames"). Latitudes beyond
 * ±85.0511° lie outside the scheme and are held at its edge.
 */
export function tileNumbers(lat: number, lon: number, z: number): { x: number; y: number } {
  const count = 2 ** z;
  const phi = (Math.max(-MOST_LAT, Math.min(MOST_LAT, lat)) * Math.PI) / 180;
  const clamp = (n: number) => Math.max(0, Math.min(count - 1, Math.floor(n)));
  return {
    x: clamp(((lon + 180) / 360) * count),
    y: clamp(((1 - Math.asinh(Math.tan(phi)) / Math.PI) / 2) * count),
  };
}

/** North-west corner of a tile in degrees. */
export function tileCorner(z: number, x: number, y: number): { lat: number; lon: number } {
  const count = 2 ** z;
  return {
    lat: (Math.atan(Math.sinh(Math.PI * (1 - (2 * y) / count))) * 180) / Math.PI,
    lon: (x / count) * 360 - 180,
  };
}

const MOST_LAT = 85.05112877980659;
