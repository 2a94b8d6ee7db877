import {
  useCallback,
  useEffect,
  useLayoutEffect,
  useMemo,
  useRef,
  useState,
  type FocusEvent,
  type KeyboardEvent,
  type MouseEvent,
  type PointerEvent,
  type Ref,
} from 'react';
import { formatWall, type DayClock } from '#shared/time/formatWall.ts';
import { dropAt, dropSeconds, type DropTarget } from './dropAt.ts';
import { StripLabels, type VanMark } from './StripLabels.tsx';
import { AXIS_HEIGHT, stripRows, stripsHeight, type StripRow } from './stripLayout.ts';
import { PatternScope, StripPatterns, usePatternId } from './StripPatterns.tsx';
import { StripTip, type TipPlace } from './StripTip.tsx';
import { timeAxis, xOf, type TimeAxis } from './timeAxis.ts';
import type { Strip } from './types.ts';
import { VanStrip } from './VanStrip.tsx';

/** What a drag asks of the drawing. */
export interface DayStripsHandle {
  /** The place under a point of the window, or null outside the strips. */
  targetAt: (clientX: number, clientY: number, visitId: string) => DropTarget | null;
  focusVisit: (visitId: string) => void;
}

export interface DayStripsProps {
  day: DayClock;
  strips: readonly Strip[];
  range: { fromSeconds: number; toSeconds: number };
  marks: ReadonlyMap<string, VanMark>;
  distanceWords: (metres: number) => string;
  nowSeconds: number | null;
  /** 1 fits the card; 2 and 3 are that many times as wide and scroll. */
  zoom: number;
  /** Without the left column, for a single van on a phone. */
  bare?: boolean;
  highlightedStopId: string | null;
  movedVisitIds: ReadonlySet<string>;
  carriedVisitId: string | null;
  shifts: ReadonlyMap<string, number> | null;
  drop: { target: DropTarget; visitId: string } | null;
  /** Where a visit stands in the day as it is, while a change is drawn. */
  ghost: { vanId: string; fromSeconds: number; toSeconds: number } | null;
  onHighlight: (stopId: string | null) => void;
  onOpenVisit: (visitId: string) => void;
  onPointerDownVisit: (visitId: string, event: PointerEvent) => void;
  onKeyDownVisit: (visitId: string, event: KeyboardEvent) => void;
  ref?: Ref<DayStripsHandle>;
}

/**
 * The day: one strip per van over a shared time axis. Draws and tells what was pointed at; what a
 * move means is the day board's business.
 */
export function DayStrips(props: DayStripsProps) {
  const { strips, range, day, zoom } = props;
  const box = useRef<HTMLDivElement>(null);
  const svg = useRef<SVGSVGElement>(null);
  const width = useWidth(box);
  const compact = strips.length > 5;
  const rows = useMemo(() => stripRows(strips, compact), [strips, compact]);
  const hours = (range.toSeconds - range.fromSeconds) / 3600;
  const inner = Math.max(width - EDGE, hours * LEAST_HOUR_PX) * zoom;
  const axis = useMemo(
    () => timeAxis(day, range.fromSeconds, range.toSeconds, inner),
    [day, range.fromSeconds, range.toSeconds, inner],
  );
  const height = stripsHeight(rows);
  const patterns = usePatternId();
  useHandle(props.ref, svg, strips, rows, axis);
  useStartInView(box, axis, props.nowSeconds, width);
  const { tip, handlers } = useTip(strips, props.onHighlight);

  const visitOf = (event: { target: EventTarget | null }) =>
    (event.target as Element | null)?.closest<SVGGElement>('[data-visit]')?.dataset.visit;
  const drop = props.drop && dropMarkOf(props.drop, strips, rows, axis);

  return (
    <div className="flex" {...handlers}>
      {!props.bare && (
        <StripLabels
          strips={strips}
          rows={rows}
          marks={props.marks}
          distanceWords={props.distanceWords}
          heightPx={height}
        />
      )}
      <div ref={box} className="min-w-0 flex-1 overflow-x-auto overflow-y-hidden">
        {width > 0 && (
          <svg
            ref={svg}
            data-strips
            width={axis.widthPx + EDGE}
            height={height}
            role="group"
            aria-label="Day strips"
            className="block select-none"
            onClick={(event: MouseEvent) => {
              const visitId = visitOf(event);
              if (visitId) props.onOpenVisit(visitId);
            }}
            onPointerDown={(event) => {
              const visitId = visitOf(event);
              if (visitId) props.onPointerDownVisit(visitId, event);
            }}
            onKeyDown={(event) => {
              const visitId = visitOf(event);
              if (visitId) props.onKeyDownVisit(visitId, event);
            }}
          >
            <StripPatterns id={patterns} />
            <PatternScope value={patterns}>
              <g transform="translate(10 0)">
                <HourLines axis={axis} heightPx={height} />
                {strips.map((strip, index) => (
                  <VanStrip
                    key={strip.vanId}
                    day={day}
                    strip={strip}
                    row={rows[index]!}
                    axis={axis}
                    highlightedStopId={props.highlightedStopId}
                    movedVisitIds={props.movedVisitIds}
                    carriedVisitId={props.carriedVisitId}
                    shifts={props.shifts}
                  />
                ))}
                {props.ghost && <GhostMark ghost={props.ghost} rows={rows} axis={axis} />}
                {drop && <DropMark {...drop} />}
                <NowLine day={day} axis={axis} seconds={props.nowSeconds} heightPx={height} />
              </g>
            </PatternScope>
          </svg>
        )}
      </div>
      <StripTip day={day} tip={tip} />
    </div>
  );
}

