import { useState } from 'react';
import { AreaMap } from './AreaMap.tsx';
import { PinPicker } from './PinPicker.tsx';

/** Map and pin of `PinMap`, in the chunk that brings Leaflet. */
export function PinMapBody({
  areaName,
  version,
  bounds,
  attribution,
  spot,
  onPin,
}: {
  areaName: string;
  version: string;
  bounds: readonly [number, number, number, number];
  attribution: string;
  spot: { lat: number; lon: number } | null;
  onPin: (lat: number, lon: number) => void;
}) {
  // Only the first spot is gone to: the map must not jump under a pin being moved.
  const [fitTo] = useState(() => (spot ? [[spot.lat, spot.lon] as const] : undefined));
  return (
    <AreaMap
      areaName={areaName}
      version={version}
      bounds={bounds}
      attribution={attribution}
      fitTo={fitTo}
      label="Click the map or move the pin to where the van parks"
      className="h-72 overflow-hidden rounded-card border border-fawn"
    >
      <PinPicker value={spot} onChange={({ lat, lon }) => onPin(lat, lon)} />
    </AreaMap>
  );
}
