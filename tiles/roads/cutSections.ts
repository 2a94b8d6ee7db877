import { distanceMetres } from '#shared/travel/distanceMetres.ts';
import { E7, type NodeStore } from '../osm/NodeStore.ts';
import type { CarWay } from './carWay.ts';

/** A way a car may use, as the import collected it. */
export interface RoadWay {
  refs: number[];
  name: string | undefined;
  car: CarWay;
}

/** The road between two junctions or ends. */
export interface Section {
  /** Keys of the end nodes: an OSM id, made unique where a barrier parts the road. */
  from: string;
  to: string;
  way: RoadWay;
  cm: number;
  latE7: number[];
  lonE7: number[];
}

/**
 * Cuts ways at every node that two ways share, at their ends, at barriers no car passes (both sides
 * become dead ends), and where the extract's border took nodes away.
 */
export function cutSections(
  ways: RoadWay[],
  nodes: NodeStore,
  blockedNodes: ReadonlySet<number>,
): Section[] {
  const uses = countUses(ways);
  const sections: Section[] = [];
  let deadEnds = 0;
  for (const way of ways) {
    let current: Section | undefined;
    for (const ref of way.refs) {
      const index = nodes.indexOf(ref);
      if (index < 0) {
        finish(current, sections, `cut${deadEnds++}`);
        current = undefined;
        continue;
      }
      const latE7 = nodes.latE7(index);
      const lonE7 = nodes.lonE7(index);
      const blocked = blockedNodes.has(ref);
      const key = blocked ? `${ref}#${deadEnds++}` : String(ref);
      if (current) extend(current, latE7, lonE7);
      if (!current) current = begin(way, key, latE7, lonE7);
      else if (blocked || uses.get(ref)! > 1) {
        finish(current, sections, key);
        current = begin(way, blocked ? `${ref}#${deadEnds++}` : key, latE7, lonE7);
      }
    }
    finish(current, sections, `cut${deadEnds++}`);
  }
  return sections;
}

function countUses(ways: RoadWay[]): Map<number, number> {
  const uses = new Map<number, number>();
  const count = (ref: number, by: number) => uses.set(ref, (uses.get(ref) ?? 0) + by);
  for (const { refs } of ways) {
    refs.forEach((ref, i) => count(ref, i === 0 || i === refs.length - 1 ? 2 : 1));
  }
  return uses;
}

function begin(way: RoadWay, from: string, latE7: number, lonE7: number): Section {
  return { from, to: from, way, cm: 0, latE7: [latE7], lonE7: [lonE7] };
}

function extend(section: Section, latE7: number, lonE7: number) {
  const last = section.latE7.length - 1;
  const here = { lat: latE7 / E7, lon: lonE7 / E7 };
  const there = { lat: section.latE7[last]! / E7, lon: section.lonE7[last]! / E7 };
  section.cm += distanceMetres(there, here) * 100;
  section.latE7.push(latE7);
  section.lonE7.push(lonE7);
}

function finish(section: Section | undefined, sections: Section[], to: string) {
  if (!section || section.latE7.length < 2) return;
  section.to = to;
  section.cm = Math.max(1, Math.round(section.cm));
  sections.push(section);
}
