import { useState } from 'react';
import { readNearestAddress, useAddressSearch } from './addresses.ts';

/** A spot on the map and the words for it; the spot is null until one is chosen. */
export interface Where {
  addressLabel: string;
  lat: number | null;
  lon: number | null;
}

/**
 * Finding a spot by address or by pin. Typing changes only the words; picking an address or dropping
 * a pin moves the spot. A pin near an address borrows its words when none were typed.
 */
export function useWhere(value: Where, onChange: (value: Where) => void) {
  const [said, setSaid] = useState<string | null>(null);
  const { addresses, searching, failed } = useAddressSearch(value.addressLabel);
  const onPin = async (lat: number, lon: number) => {
    onChange({ ...value, lat, lon });
    setSaid('The pin is set.');
    try {
      const { address, outsideArea } = await readNearestAddress(lat, lon);
      if (outsideArea) setSaid('This pin lies outside the working area: driving there is rough.');
      else if (address) {
        setSaid(`Pin next to ${address.label}.`);
        onChange({ addressLabel: value.addressLabel.trim() || address.label, lat, lon });
      }
    } catch {
      setSaid('The pin is set. Type the address yourself; the search did not answer.');
    }
  };
  return {
    text: value.addressLabel,
    onText: (addressLabel: string) => onChange({ ...value, addressLabel }),
    options: addresses.map(({ id, label }) => ({ key: id, label })),
    onPick: ({ key }: { key: string }) => {
      const found = addresses.find(({ id }) => id === key);
      if (!found) return;
      onChange({ addressLabel: found.label, lat: found.lat, lon: found.lon });
      setSaid(null);
    },
    loading: searching,
    emptyWords: failed
      ? 'The address search did not answer. Drop a pin instead.'
      : 'No address like this in the working area. Drop a pin instead.',
    onPin,
    said,
  };
}
