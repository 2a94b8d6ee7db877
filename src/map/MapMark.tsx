import L from 'leaflet';
import { type ReactNode, useEffect, useRef, useState } from 'react';
import { createPortal } from 'react-dom';
import { useMap } from 'react-leaflet';

/**
 * One mark on the map with React inside. The element lives as long as the mark, so keyboard focus
 * survives when number, colour or selection change.
 */
export function MapMark({
  lat,
  lon,
  label,
  size,
  onTop = 0,
  selected,
  onSelect,
  onMove,
  onKeyDown,
  children,
}: {
  lat: number;
  lon: number;
  /** Read out; a mark that can be chosen is a button of this name. */
  label: string;
  /** Width and height in pixels; the place is in the middle. */
  size: number;
  /** Higher lies above. */
  onTop?: number;
  selected?: boolean;
  onSelect?: () => void;
  /** Given, the mark can be dragged. */
  onMove?: (lat: number, lon: number) => void;
  onKeyDown?: (event: KeyboardEvent, marker: L.Marker) => void;
  children: ReactNode;
}) {
  const map = useMap();
  const [host] = useState(() => document.createElement('div'));
  const marker = useRef<L.Marker | null>(null);
  const latest = useRef({ onSelect, onMove, onKeyDown });
  useEffect(() => {
    latest.current = { onSelect, onMove, onKeyDown };
  });
  const active = Boolean(onSelect ?? onMove ?? onKeyDown);

  useEffect(() => {
    const icon = L.divIcon({
      className: `map-mark${active ? '' : ' is-still'}`,
      iconSize: [size, size],
      html: host,
    });
    const made = L.marker([0, 0], { icon, keyboard: active, interactive: active });
    made.addTo(map);
    made.on('click', () => latest.current.onSelect?.());
    made.on('dragend', () => {
      const at = made.getLatLng();
      latest.current.onMove?.(at.lat, at.lng);
    });
    made.getElement()!.addEventListener('keydown', (event) => {
      latest.current.onKeyDown?.(event, made);
      if ((event.key !== 'Enter' && event.key !== ' ') || !latest.current.onSelect) return;
      event.preventDefault();
      event.stopPropagation();
      latest.current.onSelect();
    });
    // Leaflet would answer Enter a second time with a click of its own.
    made.getElement()!.addEventListener('keypress', (event) => event.stopPropagation());
    marker.current = made;
    return () => {
      made.remove();
      marker.current = null;
    };
  }, [map, host, size, active]);

  // Each of these also runs after the mark was made anew, hence `size` and `active`.
  useEffect(() => {
    marker.current?.setLatLng([lat, lon]);
    marker.current?.setZIndexOffset(onTop * 1000);
  }, [size, active, lat, lon, onTop]);
  const movable = onMove !== undefined;
  useEffect(() => {
    if (movable) marker.current?.dragging?.enable();
    else marker.current?.dragging?.disable();
  }, [size, active, movable]);
  useEffect(() => {
    const element = marker.current?.getElement();
    if (!element) return;
    element.setAttribute('role', active ? 'button' : 'img');
    element.setAttribute('aria-label', label);
    if (selected === undefined) element.removeAttribute('aria-pressed');
    else element.setAttribute('aria-pressed', String(selected));
  }, [size, active, label, selected]);

  return createPortal(children, host);
}
