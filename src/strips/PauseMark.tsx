import { fitWords } from './fitWords.ts';
import type { StripRow } from './stripLayout.ts';
import { xOf, type TimeAxis } from './timeAxis.ts';
import type { StripStop } from './types.ts';

/** Meal, rest and errand as a dashed box with its word; a refill as a drop with a plus. */
export function PauseMark({ stop, row, axis }: { stop: StripStop; row: StripRow; axis: TimeAxis }) {
  const x = xOf(axis, stop.fromSeconds);
  const width = Math.max(4, xOf(axis, stop.toSeconds) - x);
  const faded = stop.state === 'done' ? 0.5 : 1;
  if (stop.kind === 'refill')
    return (
      <g opacity={faded}>
        <line
          x1={x}
          x2={x + width}
          y1={row.baseline + 0.5}
          y2={row.baseline + 0.5}
          stroke="var(--collar)"
          strokeWidth={1.5}
        />
        <circle
          cx={x + width / 2}
          cy={row.baseline - 9}
          r={7}
          fill="var(--mint)"
          stroke="var(--ink)"
        />
        <path
          d={`M${x + width / 2 - 3.5} ${row.baseline - 9}h7m-3.5 -3.5v7`}
          stroke="var(--ink)"
          strokeWidth={1.4}
        />
      </g>
    );
  return (
    <g opacity={faded}>
      <rect
        x={x + 0.5}
        y={row.baseline - 9.5}
        width={width - 1}
        height={9.5}
        rx={3}
        fill="var(--cream)"
        stroke="#B9A98A"
        strokeDasharray="3 3"
      />
      <text x={x + 3} y={row.baseline - 14} fontSize={11} fill="var(--slate)">
        {fitWords(stop.kind, width + 12, 11)}
      </text>
    </g>
  );
}
