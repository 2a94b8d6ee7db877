/** Bits of `sectionFlags`. */
export const END_ONLY = 1;
export const DOORLESS = 2;
/** Arriving at the section's `to` (or `from`) end costs the junction's wait. */
export const WAIT_AT_TO = 4;
export const WAIT_AT_FROM = 8;

/**
 * The road network as flat arrays, ready for Dijkstra and for sharing between threads.
 *
 * A *node* is a junction or dead end, a *section* the road between two nodes with its shape, an *arc*
 * a section in one direction. Search runs over *states*: state n is node n on open road; nodes that
 * touch end-only roads own two more, "still leaving" and "already arriving", so that a path may start
 * and end on a private or destination road but never cut through one.
 */
export interface RoadGraph {
  nodeCount: number;
  stateCount: number;
  sectionCount: number;
  /** Added by an arrival at a `WAIT_AT_…` end, milliseconds. */
  junctionMs: number;
  /** 1 where open road touches the node, so that `state n` exists for the search. */
  nodeOpen: Uint8Array;
  /** State of the node while leaving / arriving along end-only roads; −1 where it has none. */
  nodeLeaving: Int32Array;
  nodeArriving: Int32Array;
  sectionFrom: Int32Array;
  sectionTo: Int32Array;
  sectionCm: Uint32Array;
  /** Milliseconds for the whole section, waits not included; 0 where that direction is forbidden. */
  sectionForwardMs: Uint32Array;
  sectionBackwardMs: Uint32Array;
  sectionFlags: Uint8Array;
  /** Index into `names`, −1 without one. */
  sectionName: Int32Array;
  /** Section s has the points shapeStart[s] … shapeStart[s+1]−1. */
  shapeStart: Uint32Array;
  shapeLatE7: Int32Array;
  shapeLonE7: Int32Array;
  /** State s has the arcs arcStart[s] … arcStart[s+1]−1. */
  arcStart: Uint32Array;
  arcTo: Int32Array;
  /** Waits included. */
  arcMs: Uint32Array;
  arcCm: Uint32Array;
  /** Section × 2, plus 1 when driven backward. */
  arcSection: Int32Array;
  names: string[];
}

/** The arrays in the order the file keeps them. */
export const ROAD_ARRAYS = [
  ['nodeOpen', Uint8Array],
  ['nodeLeaving', Int32Array],
  ['nodeArriving', Int32Array],
  ['sectionFrom', Int32Array],
  ['sectionTo', Int32Array],
  ['sectionCm', Uint32Array],
  ['sectionForwardMs', Uint32Array],
  ['sectionBackwardMs', Uint32Array],
  ['sectionFlags', Uint8Array],
  ['sectionName', Int32Array],
  ['shapeStart', Uint32Array],
  ['shapeLatE7', Int32Array],
  ['shapeLonE7', Int32Array],
  ['arcStart', Uint32Array],
  ['arcTo', Int32Array],
  ['arcMs', Uint32Array],
  ['arcCm', Uint32Array],
  ['arcSection', Int32Array],
] as const;
