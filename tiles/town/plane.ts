/** Geometry on the town's flat drawing board: metres east and north of the old quay. */
export type Point = readonly [x: number, y: number];
export type Line = readonly Point[];

export const gap = (a: Point, b: Point) => Math.hypot(a[0] - b[0], a[1] - b[1]);

export const blend = (a: Point, b: Point, t: number): Point => [
  a[0] + (b[0] - a[0]) * t,
  a[1] + (b[1] - a[1]) * t,
];

/** A smooth curve through the given points (Catmull–Rom), in steps of about `step` metres. */
export function curve(points: Line, step: number): Point[] {
  const out: Point[] = [];
  for (let i = 0; i + 1 < points.length; i++) {
    const b = points[i]!;
    const c = points[i + 1]!;
    const a = points[i - 1] ?? blend(c, b, 2);
    const d = points[i + 2] ?? blend(b, c, 2);
    const pieces = Math.max(1, Math.round(gap(b, c) / step));
    for (let k = 0; k < pieces; k++) out.push(catmullRom(a, b, c, d, k / pieces));
  }
  out.push(points.at(-1)!);
  return out;
}

function catmullRom(a: Point, b: Point, c: Point, d: Point, t: number): Point {
  const along = (i: 0 | 1) =>
    0.5 *
    (2 * b[i] +
      (c[i] - a[i]) * t +
      (2 * a[i] - 5 * b[i] + 4 * c[i] - d[i]) * t * t +
      (3 * b[i] - a[i] - 3 * c[i] + d[i]) * t * t * t);
  return [along(0), along(1)];
}

/** Even–odd rule; the ring need not repeat its first point. */
export function isInside(p: Point, ring: Line): boolean {
  // Indexed access on purpose: this is where drawing the town spends its time.
  const x = p[0];
  const y = p[1];
  let inside = false;
  let before = ring[ring.length - 1]!;
  for (let i = 0; i < ring.length; i++) {
    const here = ring[i]!;
    if (here[1] > y !== before[1] > y) {
      const cut = ((before[0] - here[0]) * (y - here[1])) / (before[1] - here[1]) + here[0];
      if (x < cut) inside = !inside;
    }
    before = here;
  }
  return inside;
}

/** The place on segment ab nearest to p, and how far along (0–1) it lies. */
export function nearestOnSegment(p: Point, a: Point, b: Point): { at: Point; t: number } {
  const dx = b[0] - a[0];
  const dy = b[1] - a[1];
  const length2 = dx * dx + dy * dy;
  const raw = length2 === 0 ? 0 : ((p[0] - a[0]) * dx + (p[1] - a[1]) * dy) / length2;
  const t = Math.max(0, Math.min(1, raw));
  return { at: [a[0] + dx * t, a[1] + dy * t], t };
}

/** Where segments ab and cd cross: shares along each, or null. */
export function crossing(a: Point, b: Point, c: Point, d: Point): { t: number; u: number } | null {
  const rx = b[0] - a[0];
  const ry = b[1] - a[1];
  const sx = d[0] - c[0];
  const sy = d[1] - c[1];
  const det = rx * sy - ry * sx;
  if (Math.abs(det) < 1e-9) return null;
  const t = ((c[0] - a[0]) * sy - (c[1] - a[1]) * sx) / det;
  const u = ((c[0] - a[0]) * ry - (c[1] - a[1]) * rx) / det;
  return t >= 0 && t <= 1 && u >= 0 && u <= 1 ? { t, u } : null;
}

/** A closed, uneven blob around a centre: a park, a wood, an island. `phase` varies its shape. */
export function blob(centre: Point, radius: number, phase: number, points = 28): Point[] {
  return Array.from({ length: points }, (_, i) => {
    const angle = (i / points) * 2 * Math.PI;
    const r =
      radius *
      (1 +
        0.16 * Math.sin(2 * angle + phase) +
        0.1 * Math.sin(3 * angle + 2.3 * phase) +
        0.05 * Math.sin(5 * angle + 3.7 * phase));
    return [centre[0] + r * Math.cos(angle), centre[1] + r * Math.sin(angle)] as const;
  });
}

/** A ribbon around a line whose half-width is given per share (0–1) of its points. */
export function ribbon(line: Line, halfWidth: (share: number) => number): Point[] {
  const left: Point[] = [];
  const right: Point[] = [];
  line.forEach((p, i) => {
    const a = line[Math.max(0, i - 1)]!;
    const b = line[Math.min(line.length - 1, i + 1)]!;
    const length = gap(a, b) || 1;
    const w = halfWidth(i / (line.length - 1));
    const nx = (-(b[1] - a[1]) / length) * w;
    const ny = ((b[0] - a[0]) / length) * w;
    left.push([p[0] + nx, p[1] + ny]);
    right.push([p[0] - nx, p[1] - ny]);
  });
  return [...left, ...right.reverse()];
}

export function lengthOf(line: Line): number {
  let sum = 0;
  for (let i = 1; i < line.length; i++) sum += gap(line[i - 1]!, line[i]!);
  return sum;
}

/** Segments found by place: which may pass within `reach` metres of a point. */
export class SegmentGrid<T> {
  readonly #cells = new Map<number, T[]>();
  readonly #size: number;

  constructor(size: number) {
    this.#size = size;
  }

  add(a: Point, b: Point, item: T): void {
    this.#eachCell(a, b, 0, (key) => {
      const cell = this.#cells.get(key);
      if (cell) cell.push(item);
      else this.#cells.set(key, [item]);
    });
  }

  near(a: Point, b: Point, reach: number): Set<T> {
    const found = new Set<T>();
    this.#eachCell(a, b, reach, (key) => {
      for (const item of this.#cells.get(key) ?? []) found.add(item);
    });
    return found;
  }

  #eachCell(a: Point, b: Point, reach: number, visit: (key: number) => void) {
    const cell = (v: number) => Math.floor(v / this.#size);
    const toX = cell(Math.max(a[0], b[0]) + reach);
    const toY = cell(Math.max(a[1], b[1]) + reach);
    for (let x = cell(Math.min(a[0], b[0]) - reach); x <= toX; x++)
      for (let y = cell(Math.min(a[1], b[1]) - reach); y <= toY; y++)
        visit((x + 32768) * 65536 + y + 32768);
  }
}
