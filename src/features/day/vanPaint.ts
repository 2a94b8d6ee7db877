/** How a van is drawn on map and strips: colour and line pattern by its place in the day's list. */
export interface VanPaint {
  color: string;
  /** SVG dash array; '' is an unbroken line. */
  dash: string;
}

/** Neighbouring vans differ in both; with the shape mark no two of the first 30 look alike. */
export function vanPaint(index: number): VanPaint {
  return { color: colors[index % colors.length]!, dash: dashes[index % dashes.length]! };
}

/** Literal values: the map's canvas cannot read custom properties. All over 3 : 1 on paper. */
const colors = ['#17544e', '#56708a', '#6b4433', '#a8561f', '#4f6b2f', '#7a4468'];
const dashes = ['', '11 6', '2 7', '14 5 2 5', '6 4'];
