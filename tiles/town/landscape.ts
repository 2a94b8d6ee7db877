import { blob, curve, type Line, type Point, ribbon } from './plane.ts';

/** Sea in the south, a river from the hills in the north, and what grows between. All invented. */
export interface Shape {
  ring: Line;
  tags: Record<string, string>;
}

const COAST: Line = [
  [-21000, -5000], [-17000, -4600], [-13000, -5200], [-10200, -4700], [-8500, -5150],
  [-7300, -4700], [-6700, -3500], [-5900, -2400], [-4700, -1650], [-3100, -1000], [-1700, -640],
  [-900, -420], [-560, -160], [-300, -110], [300, -110], [700, -150], [1250, -260], [1700, -520],
  [2400, -860], [3600, -1600], [4900, -2350], [5900, -3250], [6600, -4300], [7300, -4850],
  [8600, -4300], [10800, -3800], [14000, -4400], [17500, -3900], [21000, -4600],
]; // prettier-ignore

const RIVER: Line = [
  [-1600, 16000], [-300, 12500], [-900, 10200], [300, 8800], [-500, 7300], [-250, 6000],
  [450, 4900], [950, 3700], [760, 2700], [900, 1900], [1020, 900], [960, 200], [1000, -500],
]; // prettier-ignore

/** The shore from west to east, a little ragged. */
export const coastLine: Point[] = curve(COAST, 90).map(([x, y], i) =>
  Math.abs(x) < 700 ? [x, y] : [x, y + 22 * Math.sin(i * 0.9) + 16 * Math.sin(i * 0.37 + 1)],
);

export const riverLine: Point[] = curve(RIVER, 70);
const riverRing = ribbon(riverLine, (share) => 16 + 44 * share * share);
const seaRing: Line = [...coastLine, [21000, -15000], [-21000, -15000]];
const dockRing: Line = [[-330, -150], [-180, -150], [-180, 120], [-330, 120]]; // prettier-ignore
const tarnRing = blob([-5300, 8000], 380, 1.1);

const gannetHolm = blob([-2600, -4300], 340, 0.4);
const littleHolm = blob([-2050, -4900], 120, 2.2, 16);

/** Water a street may not enter; the sea apart, because it has islands. */
export const waterRings: Line[] = [seaRing, riverRing, dockRing, tarnRing];
export const sea = { outer: seaRing, islands: [gannetHolm, littleHolm] };

export const waterShapes: Shape[] = [
  { ring: riverRing, tags: { natural: 'water', water: 'river' } },
  { ring: dockRing, tags: { natural: 'water', water: 'basin', name: 'Old Dock' } },
  { ring: tarnRing, tags: { natural: 'water', water: 'lake', name: 'Tollen Tarn' } },
];

const pier = (line: Line, half: number, name: string): Shape => ({
  ring: ribbon(curve(line, 30), () => half),
  tags: { man_made: 'breakwater', name },
});

/** On the water's edge; never in a street's way. */
export const shoreShapes: Shape[] = [
  pier([[-760, -330], [-640, -620], [-330, -760]], 9, 'West Mole'), // prettier-ignore
  pier([[560, -120], [520, -480], [140, -720]], 9, 'East Mole'), // prettier-ignore
  pier([[120, -100], [120, -300]], 7, 'Fish Pier'), // prettier-ignore
  beach(-5600, -1200, 'Long Sands'),
  beach(1900, 4300, 'Saltings Beach'),
];

function beach(fromX: number, toX: number, name: string): Shape {
  const shore = coastLine.filter(([x]) => x > fromX && x < toX);
  const ring = ribbon(shore, (share) => 8 + 46 * Math.sin(Math.PI * share));
  return { ring, tags: { natural: 'beach', name } };
}

type Patch = readonly [x: number, y: number, radius: number, name: string];

const patches = (list: readonly Patch[], tags: Record<string, string>): Shape[] =>
  list.map(([x, y, radius, name], i) => ({
    ring: blob([x, y], radius, i * 1.7 + 0.3),
    tags: { ...tags, name },
  }));

