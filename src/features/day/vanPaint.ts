import type { LineDash } from '#src/map/RunLine.tsx';

/** How a van is drawn on map and strips: colour and line pattern by its place in the day's list. */
export interface VanPaint {
  color: string;
  dash: LineDash;
}

/** Neighbouring vans differ in both; with the shape mark no two of the first dozen look alike. */
export function vanPaint(index: number): VanPaint {
  const at = Math.max(0, index);
  return { color: colors[at % colors.length]!, dash: dashes[at % dashes.length]! };
}

/** Literal values: the map's canvas cannot read custom properties. All over 3 : 1 on paper. */
const colors = ['#17544e', '#56708a', '#6b4433', '#a8561f', '#4f6b2f', '#7a4468'];
/** In the map's own order, named here so that the strips need not load the map. */
const dashes: LineDash[] = ['solid', 'dashed', 'dotted', 'dashdot'];
