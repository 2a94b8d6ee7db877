const KMH_PER_UNIT: Record<string, number> = { '': 1, 'km/h': 1, kmh: 1, kph: 1, mph: 1.609344 };

/**
 * A posted limit in km/h, or null where the tag says nothing usable ("signals", "none", "RO:urban").
 * A bare number is km/h; "50 mph" carries its unit (OSM wiki, Key:maxspeed). Below 5 km/h is a typing
 * slip more often than a limit.
 */
export function parseMaxspeed(value: string | undefined): number | null {
  const match = value?.trim().match(/^(\d+(?:\.\d+)?)\s*([a-z/]*)$/i);
  if (!match) return null;
  const perUnit = KMH_PER_UNIT[match[2]!.toLowerCase()];
  if (perUnit === undefined) return null;
  const kmh = Number(match[1]) * perUnit;
  return kmh >= 5 && kmh <= 200 ? kmh : null;
}
