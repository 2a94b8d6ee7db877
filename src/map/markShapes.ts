/** Outlines of the vans' shapes in a 16 × 16 box, matching the strips. An unknown shape is a circle. */
export const MARK_SHAPES: Readonly<Record<string, string>> = {
  square: 'M2 2h12v12H2z',
  circle: 'M8 1.5a6.5 6.5 0 1 1 0 13a6.5 6.5 0 1 1 0-13z',
  triangle: 'M8 1.5 15 14H1z',
  diamond: 'M8 .8 15.2 8 8 15.2.8 8z',
  hexagon: 'M4.4 1.8h7.2L15.2 8l-3.6 6.2H4.4L.8 8z',
  cross: 'M5.5 1.5h5v4h4v5h-4v4h-5v-4h-4v-5h4z',
};

export function markShape(name: string): string {
  return MARK_SHAPES[name] ?? MARK_SHAPES.circle!;
}
