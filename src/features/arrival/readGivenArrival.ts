import type { Arrival } from '#shared/api/arrival.ts';

/** The visit the server wrote into the page, or null when it wrote none. */
export function readGivenArrival(): Arrival | null {
  try {
    return asArrival(JSON.parse(document.getElementById('arrival-data')?.textContent ?? 'null'));
  } catch {
    return null;
  }
}

/** A light check in place of the whole schema, which would double the page's weight. */
export function asArrival(value: unknown): Arrival | null {
  const known = value as Partial<Arrival> | null;
  return known &&
    typeof known.headline === 'string' &&
    typeof known.sentence === 'string' &&
    Array.isArray(known.steps) &&
    Array.isArray(known.haveReady)
    ? (known as Arrival)
    : null;
}
