import type { Strip } from './types.ts';

/** Where a van's strip stands in the drawing, pixels from the top. */
export interface StripRow {
  vanId: string;
  top: number;
  height: number;
  /** The ground line: towers stand on it, names hang below. */
  baseline: number;
  towerPx: number;
  compact: boolean;
}

export const AXIS_HEIGHT = 26;

/** Rows one under the other; a van whose promises overlap is a little taller than the others. */
export function stripRows(strips: readonly Strip[], compact: boolean): StripRow[] {
  let top = AXIS_HEIGHT;
  return strips.map((strip) => {
    const brackets = BRACKET_GAP * Math.max(1, strip.bracketLevels) + (compact ? 6 : 10);
    const towerPx = compact ? 26 : 42;
    const baseline = top + brackets + towerPx + 4;
    const height = baseline - top + (compact ? 24 : 46);
    const row = { vanId: strip.vanId, top, height, baseline, towerPx, compact };
    top += height;
    return row;
  });
}

export function stripsHeight(rows: readonly StripRow[]): number {
  const last = rows.at(-1);
  return last ? last.top + last.height : AXIS_HEIGHT + 40;
}

/** The line a promise bracket of a level hangs from. */
export function bracketY(row: StripRow, level: number): number {
  return row.baseline - row.towerPx - 9 - level * BRACKET_GAP;
}

/** No step is so light that its tower vanishes. */
export function towerHeight(row: StripRow, attentionPermille: number): number {
  return 7 + ((row.towerPx - 7) * Math.min(1000, Math.max(0, attentionPermille))) / 1000;
}

const BRACKET_GAP = 11;
