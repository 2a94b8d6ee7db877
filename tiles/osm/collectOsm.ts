import { carWay } from '../roads/carWay.ts';
import type { CarProfile } from '../roads/carProfile.ts';
import type { RoadWay } from '../roads/cutSections.ts';
import { NodeStore } from './NodeStore.ts';
import type { OnBytes, OsmElement, OsmNode, OsmRelation, OsmTags, OsmWay } from './osmTypes.ts';
import { readOsm } from './readOsm.ts';

/** An extract in memory, sorted by what the import makes of it. */
export interface CollectedOsm {
  nodes: NodeStore;
  /** Nodes with tags: house numbers, places, shops. */
  taggedNodes: OsmNode[];
  /** All ways by id: multipolygons are made of ways that say nothing themselves. */
  ways: Map<number, OsmWay>;
  multipolygons: OsmRelation[];
  roads: RoadWay[];
  /** Nodes a car cannot pass. */
  blockedNodes: Set<number>;
  relationCount: number;
}

const BLOCKING_BARRIERS = new Set([
  'block',
  'bollard',
  'chain',
  'cycle_barrier',
  'debris',
  'fence',
  'jersey_barrier',
  'log',
  'motorcycle_barrier',
  'stile',
  'turnstile',
  'wall',
]);

/** Reads the whole file once. Throws AreaImportError as `readOsm` does. */
export async function collectOsm(
  file: string,
  profile: CarProfile,
  onBytes?: OnBytes,
): Promise<CollectedOsm> {
  const found: CollectedOsm = {
    nodes: new NodeStore(),
    taggedNodes: [],
    ways: new Map(),
    multipolygons: [],
    roads: [],
    blockedNodes: new Set(),
    relationCount: 0,
  };
  for await (const batch of readOsm(file, onBytes)) {
    for (const element of batch) take(found, element, profile);
  }
  return found;
}

function take(found: CollectedOsm, element: OsmElement, profile: CarProfile) {
  if (element.type === 'node') {
    found.nodes.add(element.id, element.lat, element.lon);
    if (!element.tags) return;
    found.taggedNodes.push(element);
    if (blocksCars(element.tags)) found.blockedNodes.add(element.id);
  } else if (element.type === 'way') {
    found.ways.set(element.id, element);
    const car = element.tags && element.refs.length > 1 ? carWay(element.tags, profile) : null;
    if (car) found.roads.push({ refs: element.refs, name: element.tags?.name, car });
  } else {
    found.relationCount += 1;
    if (element.tags?.type === 'multipolygon') found.multipolygons.push(element);
  }
}

function blocksCars(tags: OsmTags): boolean {
  if (!tags.barrier) return false;
  const access = tags.motorcar ?? tags.motor_vehicle ?? tags.vehicle ?? tags.access;
  if (access !== undefined) return access === 'no';
  return BLOCKING_BARRIERS.has(tags.barrier);
}
