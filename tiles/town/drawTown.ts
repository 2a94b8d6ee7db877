import { drawHouses } from './drawHouses.ts';
import { drawRoads } from './drawRoads.ts';
import { growStreets } from './growStreets.ts';
import { joinRoads } from './joinRoads.ts';
import {
  harbourShapes,
  openShapes,
  riverLine,
  sea,
  shoreShapes,
  waterRings,
  waterShapes,
  wildShapes,
} from './landscape.ts';
import { MAIN_ROADS, ROUNDABOUTS } from './mainRoads.ts';
import { OsmDraft } from './OsmDraft.ts';
import { placeFarms } from './placeFarms.ts';
import { placeHouses } from './placeHouses.ts';
import { curve, lengthOf } from './plane.ts';
import type { Road } from './Road.ts';
import { openRoundabouts } from './roundabouts.ts';
import { seededRandom } from './seededRandom.ts';
import { drawPlaces } from './drawPlaces.ts';
import { streetNames } from './streetNames.ts';

/** Raise when the drawing changes, so that demo areas are made anew. */
export const TOWN_VERSION = 1;

const SEED = 7101;

/** Pellan Bay, invented: harbour, river, old town, suburbs and seven villages. Always the same. */
export function drawTown(): OsmDraft {
  const random = seededRandom(SEED);
  const draft = new OsmDraft();
  draft.multipolygon(sea.outer, sea.islands, { natural: 'water', water: 'sea' });
  const shapes = [waterShapes, wildShapes, openShapes, shoreShapes, harbourShapes];
  for (const { ring, tags } of shapes.flat()) draft.ring(ring, tags);
  draft.way(
    riverLine.map((at) => draft.node(at)),
    { waterway: 'river', name: 'River Pell' },
  );

  const mains: Road[] = MAIN_ROADS.map(({ points, ...road }) => ({
    ...road,
    line: curve(points, 40),
  }));
  const nameFor = streetNames(random);
  const streets = growStreets(
    mains.map(({ line }) => line),
    random,
  ).map(({ line, settlement }): Road => {
    const old = settlement.name === 'Old Town';
    const name = nameFor(settlement.theme, lengthOf(line));
    const oneway = old && random.chance(0.55);
    if (oneway && random.chance(0.5)) line.reverse();
    const highway = old && random.chance(0.12) ? 'living_street' : 'residential';
    return { name, highway, openKmh: 30, townKmh: 30, line, settlement, oneway };
  });
  const joined = openRoundabouts(
    joinRoads(
      [...mains, ...streets],
      ({ settlement }) => (settlement ? settlement.spacing * 0.8 : 90),
      waterRings,
    ),
    ROUNDABOUTS,
  );
  drawRoads(draft, joined);
  drawHouses(draft, placeHouses(joined, random), random);
  placeFarms(draft, joined, random);
  drawPlaces(draft);
  return draft;
}
