import L from 'leaflet';
import { useEffect } from 'react';
import { useMap } from 'react-leaflet';

/** Below this the tiles have no data (their least data zoom is 8, shown one zoom deeper). */
const LEAST_ZOOM = 9;
const MOST_ZOOM_FITTED = 16;

/**
 * Keeps the map right in a container of any size, and shows all of `fitTo` whenever those points
 * change. A person's own panning is left alone in between.
 */
export function FitView({
  bounds,
  fitTo,
}: {
  bounds: L.LatLngBounds;
  fitTo: readonly (readonly [lat: number, lon: number])[] | undefined;
}) {
  const map = useMap();
  const key = JSON.stringify(fitTo ?? []);

  useEffect(() => {
    const settle = () => {
      map.invalidateSize({ pan: false });
      const fits = map.getBoundsZoom(bounds, false);
      if (Number.isFinite(fits)) map.setMinZoom(Math.max(LEAST_ZOOM, Math.floor(fits) - 1));
    };
    settle();
    const observer = new ResizeObserver(settle);
    observer.observe(map.getContainer());
    return () => observer.disconnect();
  }, [map, bounds]);

  useEffect(() => {
    const points = JSON.parse(key) as [number, number][];
    const box = points.length > 0 ? L.latLngBounds(points) : bounds;
    map.fitBounds(box, { padding: [36, 36], maxZoom: MOST_ZOOM_FITTED, animate: false });
  }, [map, bounds, key]);
  return null;
}
