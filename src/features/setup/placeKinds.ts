import type { Place } from '#shared/api/places.ts';

export type PlaceKind = Place['kind'];

/** Words of each kind of place, in the order they are shown. */
export const placeKinds: readonly { value: PlaceKind; label: string; many: string }[] = [
  { value: 'depot', label: 'Depot', many: 'Depots' },
  { value: 'waterFill', label: 'Fresh water', many: 'Fresh water' },
  { value: 'waterDump', label: 'Grey water dump', many: 'Grey water dumps' },
  { value: 'fillAndDump', label: 'Fill and dump', many: 'Fill and dump' },
  { value: 'emergencyVet', label: 'Emergency vet', many: 'Emergency vets' },
];

/** Whether vans stop there to fill or empty a tank. */
export function isRefill(kind: PlaceKind): boolean {
  return kind === 'waterFill' || kind === 'waterDump' || kind === 'fillAndDump';
}