function HourLines({ axis, heightPx }: { axis: TimeAxis; heightPx: number }) {
  return (
    <g pointerEvents="none">
      {axis.ticks.map((tick) => {
        const x = xOf(axis, tick.seconds);
        return (
          <g key={tick.seconds}>
            <line x1={x} x2={x} y1={AXIS_HEIGHT} y2={heightPx - 4} stroke="var(--linen)" />
            <text x={x} y={17} fontSize={12} textAnchor="middle" fill="var(--slate)">
              {tick.words}
            </text>
          </g>
        );
      })}
    </g>
  );
}

function NowLine({
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

function dropMarkOf(
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
function DropMark({ x, row, axis }: { x: number; row: StripRow; axis: TimeAxis }) {
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
function GhostMark({
  ghost,
  rows,
  axis,
}: {
  ghost: NonNullable<DayStripsProps['ghost']>;
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

function useHandle(
  ref: Ref<DayStripsHandle> | undefined,
  svg: React.RefObject<SVGSVGElement | null>,
  strips: readonly Strip[],
  rows: readonly StripRow[],
  axis: TimeAxis,
) {
  useLayoutEffect(() => {
    const handle: DayStripsHandle = {
      targetAt: (clientX, clientY, visitId) => {
        const box = svg.current?.getBoundingClientRect();
        if (!box || clientX < box.left || clientX > box.right) return null;
        return dropAt(strips, rows, axis, clientX - box.left - 10, clientY - box.top, visitId);
      },
      focusVisit: (visitId) =>
        svg.current?.querySelector<SVGGElement>(`[data-visit="${CSS.escape(visitId)}"]`)?.focus(),
    };
    if (typeof ref === 'function') ref(handle);
    else if (ref) ref.current = handle;
  }, [ref, svg, strips, rows, axis]);
}

/** On a strip wider than its card, begins at the present, or at the first hour of another day. */
function useStartInView(
  box: React.RefObject<HTMLDivElement | null>,
  axis: TimeAxis,
  nowSeconds: number | null,
  width: number,
) {
  const done = useRef(0);
  useEffect(() => {
    if (!box.current || width === 0 || done.current === axis.widthPx) return;
    done.current = axis.widthPx;
    if (nowSeconds !== null) box.current.scrollLeft = xOf(axis, nowSeconds) - width / 3;
  }, [box, axis, nowSeconds, width]);
}

function useWidth(box: React.RefObject<HTMLDivElement | null>): number {
  const [width, setWidth] = useState(0);
  useLayoutEffect(() => {
    const element = box.current;
    if (!element) return;
    setWidth(element.clientWidth || FALLBACK_PX);
    if (typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(() => setWidth(element.clientWidth || FALLBACK_PX));
    observer.observe(element);
    return () => observer.disconnect();
  }, [box]);
  return width;
}

function useTip(strips: readonly Strip[], onHighlight: (stopId: string | null) => void) {
  const [tip, setTip] = useState<TipPlace | null>(null);
  const point = useCallback(
    (target: EventTarget | null) => {
      const element = (target as Element | null)?.closest?.<SVGGElement>('[data-stop]');
      const stop =
        element &&
        strips.flatMap((strip) => strip.stops).find((one) => one.stopId === element.dataset.stop);
      if (!element || !stop) {
        setTip(null);
        onHighlight(null);
        return;
      }
      const towerElement = (target as Element).closest<SVGGElement>('[data-tower]');
      const box = (towerElement ?? element).getBoundingClientRect();
      const key = towerElement?.dataset.tower;
      setTip({
        stop,
        tower: key ? joinedTower(stop.towers, key, towerElement) : null,
        x: (box.left + box.right) / 2,
        top: box.top,
        bottom: box.bottom,
      });
      onHighlight(stop.stopId);
    },
    [strips, onHighlight],
  );
  const handlers = {
    onPointerOver: (event: PointerEvent) => {
      if (event.pointerType !== 'touch' && event.buttons === 0) point(event.target);
    },
    onPointerLeave: () => point(null),
    onPointerDownCapture: () => setTip(null),
    onFocus: (event: FocusEvent) => {
      if ((event.target as Element).matches(':focus-visible')) point(event.target);
    },
    onBlur: () => point(null),
  };
  return { tip, handlers };
}

/** A drawn tower may be several steps joined: all that lie between its edges. */
function joinedTower(
  towers: Strip['stops'][number]['towers'],
  key: string,
  element: SVGGElement | null,
) {
  const first = towers.findIndex((tower) => tower.key === key);
  const count = Number(element?.dataset.steps ?? 1);
  const parts = towers.slice(first, first + count);
  const head = parts[0];
  if (!head) return null;
  return {
    ...head,
    toSeconds: parts.at(-1)!.toSeconds,
    steps: parts.flatMap((part) => part.steps),
  };
}

/** Room left and right of the axis, so that the first and last hour's words are whole. */
const EDGE = 32;
const LEAST_HOUR_PX = 58;
const FALLBACK_PX = 1000;
