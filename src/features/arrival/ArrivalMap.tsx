import type { Arrival } from '#shared/api/arrival.ts';
import { AreaMap } from '#src/map/AreaMap.tsx';
import { DepotMarker } from '#src/map/DepotMarker.tsx';
import { VanMarker } from '#src/map/VanMarker.tsx';
import { boundsAround } from './boundsAround.ts';

/** The van and the door, nothing else: no trail, no other stop. Says how sure the place is. */
export function ArrivalMap({
  arrival,
  van,
}: {
  arrival: Arrival;
  van: NonNullable<Arrival['van']>;
}) {
  if (!arrival.areaVersion) return null;
  const expected = van.freshness === 'expected';
  return (
    <figure className="card overflow-hidden">
      <AreaMap
        areaName={arrival.areaName}
        version={arrival.areaVersion}
        bounds={boundsAround([arrival.home, van])}
        attribution={arrival.attribution ?? ''}
        fitTo={[
          [arrival.home.lat, arrival.home.lon],
          [van.lat, van.lon],
        ]}
        label="Where the van is"
        className="h-[230px]"
      >
        <DepotMarker lat={arrival.home.lat} lon={arrival.home.lon} label="Your door" />
        <VanMarker
          shape={arrival.shape}
          colour="#17544e"
          lat={van.lat}
          lon={van.lon}
          expected={expected}
          label={`${arrival.vanName}, ${van.words}`}
        />
      </AreaMap>
      <figcaption className="px-4 py-2.5 text-[15px] leading-snug">
        <b>{arrival.vanName}</b>{' '}
        <span className="text-slate">
          {van.words}
          {expected && ' (dashed ring)'}
        </span>
      </figcaption>
    </figure>
  );
}