/** Streets go around these. */
export const openShapes: Shape[] = [
  ...patches(
    [
      [-520, 1000, 150, 'Rampart Gardens'], [-2500, 1500, 300, 'Kiln Common'],
      [2420, 1480, 250, 'Larkhill Park'], [420, 2150, 240, 'River Meadow'],
      [-2250, 260, 230, 'Osla Park'], [2450, 130, 230, 'Saltings Green'],
      [-420, 3250, 250, 'Mill End Park'], [1900, 3050, 200, 'Heron Ground'],
      [-1500, 3050, 190, 'Potters Green'], [3750, 1900, 230, 'Plover Field'],
      [120, 620, 60, 'Market Gardens'], [-4200, 150, 210, 'Cockle Green'],
    ], // prettier-ignore
    { leisure: 'park' },
  ),
  ...patches([[4350, -560, 520, 'Pellan Links']], { leisure: 'golf_course' }),
  ...patches([[-1180, 1750, 130, 'Old Hill Cemetery']], { landuse: 'cemetery' }),
  ...patches(
    [
      [-1500, 1350, 75, 'Rampart School'], [1480, 420, 80, 'East Bank School'],
      [-3250, 1450, 85, 'Kilnfield School'], [2900, 2150, 80, 'Larkhill School'],
      [350, 3350, 85, 'Mill End School'], [-2350, -330, 70, 'Strand School'],
      [7300, 4350, 70, 'Hathermoor School'], [-6700, 5000, 65, 'Tollen School'],
    ], // prettier-ignore
    { amenity: 'school' },
  ),
  ...patches([[-2050, 2500, 150, 'Bay Infirmary']], { amenity: 'hospital' }),
  ...patches(
    [
      [1560, -60, 200, 'Eastern Docks'],
      [-3250, 3300, 260, 'Kilnfield Works'],
    ],
    {
      landuse: 'industrial',
    },
  ),
];

const yard = (ring: Line, name: string): Shape => ({ ring, tags: { landuse: 'harbour', name } });
const shed = (x: number, y: number, w: number, d: number): Shape => ({
  ring: [[x, y], [x + w, y], [x + w, y + d], [x, y + d]], // prettier-ignore
  tags: { building: 'warehouse' },
});

/** The quays between the Strand and the water. */
export const harbourShapes: Shape[] = [
  yard([[-600, -150], [-345, -115], [-345, 165], [-560, 150]], 'Fish Quay'), // prettier-ignore
  yard([[-165, -105], [560, -110], [520, 150], [-100, 180], [-165, 170]], 'Quay Yard'), // prettier-ignore
  shed(-520, -60, 120, 34), shed(-520, 20, 90, 34), shed(-120, -60, 140, 36), shed(-110, 40, 60, 60),
  shed(90, -60, 150, 36), shed(60, 50, 110, 40), shed(300, -60, 160, 40), shed(330, 40, 90, 50),
  shed(1450, -160, 120, 40), shed(1480, -60, 160, 50), shed(1470, 40, 70, 50),
  shed(-3380, 3230, 130, 60), shed(-3220, 3260, 90, 70), shed(-3330, 3360, 150, 50),
]; // prettier-ignore

/** Roads may pass through these. */
export const wildShapes: Shape[] = [
  ...patches(
    [
      [-4700, 7000, 800, 'Marl Wood'], [4300, 5300, 850, 'Hather Wood'],
      [-9600, 300, 900, 'Nessock Wood'], [9200, 3900, 620, 'Old Warren'],
      [3000, 8800, 700, 'Weir Wood'], [7700, -700, 620, 'Skerrow Hanger'],
      [-7200, 1200, 420, 'Tern Copse'], [-500, 5200, 300, 'Alder Carr'],
      [-11000, 4700, 700, 'Western Hanger'], [5600, 8000, 600, 'North Copse'],
    ], // prettier-ignore
    { natural: 'wood' },
  ),
  ...[
    [-5600, 2600, 620], [-8300, 2000, 700], [-7600, -1400, 640], [5900, 300, 640],
    [8300, 1700, 600], [3300, 4700, 500], [-3300, 5400, 560], [2900, 6300, 560], [700, 6200, 380],
    [-9400, -3000, 520], [8700, -2300, 520], [-1200, 8300, 520], [-8700, 4600, 560],
    [6100, 6600, 560], [11000, 900, 620], [-4200, 9400, 620], [10300, 5000, 560],
  ].map(([x, y, radius], i) => ({
    ring: blob([x!, y!], radius!, i * 2.1),
    tags: i % 3 === 0 ? { landuse: 'meadow' } : { landuse: 'farmland' },
  })), // prettier-ignore
];
