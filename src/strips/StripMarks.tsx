import { formatWall, type DayClock } from '#shared/time/formatWall.ts';
import { dropSeconds, type DropTarget } from './dropAt.ts';
import { AXIS_HEIGHT, type StripRow } from './stripLayout.ts';
import { xOf, type TimeAxis } from './timeAxis.ts';
import type { Strip } from './types.ts';

/** Hours as hairlines with their wall times. */
export function HourLines({ axis, heightPx }: { axis: TimeAxis; heightPx: number }) {
  return (
    <g pointerEvents="none">
      {axis.ticks.map((tick) => {
        const x = xOf(axis, tick.seconds);
        return (
          <g key={tick.seconds}>
            <line x1={x} x2={x} y1={AXIS_HEIGHT} y2={heightPx - 4} stroke="var(--linen)" />
            <text
              x={x < 16 ? 0 : x}
              y={17}
              fontSize={12}
              textAnchor={x < 16 ? 'start' : 'middle'}
              fill="var(--slate)"
            >
              {tick.words}
            </text>
          </g>
        );
      })}
    </g>
  );
}

/** Now, a thin line with its time. */
export function NowLine({
  day,
  axis,
  seconds,
  heightPx,
}: {
  day: DayClock;
  axis: TimeAxis;
  seconds: number | null;
  heightPx: number;
}) {
  if (seconds === null || seconds < axis.fromSeconds || seconds > axis.toSeconds) return null;
  const x = xOf(axis, seconds);
  const left = x > axis.widthPx - 40;
  return (
    <g pointerEvents="none">
      <line x1={x} x2={x} y1={22} y2={heightPx - 4} stroke="var(--rosette)" strokeWidth={1.5} />
      <text
        x={left ? x - 5 : x + 5}
        y={32}
        fontSize={11}
        fontWeight={600}
        textAnchor={left ? 'end' : 'start'}
        fill="var(--rosette)"
        stroke="#fff"
        strokeWidth={3}
        paintOrder="stroke"
      >
        {formatWall(day, seconds)}
      </text>
    </g>
  );
}

export function dropMarkOf(
  drop: { target: DropTarget; visitId: string },
  strips: readonly Strip[],
  rows: readonly StripRow[],
  axis: TimeAxis,
) {
  const at = strips.findIndex((strip) => strip.vanId === drop.target.vanId);
  const strip = strips[at];
  if (!strip) return null;
  return { x: xOf(axis, dropSeconds(strip, drop.target, drop.visitId)), row: rows[at]!, axis };
}

/** Where a dragged visit would land: the row lights up, a caret stands in the gap. */
export function DropMark({ x, row, axis }: { x: number; row: StripRow; axis: TimeAxis }) {
  const top = row.top + 2;
  return (
    <g pointerEvents="none">
      <rect
        x={-8}
        y={top}
        width={axis.widthPx + 16}
        height={row.height - 4}
        rx={10}
        fill="var(--collar)"
        opacity={0.06}
      />
      <path
        d={`M${x - 6} ${top + 3}h12l-6 8zM${x} ${top + 8}V${row.baseline + 8}`}
        fill="var(--collar)"
        stroke="var(--collar)"
        strokeWidth={2.5}
        strokeLinejoin="round"
      />
    </g>
  );
}

/** The empty place a moved visit leaves behind. */
export function GhostMark({
  ghost,
  rows,
  axis,
}: {
  ghost: { vanId: string; fromSeconds: number; toSeconds: number };
  rows: readonly StripRow[];
  axis: TimeAxis;
}) {
  const row = rows.find((one) => one.vanId === ghost.vanId);
  if (!row) return null;
  const x = xOf(axis, ghost.fromSeconds);
  return (
    <rect
      x={x}
      y={row.baseline - row.towerPx * 0.6}
      width={Math.max(4, xOf(axis, ghost.toSeconds) - x)}
      height={row.towerPx * 0.6}
      rx={6}
      fill="none"
      stroke="var(--merle)"
      strokeWidth={1.2}
      strokeDasharray="2 4"
      pointerEvents="none"
    />
  );
}
