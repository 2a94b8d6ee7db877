import { PinFields } from '#src/components/PinFields.tsx';

/** The pin of a household or site. */
export function PinMap({
  lat,
  lon,
  onPin,
}: {
  lat: number | null;
  lon: number | null;
  onPin: (lat: number, lon: number) => void;
}) {
  return <PinFields key={`${lat} ${lon}`} lat={lat} lon={lon} onPin={onPin} />;
}
