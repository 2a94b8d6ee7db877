import L from 'leaflet';
import { useMap, useMapEvents } from 'react-leaflet';
import { MapMark } from './MapMark.tsx';

/** Arrow keys move the pin this many pixels; with Shift, one. */
const KEY_PIXELS = 12;

const ARROWS: Readonly<Record<string, readonly [number, number]>> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
};

/** A pin to be put where the van parks: click the map, drag the pin, or move it with the arrow keys. */
export function PinPicker({
  value,
  onChange,
  label = 'Pin',
}: {
  value: { lat: number; lon: number } | null;
  onChange: (value: { lat: number; lon: number }) => void;
  label?: string;
}) {
  const map = useMap();
  useMapEvents({ click: ({ latlng }) => onChange(rounded(latlng.lat, latlng.lng)) });
  if (!value)
    return (
      <div className="leaflet-top leaflet-left">
        <button
          type="button"
          // React hears clicks only after Leaflet did, so stopping them there is too late.
          ref={(button) => void (button && L.DomEvent.disableClickPropagation(button))}
          className="leaflet-control rounded-full border border-fawn bg-white px-4 py-2 font-semibold"
          onClick={() => {
            const { lat, lng } = map.getCenter();
            onChange(rounded(lat, lng));
          }}
        >
          Put the pin in the middle
        </button>
      </div>
    );
  return (
    <MapMark
      lat={value.lat}
      lon={value.lon}
      label={`${label}. Arrow keys move it, with Shift in small steps.`}
      size={36}
      onTop={4}
      onMove={(lat, lon) => onChange(rounded(lat, lon))}
      onKeyDown={(event) => {
        const step = ARROWS[event.key];
        if (!step) return;
        event.preventDefault();
        event.stopPropagation();
        const by = event.shiftKey ? 1 : KEY_PIXELS;
        const at = map.latLngToContainerPoint([value.lat, value.lon]);
        const moved = map.containerPointToLatLng(at.add([step[0] * by, step[1] * by]));
        map.panInside(moved, { padding: [40, 40] });
        onChange(rounded(moved.lat, moved.lng));
      }}
    >
      <svg viewBox="-18 -18 36 36" width="36" height="36" aria-hidden="true" overflow="visible">
        <path
          d="M0 0c-8-9-12-14-12-20a12 12 0 0 1 24 0c0 6-4 11-12 20z"
          fill="var(--collar)"
          stroke="white"
          strokeWidth="2.4"
        />
        <circle cy="-20" r="4.6" fill="white" />
      </svg>
    </MapMark>
  );
}

/** Seven decimals are a centimetre. */
function rounded(lat: number, lon: number): { lat: number; lon: number } {
  const round = (degrees: number) => Math.round(degrees * 1e7) / 1e7;
  return { lat: round(lat), lon: round(lon) };
}
