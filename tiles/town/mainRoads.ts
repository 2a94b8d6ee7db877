import type { Line } from './plane.ts';

/** A through road drawn by hand; streets grow between these. */
export interface MainRoad {
  name: string;
  highway: 'trunk' | 'primary' | 'secondary' | 'tertiary';
  /** Limit outside and inside the built-up parts, km/h. */
  openKmh: number;
  townKmh: number;
  points: Line;
}

const road = (
  highway: MainRoad['highway'],
  name: string,
  openKmh: number,
  townKmh: number,
  points: Line,
): MainRoad => ({ highway, name, openKmh, townKmh, points });

// prettier-ignore
export const MAIN_ROADS: readonly MainRoad[] = [
  road('trunk', 'Bay Relief Road', 100, 80, [
    [-13000, 2500], [-9000, 2950], [-6300, 3350], [-3900, 3950], [-1800, 4350], [300, 4480],
    [2600, 4150], [4800, 3500], [7200, 2500], [9800, 2100], [13000, 2500],
  ]),
  road('primary', 'Strand', 80, 50, [
    [-13000, -4300], [-10300, -4000], [-8400, -4150], [-7300, -3300], [-6300, -2000],
    [-4800, -1200], [-3100, -620], [-1700, -230], [-950, 20], [-500, 210], [-100, 230], [500, 190],
  ]),
  road('primary', 'Harbour Road', 80, 50, [
    [500, 190], [960, 260], [1350, 230], [1850, -150], [2500, -520], [3700, -1280], [5000, -2040],
    [5950, -2850], [6600, -3550], [8000, -3600], [10300, -3050], [13000, -3250],
  ]),
  road('secondary', 'Ramparts', 50, 50, [
    [-950, 20], [-1130, 650], [-830, 1250], [-120, 1560], [450, 1560], [960, 1450], [1500, 1350],
    [1880, 780], [1850, -150],
  ]),
  road('primary', 'Tollen Road', 80, 50, [
    [-830, 1250], [-1700, 2250], [-2850, 3100], [-3900, 3950], [-5000, 4500], [-6300, 5250],
    [-8600, 6300], [-12500, 7400],
  ]),
  road('primary', 'Marl Road', 80, 50, [
    [-120, 1560], [-60, 2600], [-230, 3600], [-420, 4440], [-1000, 5600], [-1700, 6600],
    [-2450, 7250], [-3000, 8700], [-3300, 10800],
  ]),
  road('secondary', 'Hathermoor Road', 80, 50, [
    [1500, 1350], [2300, 2150], [3450, 2850], [4800, 3500], [6100, 4150], [7150, 4650],
    [9400, 5500], [12500, 6000],
  ]),
  road('tertiary', 'Heron Bank', 70, 50, [
    [1500, 1350], [1560, 2300], [1500, 3300], [1250, 4370], [1100, 5700], [1350, 7500],
    [1700, 10500],
  ]),
  road('secondary', 'Kiln Road', 80, 50, [
    [-1130, 650], [-2200, 850], [-3600, 900], [-5000, 1400], [-6700, 2300], [-9000, 2950],
  ]),
  road('secondary', 'Saltings Road', 80, 50, [
    [1880, 780], [3000, 800], [4300, 900], [5800, 1500], [7200, 2500],
  ]),
  road('tertiary', 'Orchard Way', 50, 50, [
    [-3100, -620], [-3300, 250], [-3600, 900], [-3350, 1900], [-2550, 2850],
  ]),
  road('tertiary', 'Fuller Way', 50, 50, [
    [-1700, 2250], [-900, 2650], [-60, 2600], [760, 2560], [1540, 2450], [2300, 2150], [3150, 1600],
    [3000, 800], [3150, -100], [2950, -800],
  ]),
  road('tertiary', 'Bracken Lane', 80, 50, [
    [7200, 2500], [8400, 1000], [9500, -900], [10000, -3080],
  ]),
  road('tertiary', 'Skerrow Lane', 80, 50, [[4300, 900], [5100, -400], [5700, -1700], [5950, -2850]]),
  road('tertiary', 'Warren Lane', 80, 50, [
    [-5000, 1400], [-6200, 0], [-7300, -1700], [-7900, -3000], [-8400, -4150],
  ]),
  road('tertiary', 'Tarn Lane', 80, 50, [[-2450, 7250], [-4200, 6500], [-6300, 5250]]),
  road('tertiary', 'Weir Lane', 80, 50, [[1350, 7500], [200, 7650], [-1000, 7500], [-2450, 7250]]),
  road('tertiary', 'Hanger Lane', 80, 50, [[1350, 7500], [3500, 6900], [5700, 5800], [7150, 4650]]),
  road('secondary', 'Market Street', 30, 30, [
    [-100, 230], [-20, 600], [-60, 1000], [-120, 1560],
  ]),
  road('tertiary', 'Quay Street', 30, 30, [[-1000, 330], [-500, 560], [-20, 600], [420, 560], [500, 190]]),
];

/** Names of the bridges that come about where a road crosses the river, by road. */
export const BRIDGES: Readonly<Record<string, string>> = {
  'Bay Relief Road': 'Whimbrel Viaduct',
  'Harbour Road': 'Harbour Bridge',
  Ramparts: 'Packhorse Bridge',
  'Fuller Way': 'Ropewalk Bridge',
  'Weir Lane': 'Weir Bridge',
};

/** Roundabouts where two main roads cross. */
export const ROUNDABOUTS: readonly (readonly [string, string])[] = [
  ['Bay Relief Road', 'Tollen Road'],
  ['Bay Relief Road', 'Marl Road'],
  ['Bay Relief Road', 'Hathermoor Road'],
  ['Bay Relief Road', 'Heron Bank'],
];
