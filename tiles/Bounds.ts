/** A box in WGS84 degrees. Areas across the date line are not supported. */
export interface Bounds {
  west: number;
  south: number;
  east: number;
  north: number;
}

/** The box grown by metres on every side. */
export function growBounds(bounds: Bounds, metres: number): Bounds {
  const latDegrees = metres / METRES_PER_DEGREE;
  const middle = ((bounds.south + bounds.north) / 2) * (Math.PI / 180);
  const lonDegrees = latDegrees / Math.max(0.01, Math.cos(middle));
  return {
    west: Math.max(-180, bounds.west - lonDegrees),
    south: Math.max(-90, bounds.south - latDegrees),
    east: Math.min(180, bounds.east + lonDegrees),
    north: Math.min(90, bounds.north + latDegrees),
  };
}

/** Mean sphere of 6371008.8 m. */
const METRES_PER_DEGREE = 111195.08;
