import { MapMark } from './MapMark.tsx';
import { markShape } from './markShapes.ts';

const SIZE = 30;

/** A stop of a run: a white disc ringed in the van's colour, its number inside, the van's shape beside. */
export function StopMarker({
  number,
  shape,
  colour,
  lat,
  lon,
  label,
  selected = false,
  muted = false,
  onSelect,
}: {
  number: number;
  shape: string;
  /** Any CSS colour, custom properties included. */
  colour: string;
  lat: number;
  lon: number;
  /** Read out, e.g. "Stop 3 of Otter, Juniper". */
  label: string;
  selected?: boolean;
  /** Done already. */
  muted?: boolean;
  onSelect?: () => void;
}) {
  return (
    <MapMark
      lat={lat}
      lon={lon}
      label={label}
      size={SIZE}
      onTop={selected ? 2 : 1}
      {...(onSelect && { selected, onSelect })}
    >
      <svg
        viewBox="0 0 30 30"
        width={SIZE}
        height={SIZE}
        aria-hidden="true"
        overflow="visible"
        style={selected ? { transform: 'scale(1.18)' } : undefined}
      >
        <circle cx="15" cy="15" r="15" fill="white" opacity={muted ? 0.75 : 1} />
        <circle
          cx="15"
          cy="15"
          r="12.6"
          fill={selected ? colour : 'white'}
          stroke={colour}
          strokeWidth="2.8"
          opacity={muted ? 0.6 : 1}
        />
        <text
          x="15"
          y="15.4"
          textAnchor="middle"
          dominantBaseline="central"
          fontSize={number > 9 ? 12.5 : 14}
          fontWeight="700"
          fill={selected ? 'white' : 'var(--ink)'}
          opacity={muted ? 0.7 : 1}
        >
          {number}
        </text>
        <path
          d={markShape(shape)}
          transform="translate(20.5 -3.5) scale(0.72)"
          fill={colour}
          stroke="white"
          strokeWidth="2.4"
          paintOrder="stroke"
        />
      </svg>
    </MapMark>
  );
}
