import L from 'leaflet';
import 'leaflet/dist/leaflet.css';
import { type ReactNode, useMemo } from 'react';
import { AttributionControl, MapContainer, ZoomControl } from 'react-leaflet';
import './map.css';
import { FitView } from './FitView.tsx';
import { GroundLayer } from './GroundLayer.tsx';
import { WheelOnceHeld } from './WheelOnceHeld.tsx';

/**
 * The map of an imported area; markers and lines are its children. Fills its box, whatever its size:
 * give the height by `className`. Load it lazily (it brings Leaflet and its own chunk):
 * `lazy(() => import('…/DayMap.tsx'))` around the component that holds map and markers.
 */
export function AreaMap({
  areaName,
  version,
  bounds,
  attribution,
  fitTo,
  label = 'Map',
  className = '',
  children,
}: {
  areaName: string;
  version: string;
  /** [minLon, minLat, maxLon, maxLat] */
  bounds: readonly [number, number, number, number];
  attribution: string;
  /** Points to show, [lat, lon]; the whole area without any. */
  fitTo?: readonly (readonly [lat: number, lon: number])[];
  label?: string;
  className?: string;
  children?: ReactNode;
}) {
  const [west, south, east, north] = bounds;
  const box = useMemo(
    () => L.latLngBounds([south, west], [north, east]),
    [west, south, east, north],
  );
  return (
    <section aria-label={label} className={`area-map ${className}`}>
      <MapContainer
        bounds={box}
        maxBounds={box.pad(0.35)}
        maxBoundsViscosity={0.8}
        maxZoom={18}
        scrollWheelZoom={false}
        zoomControl={false}
        attributionControl={false}
        className="h-full w-full"
      >
        <ZoomControl position="topright" />
        <AttributionControl position="bottomright" prefix={false} />
        <GroundLayer areaName={areaName} version={version} attribution={attribution} />
        <WheelOnceHeld />
        <FitView bounds={box} fitTo={fitTo} />
        {children}
      </MapContainer>
    </section>
  );
}
