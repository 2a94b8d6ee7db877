import { MapMark } from './MapMark.tsx';

const LOOKS = {
  depot: { fill: 'var(--ink)', sign: 'M8 14.5 15 8.5l7 6V22h-5v-4.6h-4V22H8z' },
  water: { fill: '#3d7d77', sign: 'M15 7.5c3 3.8 5 6.2 5 9a5 5 0 0 1-10 0c0-2.8 2-5.2 5-9z' },
  vet: { fill: 'var(--rosette)', sign: 'M13 8h4v5h5v4h-5v5h-4v-5H8v-4h5z' },
} as const;

/** A place of the business: depot, water fill, or an emergency vet. */
export function DepotMarker({
  lat,
  lon,
  label,
  kind = 'depot',
  onSelect,
}: {
  lat: number;
  lon: number;
  label: string;
  kind?: keyof typeof LOOKS;
  onSelect?: () => void;
}) {
  const { fill, sign } = LOOKS[kind];
  return (
    <MapMark lat={lat} lon={lon} label={label} size={30} {...(onSelect && { onSelect })}>
      <svg viewBox="0 0 30 30" width="30" height="30" aria-hidden="true">
        <rect
          x="1"
          y="1"
          width="28"
          height="28"
          rx="8"
          fill={fill}
          stroke="white"
          strokeWidth="2"
        />
        <path d={sign} fill="white" />
      </svg>
    </MapMark>
  );
}
