import { memo } from 'react';
import type { DayClock } from '#shared/time/formatWall.ts';
import { DriveLine } from './DriveLine.tsx';
import { fitWords } from './fitWords.ts';
import { joinNarrow } from './joinNarrow.ts';
import { PauseMark } from './PauseMark.tsx';
import { PromiseBracket } from './PromiseBracket.tsx';
import { StepTowers } from './StepTowers.tsx';
import { stopSentence, stopWords } from './stopWords.ts';
import { towerHeight, type StripRow } from './stripLayout.ts';
import { xOf, type TimeAxis } from './timeAxis.ts';
import type { StripStop } from './types.ts';

export interface StopMarkProps {
  day: DayClock;
  stop: StripStop;
  vanName: string;
  row: StripRow;
  axis: TimeAxis;
  /** Where the next stop's words begin, seconds: words of this one end before. */
  roomToSeconds: number;
  highlighted: boolean;
  moved: boolean;
  carried: boolean;
  /** Arrival against the day as it is, while a change is drawn. */
  shiftSeconds: number;
}

/** One stop of a strip: the drive to it, its towers, its promise and its words. */
export const StopMark = memo(function StopMark(props: StopMarkProps) {
  const { day, stop, vanName, row, axis } = props;
  const isVisit = stop.kind === 'visit';
  const x = xOf(axis, stop.fromSeconds);
  const width = Math.max(3, xOf(axis, stop.toSeconds) - x);
  return (
    <g>
      {stop.drive && <DriveLine drive={stop.drive} axis={axis} y={row.baseline} />}
      {stop.wait && <WaitLine stop={stop} row={row} axis={axis} />}
      {/* Outside the button: its box is then what one sees and presses. */}
      {isVisit && <PromiseBracket stop={stop} row={row} axis={axis} />}
      <g
        data-stop={stop.stopId}
        data-visit={stop.visitId ?? undefined}
        data-van={row.vanId}
        className="group/stop outline-none"
        {...(isVisit && {
          tabIndex: 0,
          role: 'button',
          'aria-label': stopSentence(day, stop, vanName),
          'aria-roledescription': 'visit',
        })}
      >
        <StopGround {...props} x={x} width={width} />
        {isVisit ? (
          <StepTowers
            towers={joinNarrow(stop.towers, 5 / axis.pxPerSecond)}
            baseline={row.baseline}
            xOf={(seconds) => xOf(axis, seconds)}
            heightOf={(permille) => towerHeight(row, permille)}
            faded={stop.state === 'done'}
            letters={axis.pxPerSecond * 3600 > 180}
          />
        ) : (
          <PauseMark stop={stop} row={row} axis={axis} />
        )}
      </g>
      {/* Outside too: cut to fit, its words are not those the button is called by. */}
      {isVisit && <StopLabel {...props} x={x} width={width} />}
    </g>
  );
});

/** The ground a stop stands on: also what the pointer hits, and the ring of focus or change. */
function StopGround(props: StopMarkProps & { x: number; width: number }) {
  const { stop, row, x, width } = props;
  const isVisit = stop.kind === 'visit';
  const underWay = stop.state === 'working' || stop.state === 'arrived';
  const top = row.baseline - row.towerPx - 4;
  const height = row.towerPx + (row.compact ? 24 : 42);
  const changed = props.moved || props.carried;
  return (
    <>
      <rect
        className="strip-ring group-focus-visible/stop:[stroke-width:3px] group-focus-visible/stop:[stroke:var(--collar)]"
        x={x - 4}
        y={top}
        width={width + 8}
        height={height}
        rx={8}
        fill={underWay ? 'var(--collar-soft)' : changed ? 'var(--cream)' : 'transparent'}
        fillOpacity={underWay ? 0.55 : 1}
        stroke={changed || props.highlighted ? 'var(--collar)' : 'transparent'}
        strokeWidth={changed ? 2 : 1.5}
        strokeDasharray={changed ? '5 4' : undefined}
      />
      {isVisit && (
        <line
          x1={x}
          x2={x + width}
          y1={row.baseline + 0.5}
          y2={row.baseline + 0.5}
          stroke={stop.state === 'failed' ? 'var(--rosette)' : 'var(--ink)'}
          strokeWidth={stop.state === 'done' || underWay ? 3 : 1.5}
          strokeDasharray={stop.state === 'failed' ? '4 3' : undefined}
        />
      )}
    </>
  );
}

function StopLabel(props: StopMarkProps & { x: number; width: number }) {
  const { day, stop, row, axis, x } = props;
  // Inside its dashed edge a moved stop keeps its words to itself.
  const untilNext = xOf(axis, props.roomToSeconds) - x - 10;
  const room = Math.max(24, props.moved ? Math.min(untilNext, props.width - 2) : untilNext);
  const mark = stop.state === 'done' ? '✓ ' : stop.state === 'failed' ? '✕ ' : '';
  const pinned = stop.pinned && mark === '';
  const y = row.baseline + (row.compact ? 15 : 17);
  const words = stopWords(day, stop, props.shiftSeconds);
  const color = stop.atRisk || stop.state === 'failed' ? 'var(--rosette)' : 'var(--slate)';
  const shifted = !stop.atRisk && Math.abs(props.shiftSeconds) >= 90 && stop.state === 'ahead';
  return (
    <g pointerEvents="none" aria-hidden="true">
      {pinned && (
        <path
          d={`M${x + 4.5} ${y - 10}a3.2 3.2 0 1 1 0 6.4a3.2 3.2 0 1 1 0 -6.4M${x + 4.5} ${y - 3.6}V${y + 1}`}
          fill="var(--collar)"
          stroke="var(--collar)"
          strokeWidth={1.3}
          strokeLinecap="round"
        />
      )}
      <text
        x={x + (pinned ? 11 : 1)}
        y={y}
        fontSize={row.compact ? 12 : 13.5}
        fontWeight={600}
        fill={row.compact && stop.atRisk ? 'var(--rosette)' : 'var(--ink)'}
        textDecoration={stop.state === 'failed' ? 'line-through' : undefined}
      >
        {fitWords(`${row.compact && stop.atRisk ? '▲ ' : mark}${stop.label}`, room, 13)}
      </text>
      {!row.compact && (
        <text
          x={x + 1}
          y={row.baseline + 32}
          fontSize={11.5}
          fontWeight={stop.atRisk || shifted ? 600 : 400}
          fill={shifted ? 'var(--collar)' : color}
        >
          {fitWords(words, room, 11)}
        </text>
      )}
    </g>
  );
}

/** Waiting: the gap stays empty but for a thin line with a foot where the van stopped. */
function WaitLine({ stop, row, axis }: { stop: StripStop; row: StripRow; axis: TimeAxis }) {
  if (!stop.wait) return null;
  const from = xOf(axis, stop.wait.fromSeconds);
  const to = xOf(axis, stop.wait.toSeconds);
  if (to - from < 2) return null;
  return (
    <path
      d={`M${from} ${row.baseline - 4}v8m0 -4H${to - 1}`}
      stroke="#B9A98A"
      strokeWidth={1.2}
      fill="none"
      pointerEvents="none"
    />
  );
}
