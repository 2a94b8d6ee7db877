import type { OsmDraft } from './OsmDraft.ts';
import type { Point } from './plane.ts';
import { SETTLEMENTS } from './settlements.ts';

const VETS: readonly (readonly [name: string, at: Point, hours: string])[] = [
  ['Quayside Animal Hospital', [300, 330], '24/7'],
  ['Kilnfield Vets', [-2320, 2060], 'Mo-Sa 08:00-19:00'],
  ['Larkhill Vets', [2700, 2380], 'Mo-Fr 08:30-18:00'],
];

/** Names of places, water and headlands, and the vets a groomer may need in a hurry. */
export function drawPlaces(draft: OsmDraft): void {
  draft.node([-60, 760], { place: 'town', name: 'Pellan Bay' });
  for (const { name, place, centre } of SETTLEMENTS) draft.node(centre, { place, name });
  draft.node([0, -2700], { natural: 'bay', name: 'Pellan Water' });
  draft.node([-2600, -4300], { place: 'islet', name: 'Gannet Holm' });
  draft.node([-8500, -4950], { natural: 'cape', name: 'Nessock Head' });
  draft.node([7250, -4600], { natural: 'cape', name: 'Skerrow Head' });
  for (const [name, at, hours] of VETS)
    draft.node(at, { amenity: 'veterinary', name, opening_hours: hours });
  for (const { centre, radius } of SETTLEMENTS) {
    const ring = Array.from({ length: 24 }, (_, i): Point => {
      const angle = (i / 24) * 2 * Math.PI;
      const ragged = 1.02 + 0.12 * Math.sin(3 * angle + centre[0]);
      const reach = radius * ragged;
      return [centre[0] + reach * Math.cos(angle), centre[1] + reach * Math.sin(angle)];
    });
    draft.ring(ring, { landuse: 'residential' });
  }
}
