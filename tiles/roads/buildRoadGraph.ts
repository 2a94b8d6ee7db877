import type { NodeStore } from '../osm/NodeStore.ts';
import type { CarProfile } from './carProfile.ts';
import { cutSections, type RoadWay, type Section } from './cutSections.ts';
import { keepConnected, type ConnectedRoads } from './keepConnected.ts';
import { layArcs } from './layArcs.ts';
import { DOORLESS, END_ONLY, type RoadGraph, WAIT_AT_FROM, WAIT_AT_TO } from './RoadGraph.ts';

/** What became of the roads, for the import report. */
export interface RoadCounts {
  carWays: number;
  junctions: number;
  sections: number;
  endOnlySections: number;
  droppedParts: number;
  droppedNodes: number;
}

/** Ways in, flat arrays out; null when no two points are joined by a drivable road. */
export function buildRoadGraph(
  ways: RoadWay[],
  nodes: NodeStore,
  blockedNodes: ReadonlySet<number>,
  profile: CarProfile,
): { graph: RoadGraph; counts: RoadCounts } | null {
  const connected = keepConnected(cutSections(ways, nodes, blockedNodes));
  if (connected.sections.length === 0) return null;
  const graph = flatten(connected, profile);
  const counts = {
    carWays: ways.length,
    junctions: graph.nodeCount,
    sections: graph.sectionCount,
    endOnlySections: connected.endOnly.filter(Boolean).length,
    droppedParts: connected.droppedParts,
    droppedNodes: connected.droppedNodes,
  };
  return { graph, counts };
}

function flatten({ sections, endOnly }: ConnectedRoads, profile: CarProfile): RoadGraph {
  const nodeIds = new Map<string, number>();
  const nameIds = new Map<string, number>();
  const idIn = <K>(ids: Map<K, number>, key: K) => {
    const id = ids.get(key) ?? ids.size;
    ids.set(key, id);
    return id;
  };
  const count = sections.length;
  const shapePoints = sections.reduce((sum, s) => sum + s.latE7.length, 0);
  const roads = {
    sectionCount: count,
    junctionMs: profile.junctionMs,
    sectionFrom: Int32Array.from(sections, (s) => idIn(nodeIds, s.from)),
    sectionTo: Int32Array.from(sections, (s) => idIn(nodeIds, s.to)),
    sectionCm: Uint32Array.from(sections, (s) => s.cm),
    sectionForwardMs: Uint32Array.from(sections, (s) => milliseconds(s.cm, s.way.car.forwardKmh)),
    sectionBackwardMs: Uint32Array.from(sections, (s) => milliseconds(s.cm, s.way.car.backwardKmh)),
    sectionName: Int32Array.from(sections, ({ way }) => (way.name ? idIn(nameIds, way.name) : -1)),
    shapeStart: new Uint32Array(count + 1),
    shapeLatE7: new Int32Array(shapePoints),
    shapeLonE7: new Int32Array(shapePoints),
    nodeCount: nodeIds.size,
    names: [...nameIds.keys()],
  };
  sections.forEach((section, i) => {
    const start = roads.shapeStart[i]!;
    roads.shapeLatE7.set(section.latE7, start);
    roads.shapeLonE7.set(section.lonE7, start);
    roads.shapeStart[i + 1] = start + section.latE7.length;
  });
  const sectionFlags = flagsOf(sections, endOnly, roads.sectionFrom, roads.sectionTo, nodeIds.size);
  return { ...roads, sectionFlags, ...layArcs({ ...roads, sectionFlags }) };
}

function milliseconds(cm: number, kmh: number): number {
  return kmh > 0 ? Math.max(1, Math.round((cm * 36) / kmh)) : 0;
}

/** A junction is where three or more real roads meet; driveways do not make one. */
function flagsOf(
  sections: Section[],
  endOnly: boolean[],
  from: Int32Array,
  to: Int32Array,
  nodeCount: number,
): Uint8Array {
  const arms = new Uint16Array(nodeCount);
  sections.forEach(({ way }, i) => {
    if (way.car.minor) return;
    arms[from[i]!]! += 1;
    arms[to[i]!]! += 1;
  });
  return Uint8Array.from(sections, ({ way }, i) => {
    const waits = !way.car.flows;
    return (
      (endOnly[i] ? END_ONLY : 0) |
      (way.car.doorless ? DOORLESS : 0) |
      (waits && arms[to[i]!]! >= 3 ? WAIT_AT_TO : 0) |
      (waits && arms[from[i]!]! >= 3 ? WAIT_AT_FROM : 0)
    );
  });
}
