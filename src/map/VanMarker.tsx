import { MapMark } from './MapMark.tsx';
import { markShape } from './markShapes.ts';

/** Where a van is. A place worked out from the route rather than seen is drawn hollow and dashed. */
export function VanMarker({
  shape,
  colour,
  lat,
  lon,
  label,
  expected = false,
  onSelect,
}: {
  shape: string;
  colour: string;
  lat: number;
  lon: number;
  /** Read out, e.g. "Otter, expected here, last seen 9:41". */
  label: string;
  expected?: boolean;
  onSelect?: () => void;
}) {
  return (
    <MapMark lat={lat} lon={lon} label={label} size={34} onTop={3} {...(onSelect && { onSelect })}>
      <svg viewBox="-17 -17 34 34" width="34" height="34" aria-hidden="true">
        <circle r="15" fill="white" opacity="0.92" />
        <circle
          r="14"
          fill="none"
          stroke={colour}
          strokeWidth="1.6"
          strokeDasharray={expected ? '3 3' : undefined}
        />
        <path
          d={markShape(shape)}
          transform="translate(-8 -8)"
          fill={expected ? 'white' : colour}
          stroke={colour}
          strokeWidth="2"
        />
      </svg>
    </MapMark>
  );
}
