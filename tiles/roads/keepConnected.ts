import { MultiDirectedGraph } from 'graphology';
import { stronglyConnectedComponents } from 'graphology-components';
import type { Section } from './cutSections.ts';

/** What of the network a van can drive to and come back from. */
export interface ConnectedRoads {
  sections: Section[];
  /** Parallel to `sections`: usable only in the first or last part of a drive. */
  endOnly: boolean[];
  /** Parts of the network left out because no van could get there and back. */
  droppedParts: number;
  droppedNodes: number;
}

/**
 * Keeps the largest strongly connected part. Inside it, streets that hang on the rest only through
 * private or destination roads count as end-only too: nothing lies behind them.
 */
export function keepConnected(sections: Section[]): ConnectedRoads {
  const whole = graphOf(sections, () => true);
  const parts = stronglyConnectedComponents(whole);
  const kept = new Set(largest(parts));
  const inside = sections.filter(({ from, to }) => kept.has(from) && kept.has(to));

  const open = graphOf(inside, ({ way }) => !way.car.endOnly);
  const core = new Set(largest(stronglyConnectedComponents(open)));
  return {
    sections: inside,
    endOnly: inside.map((s) => s.way.car.endOnly || !core.has(s.from) || !core.has(s.to)),
    droppedParts: Math.max(0, parts.length - 1),
    droppedNodes: whole.order - kept.size,
  };
}

function graphOf(sections: Section[], wanted: (section: Section) => boolean): MultiDirectedGraph {
  const graph = new MultiDirectedGraph();
  for (const section of sections) {
    if (!wanted(section)) continue;
    graph.mergeNode(section.from);
    graph.mergeNode(section.to);
    if (section.way.car.forwardKmh > 0) graph.addDirectedEdge(section.from, section.to);
    if (section.way.car.backwardKmh > 0) graph.addDirectedEdge(section.to, section.from);
  }
  return graph;
}

function largest(parts: string[][]): string[] {
  return parts.reduce((best, part) => (part.length > best.length ? part : best), []);
}
