import { memo } from 'react';
import type { DayClock } from '#shared/time/formatWall.ts';
import { DriveLine } from './DriveLine.tsx';
import { StopMark } from './StopMark.tsx';
import { useOvertimePaint } from './StripPatterns.tsx';
import type { StripRow } from './stripLayout.ts';
import { xOf, type TimeAxis } from './timeAxis.ts';
import type { Strip } from './types.ts';

export interface VanStripProps {
  day: DayClock;
  strip: Strip;
  row: StripRow;
  axis: TimeAxis;
  highlightedStopId: string | null;
  movedVisitIds: ReadonlySet<string>;
  carriedVisitId: string | null;
  /** By visit: arrival against the day as it is; null when no change is drawn. */
  shifts: ReadonlyMap<string, number> | null;
}

/** One van's day: shift, stops, the way home, overtime. */
export const VanStrip = memo(function VanStrip(props: VanStripProps) {
  const { strip, row, axis } = props;
  return (
    <g>
      <ShiftGround strip={strip} row={row} axis={axis} />
      {strip.stops.map((stop, index) => {
        const next = strip.stops.slice(index + 1).find((one) => one.kind === 'visit');
        return (
          <StopMark
            key={stop.stopId}
            day={props.day}
            stop={stop}
            vanName={strip.vanName}
            row={row}
            axis={axis}
            roomToSeconds={next?.fromSeconds ?? axis.toSeconds}
            highlighted={props.highlightedStopId === stop.stopId}
            moved={stop.visitId !== null && props.movedVisitIds.has(stop.visitId)}
            carried={stop.visitId !== null && props.carriedVisitId === stop.visitId}
            shiftSeconds={(stop.visitId && props.shifts?.get(stop.visitId)) || 0}
          />
        );
      })}
      {strip.home && <DriveLine drive={strip.home} axis={axis} y={row.baseline} />}
    </g>
  );
});

/** Where the shift begins and ends, loading and wash-down, and what runs over. */
function ShiftGround({ strip, row, axis }: { strip: Strip; row: StripRow; axis: TimeAxis }) {
  const over = useOvertimePaint();
  const y = row.baseline;
  const end = xOf(axis, strip.shiftEndSeconds);
  const finish = xOf(axis, strip.finishSeconds);
  const blocks = [strip.load, strip.washDown].flatMap((block) => (block ? [block] : []));
  return (
    <g pointerEvents="none">
      {[xOf(axis, strip.shiftStartSeconds), end].map((x, index) => (
        <line
          key={index}
          x1={x}
          x2={x}
          y1={y - 7}
          y2={y + 7}
          stroke="var(--ink)"
          strokeWidth={1.2}
        />
      ))}
      {blocks.map((block) => (
        <rect
          key={block.fromSeconds}
          x={xOf(axis, block.fromSeconds)}
          y={y - 3}
          width={Math.max(1, xOf(axis, block.toSeconds) - xOf(axis, block.fromSeconds))}
          height={6}
          rx={2}
          fill="var(--linen)"
          stroke="#B9A98A"
          strokeWidth={0.8}
        />
      ))}
      {finish > end + 1 && (
        <g>
          <rect x={end} y={y + 2} width={finish - end} height={5} fill={over} />
          <text
            x={finish + 4}
            y={y - 4}
            fontSize={11}
            fontWeight={600}
            fill="var(--rosette)"
          >{`▲ ${Math.round(strip.overtimeSeconds / 60)} min over`}</text>
        </g>
      )}
    </g>
  );
}
