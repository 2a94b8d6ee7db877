import { lazy, Suspense } from 'react';
import type { Session } from '#shared/api/session.ts';
import { CatchBoundary } from '#src/components/CatchBoundary.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { PinFields } from '#src/components/PinFields.tsx';

const PinMapBody = lazy(async () => ({
  default: (await import('./PinMapBody.tsx')).PinMapBody,
}));

type Area = Pick<Session['business'], 'areaName' | 'areaVersion' | 'areaBounds' | 'attribution'>;

/**
 * The area's map with one pin to put, and the same pin as numbers. Leaflet comes only when this is
 * drawn; without an area the numbers stand alone.
 */
export function PinMap({
  area,
  lat,
  lon,
  onPin,
}: {
  area: Area;
  lat: number | null;
  lon: number | null;
  onPin: (lat: number, lon: number) => void;
}) {
  const spot = lat === null || lon === null ? null : { lat, lon };
  return (
    <div className="grid gap-3">
      {area.areaVersion && area.areaBounds && (
        <CatchBoundary
          instead={
            <p className="text-slate">The map could not be loaded. Give the pin by numbers.</p>
          }
        >
          <Suspense fallback={<Loading words="Loading the map" lines={5} />}>
            <PinMapBody
              areaName={area.areaName}
              version={area.areaVersion}
              bounds={area.areaBounds}
              attribution={area.attribution ?? ''}
              spot={spot}
              onPin={onPin}
            />
          </Suspense>
        </CatchBoundary>
      )}
      <details>
        <summary className="text-link py-2 text-[15px]">By numbers</summary>
        <PinFields key={`${lat} ${lon}`} lat={lat} lon={lon} onPin={onPin} />
      </details>
    </div>
  );
}
