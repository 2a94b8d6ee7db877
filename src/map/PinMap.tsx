import { lazy, Suspense } from 'react';
import type { Session } from '#shared/api/session.ts';
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
      )}
      <details>
        <summary className="inline-flex min-h-11 items-center text-[15px] font-medium text-slate md:min-h-8">
          By numbers
        </summary>
        <PinFields key={`${lat} ${lon}`} lat={lat} lon={lon} onPin={onPin} />
      </details>
    </div>
  );
}
