import { E7 } from '#tiles/osm/NodeStore.ts';
import type { RoadGraph } from '#tiles/roads/RoadGraph.ts';
import type { Snap } from './Area.ts';
import type { Leg, RoadSearch } from './RoadSearch.ts';

/** The shape of a drive just searched, from where the start meets its road to where the end does. */
export function routeLine(
  graph: RoadGraph,
  search: RoadSearch,
  from: Snap,
  to: Snap,
  leg: Leg,
): [number, number][] {
  const line: [number, number][] = [[from.lat, from.lon]];
  const add = (points: [number, number][]) => {
    for (const point of points) {
      const last = line.at(-1)!;
      if (last[0] !== point[0] || last[1] !== point[1]) line.push(point);
    }
  };
  if (leg.last < 0) {
    add(piece(graph, from.section, from.share, to.share));
  } else {
    const { arcs, startBackward } = search.wayTo(leg.last);
    add(piece(graph, from.section, from.share, startBackward ? 0 : 1));
    for (const arc of arcs) add(piece(graph, arc >> 1, arc & 1, 1 - (arc & 1)));
    add(piece(graph, to.section, leg.lastBackward ? 1 : 0, to.share));
  }
  add([[to.lat, to.lon]]);
  return line;
}

/** Shape points of a section strictly between two shares, in driving order, ends included at 0 and 1. */
function piece(graph: RoadGraph, section: number, from: number, to: number): [number, number][] {
  const start = graph.shapeStart[section]!;
  const end = graph.shapeStart[section + 1]!;
  const xShrink = Math.cos(((graph.shapeLatE7[start]! / E7) * Math.PI) / 180);
  const along: number[] = [0];
  for (let i = start + 1; i < end; i++) {
    const length = Math.hypot(
      graph.shapeLatE7[i]! - graph.shapeLatE7[i - 1]!,
      (graph.shapeLonE7[i]! - graph.shapeLonE7[i - 1]!) * xShrink,
    );
    along.push(along.at(-1)! + length);
  }
  const total = along.at(-1)! || 1;
  const least = Math.min(from, to);
  const most = Math.max(from, to);
  const points: [number, number][] = [];
  along.forEach((length, i) => {
    const share = i === along.length - 1 ? 1 : length / total;
    if (share >= least && share <= most)
      points.push([graph.shapeLatE7[start + i]! / E7, graph.shapeLonE7[start + i]! / E7]);
  });
  return from > to ? points.reverse() : points;
}
