import { END_ONLY, type RoadGraph, WAIT_AT_FROM, WAIT_AT_TO } from './RoadGraph.ts';

type Roads = Pick<
  RoadGraph,
  | 'nodeCount'
  | 'sectionCount'
  | 'junctionMs'
  | 'sectionFrom'
  | 'sectionTo'
  | 'sectionCm'
  | 'sectionForwardMs'
  | 'sectionBackwardMs'
  | 'sectionFlags'
>;

type Arcs = Pick<
  RoadGraph,
  | 'stateCount'
  | 'nodeOpen'
  | 'nodeLeaving'
  | 'nodeArriving'
  | 'arcStart'
  | 'arcTo'
  | 'arcMs'
  | 'arcCm'
  | 'arcSection'
>;

interface Arc {
  at: number;
  to: number;
  ms: number;
  cm: number;
  section: number;
}

/** Gives nodes their states and lays the directed arcs between them (see `RoadGraph`). */
export function layArcs(roads: Roads): Arcs {
  const { nodeOpen, nodeLeaving, nodeArriving, stateCount } = statesOf(roads);
  const arcs: Arc[] = [];
  eachDirection(roads, (from, to, ms, cm, section, endOnly) => {
    const add = (at: number, target: number) => arcs.push({ at, to: target, ms, cm, section });
    if (!endOnly) {
      add(from, to);
      return;
    }
    add(nodeLeaving[from]!, nodeLeaving[to]!);
    add(nodeArriving[from]!, nodeArriving[to]!);
    if (nodeOpen[to]) add(nodeLeaving[from]!, to);
    if (nodeOpen[from]) add(from, nodeArriving[to]!);
  });
  arcs.sort((a, b) => a.at - b.at || a.section - b.section || a.to - b.to);
  const arcStart = new Uint32Array(stateCount + 1);
  for (const { at } of arcs) arcStart[at + 1]! += 1;
  for (let state = 0; state < stateCount; state++) arcStart[state + 1]! += arcStart[state]!;
  return {
    stateCount,
    nodeOpen,
    nodeLeaving,
    nodeArriving,
    arcStart,
    arcTo: Int32Array.from(arcs, (arc) => arc.to),
    arcMs: Uint32Array.from(arcs, (arc) => arc.ms),
    arcCm: Uint32Array.from(arcs, (arc) => arc.cm),
    arcSection: Int32Array.from(arcs, (arc) => arc.section),
  };
}

function statesOf(roads: Roads) {
  const nodeOpen = new Uint8Array(roads.nodeCount);
  const nodeLeaving = new Int32Array(roads.nodeCount).fill(-1);
  const nodeArriving = new Int32Array(roads.nodeCount).fill(-1);
  let stateCount = roads.nodeCount;
  for (let section = 0; section < roads.sectionCount; section++) {
    for (const node of [roads.sectionFrom[section]!, roads.sectionTo[section]!]) {
      if (!(roads.sectionFlags[section]! & END_ONLY)) nodeOpen[node] = 1;
      else if (nodeLeaving[node] === -1) {
        nodeLeaving[node] = stateCount++;
        nodeArriving[node] = stateCount++;
      }
    }
  }
  return { nodeOpen, nodeLeaving, nodeArriving, stateCount };
}

function eachDirection(
  roads: Roads,
  visit: (
    from: number,
    to: number,
    ms: number,
    cm: number,
    arcSection: number,
    endOnly: boolean,
  ) => void,
) {
  for (let section = 0; section < roads.sectionCount; section++) {
    const from = roads.sectionFrom[section]!;
    const to = roads.sectionTo[section]!;
    const cm = roads.sectionCm[section]!;
    const flags = roads.sectionFlags[section]!;
    const endOnly = (flags & END_ONLY) !== 0;
    const forward = roads.sectionForwardMs[section]!;
    const backward = roads.sectionBackwardMs[section]!;
    const wait = (bit: number) => (flags & bit ? roads.junctionMs : 0);
    if (forward > 0) visit(from, to, forward + wait(WAIT_AT_TO), cm, section * 2, endOnly);
    if (backward > 0) visit(to, from, backward + wait(WAIT_AT_FROM), cm, section * 2 + 1, endOnly);
  }
}
