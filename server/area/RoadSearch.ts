import { END_ONLY, type RoadGraph, WAIT_AT_FROM, WAIT_AT_TO } from '#tiles/roads/RoadGraph.ts';
import type { Snap } from './Area.ts';
import { StateHeap } from './StateHeap.ts';

/** The quickest drive between two snapped points. */
export interface Leg {
  ms: number;
  cm: number;
  /** State whose node the last section is entered from; −1 when both points share that section. */
  last: number;
  /** Is the last section driven against its direction? */
  lastBackward: boolean;
}

/**
 * Quickest drives from one point to many over the flat road arrays (Dijkstra, stopped once every
 * target is settled). One instance serves one thread: its arrays are reused from run to run.
 */
export class RoadSearch {
  readonly #graph: RoadGraph;
  readonly #ms: Float64Array;
  readonly #cm: Float64Array;
  /** Arc that led to a state; −2 when it is reached straight from the start, forward; −3 backward. */
  readonly #arc: Int32Array;
  readonly #cameFrom: Int32Array;
  readonly #run: Uint32Array;
  readonly #settled: Uint32Array;
  readonly #heap: StateHeap;
  #now = 0;
  #start: Snap | undefined;

  constructor(graph: RoadGraph) {
    this.#graph = graph;
    this.#ms = new Float64Array(graph.stateCount);
    this.#cm = new Float64Array(graph.stateCount);
    this.#arc = new Int32Array(graph.stateCount);
    this.#cameFrom = new Int32Array(graph.stateCount);
    this.#run = new Uint32Array(graph.stateCount);
    this.#settled = new Uint32Array(graph.stateCount);
    this.#heap = new StateHeap(this.#ms);
  }

  /** Searches from a point until every target can be answered by `legTo`. */
  from(start: Snap, targets: readonly Snap[]): void {
    this.#now += 1;
    this.#start = start;
    this.#heap.clear();
    const wanted = new Set<number>();
    for (const target of targets) for (const exit of this.#exits(target)) wanted.add(exit.state);
    this.#leaveStart(start);
    const { arcStart, arcTo, arcMs, arcCm } = this.#graph;
    while (this.#heap.size > 0 && wanted.size > 0) {
      const state = this.#heap.pop();
      this.#settled[state] = this.#now;
      wanted.delete(state);
      const ms = this.#ms[state]!;
      const cm = this.#cm[state]!;
      for (let arc = arcStart[state]!; arc < arcStart[state + 1]!; arc++)
        this.#reach(arcTo[arc]!, ms + arcMs[arc]!, cm + arcCm[arc]!, arc, state);
    }
  }

  /** The drive to a target of the last `from`; null when no road leads there. */
  legTo(target: Snap): Leg | null {
    let best = this.#alongSection(this.#start!, target);
    for (const { state, ms, cm, backward } of this.#exits(target)) {
      if (this.#settled[state] !== this.#now) continue;
      const total = this.#ms[state]! + ms;
      if (!best || total < best.ms)
        best = { ms: total, cm: this.#cm[state]! + cm, last: state, lastBackward: backward };
    }
    return best;
  }

  /** Whole arcs (section × 2 + backward) of the way to a settled state, and how the start was left. */
  wayTo(state: number): { arcs: number[]; startBackward: boolean } {
    const arcs: number[] = [];
    let at = state;
    while (this.#arc[at]! >= 0) {
      arcs.push(this.#graph.arcSection[this.#arc[at]!]!);
      at = this.#cameFrom[at]!;
    }
    return { arcs: arcs.reverse(), startBackward: this.#arc[at] === -3 };
  }

  #leaveStart({ section, share }: Snap): void {
    const g = this.#graph;
    const flags = g.sectionFlags[section]!;
    const cm = g.sectionCm[section]!;
    const leave = (node: number, ms: number, length: number, wait: number, mark: number) => {
      const total = Math.round(ms) + (flags & wait ? g.junctionMs : 0);
      const push = (state: number) => this.#reach(state, total, Math.round(length), mark, -1);
      if (!(flags & END_ONLY)) push(node);
      else {
        push(g.nodeLeaving[node]!);
        if (g.nodeOpen[node]) push(node);
      }
    };
    const forward = g.sectionForwardMs[section]!;
    const backward = g.sectionBackwardMs[section]!;
    if (forward > 0)
      leave(g.sectionTo[section]!, forward * (1 - share), cm * (1 - share), WAIT_AT_TO, -2);
    if (backward > 0)
      leave(g.sectionFrom[section]!, backward * share, cm * share, WAIT_AT_FROM, -3);
  }

  /** Ways to enter the target's section: the state to come from, and the rest of the drive. */
  #exits({ section, share }: Snap): { state: number; ms: number; cm: number; backward: boolean }[] {
    const g = this.#graph;
    const endOnly = (g.sectionFlags[section]! & END_ONLY) !== 0;
    const length = g.sectionCm[section]!;
    const exits: { state: number; ms: number; cm: number; backward: boolean }[] = [];
    const enter = (node: number, ms: number, cm: number, backward: boolean) => {
      const states = endOnly ? [g.nodeLeaving[node]!, g.nodeArriving[node]!] : [];
      if (g.nodeOpen[node]) states.push(node);
      for (const state of states)
        exits.push({ state, ms: Math.round(ms), cm: Math.round(cm), backward });
    };
    const forward = g.sectionForwardMs[section]!;
    const backward = g.sectionBackwardMs[section]!;
    if (forward > 0) enter(g.sectionFrom[section]!, forward * share, length * share, false);
    if (backward > 0)
      enter(g.sectionTo[section]!, backward * (1 - share), length * (1 - share), true);
    return exits;
  }

  #alongSection(start: Snap, target: Snap): Leg | null {
    if (start.section !== target.section) return null;
    const g = this.#graph;
    const part = target.share - start.share;
    const ms = part >= 0 ? g.sectionForwardMs[start.section]! : g.sectionBackwardMs[start.section]!;
    if (ms === 0 && part !== 0) return null;
    return {
      ms: Math.round(Math.abs(part) * ms),
      cm: Math.round(Math.abs(part) * g.sectionCm[start.section]!),
      last: -1,
      lastBackward: part < 0,
    };
  }

  #reach(state: number, ms: number, cm: number, arc: number, cameFrom: number): void {
    if (this.#run[state] === this.#now && this.#ms[state]! <= ms) return;
    this.#run[state] = this.#now;
    this.#ms[state] = ms;
    this.#cm[state] = cm;
    this.#arc[state] = arc;
    this.#cameFrom[state] = cameFrom;
    this.#heap.push(state);
  }
}
