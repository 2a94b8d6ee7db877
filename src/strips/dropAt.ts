import { secondsAt, type TimeAxis } from './timeAxis.ts';
import type { StripRow } from './stripLayout.ts';
import type { Strip } from './types.ts';

/** Where a visit would land: a van and the place among its other visits, 0 first. */
export interface DropTarget {
  vanId: string;
  index: number;
}

/**
 * The place under a point of the drawing for a visit being dragged; null outside the rows. Places
 * before a stop that has begun do not exist: the target moves behind it.
 */
export function dropAt(
  strips: readonly Strip[],
  rows: readonly StripRow[],
  axis: TimeAxis,
  x: number,
  y: number,
  visitId: string,
): DropTarget | null {
  const at = rows.findIndex((row) => y >= row.top && y < row.top + row.height);
  const strip = strips[at];
  if (!strip) return null;
  const others = strip.stops.filter((stop) => stop.kind === 'visit' && stop.visitId !== visitId);
  const begun = others.filter((stop) => stop.state !== 'ahead').length;
  const seconds = secondsAt(axis, x);
  const before = others.filter((stop) => (stop.fromSeconds + stop.toSeconds) / 2 < seconds).length;
  return { vanId: strip.vanId, index: Math.max(begun, before) };
}

/** The moment a drop mark stands at: halfway between the neighbours of the place. */
export function dropSeconds(strip: Strip, target: DropTarget, visitId: string): number {
  const others = strip.stops.filter((stop) => stop.kind === 'visit' && stop.visitId !== visitId);
  const before = others[target.index - 1];
  const after = others[target.index];
  if (before && after) return (before.toSeconds + after.fromSeconds) / 2;
  if (before) return before.toSeconds + MARK_GAP;
  if (after) return after.fromSeconds - MARK_GAP;
  return strip.shiftStartSeconds + MARK_GAP;
}

const MARK_GAP = 300;
