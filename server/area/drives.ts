import { distanceMetres, type LatLon } from '#shared/travel/distanceMetres.ts';
import { straightLineLeg } from '#shared/travel/straightLineLeg.ts';
import type { RoadGraph } from '#tiles/roads/RoadGraph.ts';
import type { DriveRoute, DriveTable, Snap } from './Area.ts';
import { type Leg, RoadSearch } from './RoadSearch.ts';
import { routeLine } from './routeLine.ts';

/** The last bit from road to door is free up to here, then driven like a farm track. */
const FREE_METRES = 50;
const TRACK_METRES_PER_SECOND = 15 / 3.6;

/** Tables and routes over one road graph. */
export function drives(graph: RoadGraph, snap: (lat: number, lon: number) => Snap | null) {
  const search = new RoadSearch(graph);
  return {
    table: (points: readonly LatLon[]) => driveTable(search, snap, points),
    route: (from: LatLon, to: LatLon) => driveRoute(graph, search, snap, from, to),
  };
}

function driveTable(
  search: RoadSearch,
  snap: (lat: number, lon: number) => Snap | null,
  points: readonly LatLon[],
): DriveTable {
  const count = points.length;
  const snaps = points.map(({ lat, lon }) => snap(lat, lon));
  const targets = snaps.filter((found) => found !== null);
  const table: DriveTable = {
    seconds: new Array<number>(count * count).fill(0),
    metres: new Array<number>(count * count).fill(0),
    rough: new Array<boolean>(count * count).fill(false),
  };
  for (let from = 0; from < count; from++) {
    const start = snaps[from]!;
    if (start) search.from(start, targets);
    for (let to = 0; to < count; to++) {
      if (to === from || samePlace(points[from]!, points[to]!)) continue;
      const end = snaps[to]!;
      const leg = start && end ? search.legTo(end) : null;
      const drive = leg ? rounded(leg, start!, end!) : straightLineLeg(points[from]!, points[to]!);
      table.seconds[from * count + to] = drive.seconds;
      table.metres[from * count + to] = drive.metres;
      table.rough[from * count + to] = !leg;
    }
  }
  return table;
}

function driveRoute(
  graph: RoadGraph,
  search: RoadSearch,
  snap: (lat: number, lon: number) => Snap | null,
  from: LatLon,
  to: LatLon,
): DriveRoute {
  const straight: [number, number][] = [
    [from.lat, from.lon],
    [to.lat, to.lon],
  ];
  if (samePlace(from, to)) return { seconds: 0, metres: 0, line: straight, rough: false };
  const start = snap(from.lat, from.lon);
  const end = snap(to.lat, to.lon);
  if (start && end) {
    search.from(start, [end]);
    const leg = search.legTo(end);
    if (leg)
      return {
        ...rounded(leg, start, end),
        line: routeLine(graph, search, start, end, leg),
        rough: false,
      };
  }
  return { ...straightLineLeg(from, to), line: straight };
}

function rounded(leg: Leg, start: Snap, end: Snap): { seconds: number; metres: number } {
  const track = Math.max(0, start.metres - FREE_METRES) + Math.max(0, end.metres - FREE_METRES);
  return {
    seconds: Math.round(leg.ms / 1000 + track / TRACK_METRES_PER_SECOND),
    metres: Math.round(leg.cm / 100 + track),
  };
}

function samePlace(a: LatLon, b: LatLon): boolean {
  return distanceMetres(a, b) < 1;
}
