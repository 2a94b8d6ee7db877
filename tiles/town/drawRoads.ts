import type { OsmTags } from '../osm/osmTypes.ts';
import type { JoinedRoad, Spot } from './joinRoads.ts';
import { waterRings } from './landscape.ts';
import { BRIDGES } from './mainRoads.ts';
import type { OsmDraft } from './OsmDraft.ts';
import { blend, isInside, type Point } from './plane.ts';
import { settlementAt } from './settlements.ts';

/** Longest way before it is cut, as mappers do. */
const MOST_SPOTS = 120;

/** Writes each road as ways, cut where a bridge or another speed limit begins. */
export function drawRoads(draft: OsmDraft, roads: readonly JoinedRoad[]): void {
  const ends = countUses(roads);
  for (const road of roads) {
    const meetsBothEnds = ends.get(road.spots[0]!.id)! > 1 && ends.get(road.spots.at(-1)!.id)! > 1;
    let run: Spot[] = [road.spots[0]!];
    let kind = '';
    const flush = () => {
      if (run.length < 2) return;
      const tags = JSON.parse(kind) as OsmTags;
      draft.way(
        run.map(({ id, at }) => draft.spot(id, at)),
        tags,
      );
    };
    for (let i = 1; i < road.spots.length; i++) {
      const middle = blend(road.spots[i - 1]!.at, road.spots[i]!.at, 0.5);
      const here = JSON.stringify(tagsOf(road, middle, meetsBothEnds));
      if (here !== kind || (run.length >= MOST_SPOTS && !road.roundabout)) {
        flush();
        run = [road.spots[i - 1]!];
        kind = here;
      }
      run.push(road.spots[i]!);
    }
    flush();
  }
}

function tagsOf(road: JoinedRoad, middle: Point, meetsBothEnds: boolean): OsmTags {
  const { settlement, radii } = settlementAt(middle);
  const inTown = radii < 1.05;
  const main = road.settlement === undefined;
  const bridge = main && waterRings.some((ring) => isInside(middle, ring));
  return {
    highway: road.highway,
    ...(road.name && { name: road.name }),
    maxspeed: String(road.highway === 'living_street' ? 10 : inTown ? road.townKmh : road.openKmh),
    ...(road.oneway && meetsBothEnds && { oneway: 'yes' }),
    ...(road.roundabout && { junction: 'roundabout' }),
    ...(bridge && { bridge: 'yes', layer: '1' }),
    ...(bridge && BRIDGES[road.name] && { 'bridge:name': BRIDGES[road.name]! }),
    ...(settlement.name === 'Old Town' &&
      road.highway === 'living_street' &&
      inTown && { motor_vehicle: 'destination' }),
  };
}

function countUses(roads: readonly JoinedRoad[]): Map<number, number> {
  const uses = new Map<number, number>();
  for (const { spots } of roads) for (const { id } of spots) uses.set(id, (uses.get(id) ?? 0) + 1);
  return uses;
}
