import L from 'leaflet';
import { useEffect, useRef } from 'react';
import { useMap } from 'react-leaflet';

/** Below this the tiles have no data (their least data zoom is 8, shown one zoom deeper). */
const LEAST_ZOOM = 9;
const MOST_ZOOM_FITTED = 16;

/**
 * Keeps the map right in a container of any size, and shows all of `fitTo` whenever those points
 * change. Once a person has moved the map themselves, a new size leaves their view alone.
 */
export function FitView({
  bounds,
  fitTo,
}: {
  bounds: L.LatLngBounds;
  fitTo: readonly (readonly [lat: number, lon: number])[] | undefined;
}) {
  const map = useMap();
  const touched = useRef(false);
  const key = JSON.stringify(fitTo ?? []);

  useEffect(() => {
    const container = map.getContainer();
    container.setAttribute('role', 'group');
    container.setAttribute('aria-label', 'Arrow keys move the map, plus and minus zoom');
    const touch = (event: Event) => {
      if (!(event instanceof KeyboardEvent && event.key === 'Tab')) touched.current = true;
    };
    // A wheel alone scrolls the page; it zooms only after one of these.
    const kinds = ['pointerdown', 'keydown'] as const;
    for (const kind of kinds) container.addEventListener(kind, touch, { passive: true });
    return () => {
      for (const kind of kinds) container.removeEventListener(kind, touch);
    };
  }, [map]);

  useEffect(() => {
    touched.current = false;
    const points = JSON.parse(key) as [number, number][];
    const wanted = points.length > 0 ? L.latLngBounds(points) : bounds;
    const settle = () => {
      map.invalidateSize({ animate: false });
      const { x, y } = map.getSize();
      // Hidden behind a tab: there is nothing to fit into yet.
      if (x === 0 || y === 0) return;
      map.setMinZoom(Math.max(LEAST_ZOOM, Math.floor(map.getBoundsZoom(bounds, false)) - 1));
      if (touched.current) return;
      const edge = Math.min(36, Math.floor(Math.min(x, y) / 8));
      map.fitBounds(wanted, {
        padding: [edge, edge],
        maxZoom: MOST_ZOOM_FITTED,
        animate: false,
      });
    };
    const observer = new ResizeObserver(settle);
    settle();
    observer.observe(map.getContainer());
    return () => observer.disconnect();
  }, [map, bounds, key]);
  return null;
}
