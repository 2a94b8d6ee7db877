import { useState } from 'react';
import { Button } from './Button.tsx';
import { NumberField } from './NumberField.tsx';

/** The pin by numbers, for whoever cannot use a map. Degrees, WGS 84. */
export function PinFields({
  lat,
  lon,
  onPin,
}: {
  lat: number | null;
  lon: number | null;
  onPin: (lat: number, lon: number) => void;
}) {
  const [typedLat, setTypedLat] = useState(lat);
  const [typedLon, setTypedLon] = useState(lon);
  const good =
    typedLat !== null && typedLon !== null && Math.abs(typedLat) <= 85 && Math.abs(typedLon) <= 180;
  return (
    <div className="flex flex-wrap items-end gap-3">
      <NumberField
        label="Latitude"
        decimals={6}
        value={typedLat}
        onChange={setTypedLat}
        className="w-36"
      />
      <NumberField
        label="Longitude"
        decimals={6}
        value={typedLon}
        onChange={setTypedLon}
        className="w-36"
      />
      <Button
        size="small"
        disabled={!good}
        onClick={() => good && onPin(typedLat as number, typedLon as number)}
      >
        Set the pin there
      </Button>
    </div>
  );
}
