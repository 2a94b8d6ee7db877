import {
  useEffect,
  useImperativeHandle,
  useMemo,
  useRef,
  type KeyboardEvent,
  type MouseEvent,
  type PointerEvent,
  type Ref,
  type RefObject,
} from 'react';
import type { DayClock } from '#shared/time/formatWall.ts';
import { dropAt, type DropTarget } from './dropAt.ts';
import { StripLabels, type VanMark } from './StripLabels.tsx';
import { stripRows, stripsHeight } from './stripLayout.ts';
import { PatternScope, StripPatterns, usePatternId } from './StripPatterns.tsx';
import { StripTip } from './StripTip.tsx';
import { timeAxis, xOf, type TimeAxis } from './timeAxis.ts';
import type { Strip } from './types.ts';
import { useBoxWidth } from './useBoxWidth.ts';
import { useStripTip } from './useStripTip.ts';
import { DropMark, dropMarkOf, GhostMark, HourLines, NowLine } from './StripMarks.tsx';
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
  const width = useBoxWidth(box);
  const compact = strips.length > 5;
  const rows = useMemo(() => stripRows(strips, compact), [strips, compact]);
  const hours = (range.toSeconds - range.fromSeconds) / 3600;
  const inner = Math.max(width - EDGE, hours * (props.bare ? PHONE_HOUR_PX : LEAST_HOUR_PX)) * zoom;
  const axis = useMemo(
    () => timeAxis(day, range.fromSeconds, range.toSeconds, inner),
    [day, range.fromSeconds, range.toSeconds, inner],
  );
  const height = stripsHeight(rows);
  const patterns = usePatternId();
  useImperativeHandle(
    props.ref,
    () => ({
      targetAt: (clientX, clientY, visitId) => {
        const place = svg.current?.getBoundingClientRect();
        if (!place || clientX < place.left || clientX > place.right) return null;
        return dropAt(strips, rows, axis, clientX - place.left - 10, clientY - place.top, visitId);
      },
      focusVisit: (visitId) =>
        svg.current?.querySelector<SVGGElement>(`[data-visit="${CSS.escape(visitId)}"]`)?.focus(),
    }),
    [strips, rows, axis],
  );
  useStartInView(box, axis, props.nowSeconds, width);
  const { tip, handlers } = useStripTip(strips, props.onHighlight);

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
      <StripTip day={day} tip={props.carriedVisitId === null && props.drop === null ? tip : null} />
    </div>
  );
}

/** On a strip wider than its card, begins at the present, or at the first hour of another day. */
function useStartInView(
  box: RefObject<HTMLDivElement | null>,
  axis: TimeAxis,
  nowSeconds: number | null,
  width: number,
) {
  const done = useRef(0);
  useEffect(() => {
    if (!box.current || width === 0 || done.current === axis.widthPx) return;
    done.current = axis.widthPx;
    if (nowSeconds !== null) box.current.scrollTo(xOf(axis, nowSeconds) - width / 3, 0);
  }, [box, axis, nowSeconds, width]);
}

/** Room left and right of the axis, so that the first and last hour's words are whole. */
const EDGE = 32;
const LEAST_HOUR_PX = 58;
const PHONE_HOUR_PX = 86;
