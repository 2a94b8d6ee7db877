import { useQueries } from '@tanstack/react-query';
import { useMemo, type ReactNode } from 'react';
import type { Day } from '#shared/api/days.ts';
import type { DayTimes, RunTimes } from '#shared/schedule/types.ts';
import { addressQueries } from '#src/api/addresses.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { AreaMap } from '#src/map/AreaMap.tsx';
import { DepotMarker } from '#src/map/DepotMarker.tsx';
import { RunLine } from '#src/map/RunLine.tsx';
import { StopMarker } from '#src/map/StopMarker.tsx';
import { VanMarker } from '#src/map/VanMarker.tsx';
import { expectedPlace } from './expectedPlace.ts';
import { routePoints } from './routePoints.ts';
import { vanPaint } from './vanPaint.ts';

/** The day on the ground: every run along its roads, stops numbered as on the strips. */
export function DayMap({
  day,
  times,
  shapes,
  nowSeconds,
  highlightedStopId,
  onHighlight,
  onOpenVisit,
}: {
  day: Day;
  times: DayTimes;
  shapes: ReadonlyMap<string, { shape: string }>;
  nowSeconds: number | null;
  highlightedStopId: string | null;
  onHighlight: (stopId: string | null) => void;
  onOpenVisit: (visitId: string) => void;
}) {
  const { business } = useSession();
  const { problem } = day;
  const routes = useMemo(
    () => times.runs.map((run) => ({ run, points: routePoints(problem, run) })),
    [times, problem],
  );
  const answers = useQueries({
    queries: routes.map(({ points }) => addressQueries.roadLines(points)),
  });
  const fitTo = useMemo(() => placesOf(day), [day]);
  if (!business.areaBounds || business.areaVersion === null)
    return (
      <div className="card grid h-full min-h-40 place-items-center p-6 text-center text-slate">
        No map of the working area yet. Setup names the area; its map is imported on the server.
      </div>
    );
  return (
    <AreaMap
      areaName={business.areaName}
      version={business.areaVersion}
      bounds={business.areaBounds}
      attribution={business.attribution ?? ''}
      fitTo={fitTo}
      label="Runs on the map"
      className="card h-full overflow-hidden"
    >
      {routes.map(({ run, points }, index) => {
        const legs = answers[index]?.data?.legs;
        return legs
          ? legs.map((leg, at) => (
              <RunLine
                key={`${run.vanId}-${at}`}
                line={leg.line}
                colour={paintOf(day, run).color}
                dash={paintOf(day, run).dash}
                faint={leg.rough || (nowSeconds !== null && legIsDriven(day, run, at))}
              />
            ))
          : points.length > 1 && (
              <RunLine
                key={`${run.vanId}-rough`}
                line={points}
                colour={paintOf(day, run).color}
                dash={paintOf(day, run).dash}
                faint
              />
            );
      })}
      <Depots day={day} />
      {routes.map(({ run }) => (
        <RunStops
          key={run.vanId}
          day={day}
          run={run}
          shape={shapes.get(run.vanId)?.shape ?? 'circle'}
          underWay={nowSeconds !== null}
          highlightedStopId={highlightedStopId}
          onHighlight={onHighlight}
          onOpenVisit={onOpenVisit}
        />
      ))}
      {nowSeconds !== null &&
        routes.map(({ run }, index) => (
          <ExpectedVan
            key={run.vanId}
            day={day}
            run={run}
            legs={answers[index]?.data?.legs ?? null}
            shape={shapes.get(run.vanId)?.shape ?? 'circle'}
            nowSeconds={nowSeconds}
          />
        ))}
    </AreaMap>
  );
}

