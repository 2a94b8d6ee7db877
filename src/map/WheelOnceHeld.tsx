import { useEffect } from 'react';
import { useMap } from 'react-leaflet';

/**
 * The wheel scrolls the page past a map, and zooms it only once the map was pressed or reached by
 * keys, until the pointer leaves: otherwise scrolling a long day ends in a zoomed-out map.
 */
export function WheelOnceHeld() {
  const map = useMap();
  useEffect(() => {
    const container = map.getContainer();
    const hold = () => map.scrollWheelZoom.enable();
    const release = () => map.scrollWheelZoom.disable();
    // Two fingers on a track pad arrive as a wheel with Ctrl, and mean the map.
    const pinch = (event: WheelEvent) => {
      if (!event.ctrlKey) return;
      event.preventDefault();
      hold();
    };
    release();
    container.addEventListener('pointerdown', hold);
    container.addEventListener('focusin', hold);
    container.addEventListener('mouseleave', release);
    container.addEventListener('wheel', pinch, { passive: false });
    return () => {
      container.removeEventListener('pointerdown', hold);
      container.removeEventListener('focusin', hold);
      container.removeEventListener('mouseleave', release);
      container.removeEventListener('wheel', pinch);
    };
  }, [map]);
  return null;
}
