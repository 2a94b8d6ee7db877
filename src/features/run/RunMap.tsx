import { useQuery } from '@tanstack/react-query';
import type { RunDetail } from '#shared/api/runs.ts';
import { addressQueries } from '#src/api/addresses.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { AreaMap } from '#src/map/AreaMap.tsx';
import { DepotMarker } from '#src/map/DepotMarker.tsx';
import { RunLine } from '#src/map/RunLine.tsx';
import { StopMarker } from '#src/map/StopMarker.tsx';
import { runPoints } from './runPoints.ts';
import type { RunView } from './runView.ts';

/** A literal value: the map's canvas cannot read custom properties. */
const collar = '#17544e';

/** The run along the roads with its stops; straight and faint where no road answer came. */
export function RunMap({ run, view }: { run: RunDetail; view: RunView }) {
  const { areaName, areaVersion, areaBounds, attribution } = useSession().business;
  const points = runPoints(view);
  const { data } = useQuery(addressQueries.roadLines(points));
  if (!areaVersion || !areaBounds)
    return <p className="py-6 text-slate">No map of your area is on this server yet.</p>;
  const van = view.problem.vans[0];
  const depot = van && view.problem.points[van.startPoint];
  return (
    <AreaMap
      areaName={areaName}
      version={areaVersion}
      bounds={areaBounds}
      attribution={attribution ?? ''}
      fitTo={points}
      label={`${run.vanName}'s run`}
      className="mt-3 h-[60vh] overflow-hidden rounded-card border border-fawn"
    >
      {data ? (
        data.legs.map((leg, index) => (
          <RunLine key={index} line={leg.line} colour={collar} faint={leg.rough} />
        ))
      ) : (
        <RunLine line={points} colour={collar} faint />
      )}
      {depot && <DepotMarker lat={depot.lat} lon={depot.lon} label="Where the van starts" />}
      {view.stops
        .filter(({ kind }) => kind !== 'meal' && kind !== 'rest')
        .map((stop) => (
          <StopMarker
            key={stop.stopId}
            number={stop.number}
            shape={run.shape}
            colour={collar}
            lat={stop.lat}
            lon={stop.lon}
            label={`Stop ${stop.number}, ${stop.title}`}
            selected={stop === view.current}
            muted={stop.state === 'done' || stop.state === 'failed'}
          />
        ))}
    </AreaMap>
  );
}
