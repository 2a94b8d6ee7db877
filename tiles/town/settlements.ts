import type { Point } from './plane.ts';

/** A named part of the town or a village: what its addresses say, and how tightly it is built. */
export interface Settlement {
  name: string;
  place: 'town' | 'suburb' | 'village' | 'hamlet';
  /** City of its addresses. */
  city: string;
  postcode: string;
  centre: Point;
  /** Streets grow to about this far from the centre. */
  radius: number;
  /** Between parallel streets, metres. */
  spacing: number;
  /** Frontage of one house, metres. */
  plot: number;
  theme: 'sea' | 'trade' | 'tree' | 'bird' | 'land';
}

type Row = readonly [
  name: string,
  postcode: string,
  x: number,
  y: number,
  radius: number,
  spacing: number,
  plot: number,
  theme: Settlement['theme'],
];

const SUBURBS: readonly Row[] = [
  ['Old Town', '7101', 0, 480, 900, 76, 22, 'trade'],
  ['Northgate', '7102', 100, 1900, 1098, 112, 38, 'trade'],
  ['St Osla', '7103', -1700, 700, 1220, 112, 40, 'sea'],
  ['West Strand', '7104', -3300, 0, 1220, 132, 54, 'sea'],
  ['Kilnfield', '7105', -2600, 2300, 1464, 126, 50, 'trade'],
  ['East Bank', '7106', 1800, 900, 1098, 112, 38, 'sea'],
  ['Saltings', '7107', 3000, -250, 1220, 132, 54, 'sea'],
  ['Larkhill', '7108', 2900, 2200, 1464, 128, 50, 'bird'],
  ['Mill End', '7109', 150, 3300, 1281, 130, 50, 'tree'],
];

const VILLAGES: readonly Row[] = [
  ['Nessock', '7121', -7900, -3500, 756, 120, 54, 'sea'],
  ['Tollen Cross', '7122', -6300, 5250, 780, 124, 54, 'land'],
  ['Upper Marl', '7123', -2450, 7250, 707, 124, 54, 'tree'],
  ['Weirend', '7124', 1350, 7500, 658, 120, 54, 'tree'],
  ['Hathermoor', '7125', 7150, 4650, 805, 124, 54, 'bird'],
  ['Brackenhithe', '7126', 9500, -900, 683, 124, 54, 'land'],
  ['Skerrow', '7127', 6150, -2750, 780, 120, 54, 'bird'],
];

const settlement = (place: Settlement['place'], row: Row): Settlement => {
  const [name, postcode, x, y, radius, spacing, plot, theme] = row;
  const city = place === 'suburb' ? 'Pellan Bay' : name;
  return { name, place, city, postcode, centre: [x, y], radius, spacing, plot, theme };
};

export const SETTLEMENTS: readonly Settlement[] = [
  ...SUBURBS.map((row) => settlement('suburb', row)),
  ...VILLAGES.map((row) => settlement('village', row)),
];

/** How many radii away the nearest settlement's centre is; streets grow where this is under 1. */
export function settlementAt([x, y]: Point): { settlement: Settlement; radii: number } {
  let best = SETTLEMENTS[0]!;
  let radii = Infinity;
  for (const candidate of SETTLEMENTS) {
    const dx = x - candidate.centre[0];
    const dy = y - candidate.centre[1];
    const angle = Math.atan2(dy, dx);
    const ragged = 1 + 0.12 * Math.sin(3 * angle + candidate.centre[0]);
    const distance = Math.hypot(dx, dy) / (candidate.radius * ragged);
    if (distance < radii) {
      radii = distance;
      best = candidate;
    }
  }
  return { settlement: best, radii };
}
