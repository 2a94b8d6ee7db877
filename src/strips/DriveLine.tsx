import { xOf, type TimeAxis } from './timeAxis.ts';
import type { Drive } from './types.ts';

/** Driving: a dotted ground line whose length is its minutes; a rough one wears longer gaps and "≈". */
export function DriveLine({ drive, axis, y }: { drive: Drive; axis: TimeAxis; y: number }) {
  const from = xOf(axis, drive.fromSeconds) + 2.5;
  const to = xOf(axis, drive.toSeconds) - 2.5;
  if (to <= from) return null;
  return (
    <g pointerEvents="none">
      <line
        x1={from}
        x2={to}
        y1={y}
        y2={y}
        stroke="var(--merle)"
        strokeWidth={2.5}
        strokeDasharray={drive.rough ? '1 8' : '1 5'}
        strokeLinecap="round"
      />
      {drive.rough && to - from > 14 && (
        <text x={(from + to) / 2} y={y - 4} fontSize={10} textAnchor="middle" fill="var(--slate)">
          ≈
        </text>
      )}
    </g>
  );
}
