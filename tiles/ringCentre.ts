import type { Position } from 'geojson';

/** Centre of gravity of a closed ring; the mean of its points when it encloses nothing. */
export function ringCentre(ring: readonly Position[]): Position {
  const [originX, originY] = ring[0] as [number, number];
  let twiceArea = 0;
  let x = 0;
  let y = 0;
  for (let i = 0; i + 1 < ring.length; i++) {
    const ax = ring[i]![0]! - originX;
    const ay = ring[i]![1]! - originY;
    const bx = ring[i + 1]![0]! - originX;
    const by = ring[i + 1]![1]! - originY;
    const cross = ax * by - bx * ay;
    twiceArea += cross;
    x += (ax + bx) * cross;
    y += (ay + by) * cross;
  }
  if (Math.abs(twiceArea) > 1e-15)
    return [originX + x / (3 * twiceArea), originY + y / (3 * twiceArea)];
  const mean = (axis: 0 | 1) => ring.reduce((sum, p) => sum + p[axis]!, 0) / ring.length;
  return [mean(0), mean(1)];
}
