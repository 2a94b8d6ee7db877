import { type Line, type Point, SegmentGrid } from './plane.ts';

interface Sample {
  at: Point;
  cos4: number;
  sin4: number;
}

const REACH = 1100;
const LATTICE = 60;

/**
 * Which way streets run at a place: along or across the main roads near it. Four-fold symmetric, so
 * that "along" and "across" need no telling apart; the answer is the one of four headings nearest to
 * the heading asked with.
 */
export function streetField(mainRoads: readonly Line[]) {
  const grid = new SegmentGrid<Sample>(300);
  for (const line of mainRoads) {
    for (let i = 1; i < line.length; i++) {
      const a = line[i - 1]!;
      const b = line[i]!;
      const angle = 4 * Math.atan2(b[1] - a[1], b[0] - a[0]);
      grid.add(a, b, { at: a, cos4: Math.cos(angle), sin4: Math.sin(angle) });
    }
  }
  const lattice = new Map<string, number>();
  const angleAt = (x: number, y: number): number => {
    const key = `${Math.round(x / LATTICE)},${Math.round(y / LATTICE)}`;
    let angle = lattice.get(key);
    if (angle === undefined) {
      angle = blendedAngle(grid, [x, y]);
      lattice.set(key, angle);
    }
    return angle;
  };
  return (at: Point, heading: number): number => {
    const quarter = Math.PI / 2;
    const angle = angleAt(at[0], at[1]);
    return angle + Math.round((heading - angle) / quarter) * quarter;
  };
}

function blendedAngle(grid: SegmentGrid<Sample>, at: Point): number {
  let cos4 = 0;
  let sin4 = 0;
  for (const sample of grid.near(at, at, REACH)) {
    const distance2 = (sample.at[0] - at[0]) ** 2 + (sample.at[1] - at[1]) ** 2;
    if (distance2 > REACH * REACH) continue;
    const weight = 1 / (distance2 + 120 * 120);
    cos4 += sample.cos4 * weight;
    sin4 += sample.sin4 * weight;
  }
  return Math.atan2(sin4, cos4) / 4;
}