function RunStops({
  day,
  run,
  shape,
  underWay,
  highlightedStopId,
  onHighlight,
  onOpenVisit,
}: {
  day: Day;
  run: RunTimes;
  shape: string;
  /** The day is today: what is behind is quieter. */
  underWay: boolean;
  highlightedStopId: string | null;
  onHighlight: (stopId: string | null) => void;
  onOpenVisit: (visitId: string) => void;
}) {
  const van = day.problem.vans.find((one) => one.vanId === run.vanId);
  const visits = run.stops.filter((stop) => stop.kind === 'visit');
  return visits.map((stop, index) => {
    const point = day.problem.points[stop.point];
    const label = day.problem.visits.find((visit) => visit.id === stop.stopId)?.label ?? '';
    if (!point) return null;
    return (
      <Hover key={stop.stopId} onHover={(over) => onHighlight(over ? stop.stopId : null)}>
        <StopMarker
          number={index + 1}
          shape={shape}
          colour={paintOf(day, run).color}
          lat={point.lat}
          lon={point.lon}
          label={`Stop ${index + 1} of ${van?.vanName ?? 'the van'}, ${label}`}
          selected={highlightedStopId === stop.stopId}
          muted={underWay && (stop.state === 'done' || stop.state === 'failed')}
          onSelect={() => onOpenVisit(stop.stopId)}
        />
      </Hover>
    );
  });
}

/** React carries a mark's pointer events up its own tree, whichever pane Leaflet drew it in. */
function Hover({ onHover, children }: { onHover: (over: boolean) => void; children: ReactNode }) {
  return (
    <div
      className="contents"
      onPointerOver={() => onHover(true)}
      onPointerOut={() => onHover(false)}
    >
      {children}
    </div>
  );
}

function Depots({ day }: { day: Day }) {
  const { problem } = day;
  const depots = new Set(problem.vans.flatMap((van) => [van.startPoint, van.endPoint]));
  return (
    <>
      {problem.refills.map((place) => {
        const point = problem.points[place.point];
        if (!point || depots.has(place.point)) return null;
        return (
          <DepotMarker
            key={place.id}
            kind="water"
            lat={point.lat}
            lon={point.lon}
            label={`${place.name}, water`}
          />
        );
      })}
      {[...depots].map((index) => {
        const point = problem.points[index];
        if (!point) return null;
        const vans = problem.vans.filter((van) => van.startPoint === index);
        return (
          <DepotMarker
            key={index}
            lat={point.lat}
            lon={point.lon}
            label={`Start of ${vans.map((van) => van.vanName).join(', ') || 'no van, end of some'}`}
          />
        );
      })}
    </>
  );
}

function ExpectedVan({
  day,
  run,
  legs,
  shape,
  nowSeconds,
}: {
  day: Day;
  run: RunTimes;
  legs: readonly { line: [number, number][] }[] | null;
  shape: string;
  nowSeconds: number;
}) {
  const place = expectedPlace(day.problem, run, legs, nowSeconds);
  const van = day.problem.vans.find((one) => one.vanId === run.vanId);
  // At a stop the stop's own number says it, and would be hidden.
  const atStop = run.stops.some((stop) => {
    const point = day.problem.points[stop.point];
    return point?.lat === place?.[0] && point?.lon === place?.[1];
  });
  if (!place || !van || atStop) return null;
  return (
    <VanMarker
      shape={shape}
      colour={paintOf(day, run).color}
      lat={place[0]}
      lon={place[1]}
      expected
      label={`${van.vanName}, expected here by its taps and the plan`}
    />
  );
}

function paintOf(day: Day, run: RunTimes) {
  return vanPaint(day.problem.vans.findIndex((van) => van.vanId === run.vanId));
}

/** While the day runs, legs to stops that are behind are faint; the way home never is. */
function legIsDriven(day: Day, run: RunTimes, leg: number): boolean {
  let at = day.problem.vans.find((van) => van.vanId === run.vanId)?.startPoint;
  const reached = run.stops.filter((stop) => {
    const moves = stop.point !== at;
    at = stop.point;
    return moves;
  })[leg];
  return reached !== undefined && reached.state !== 'ahead' && reached.state !== 'driving';
}

function placesOf(day: Day): [number, number][] {
  const { problem } = day;
  const indices = new Set([
    ...problem.vans.flatMap((van) => [van.startPoint, van.endPoint]),
    ...problem.visits.map((visit) => visit.point),
  ]);
  return [...indices].flatMap((index) => {
    const point = problem.points[index];
    return point ? [[point.lat, point.lon] as [number, number]] : [];
  });
}
