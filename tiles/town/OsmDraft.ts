import type { OsmNode, OsmRelation, OsmTags, OsmWay } from '../osm/osmTypes.ts';
import type { Line, Point } from './plane.ts';

/** Mid-Atlantic, far from any land, so that the town lies over no real place. */
export const TOWN_ORIGIN = { lat: 41, lon: -36 } as const;

const METRES_PER_DEGREE = 111195.08;
const LON_METRES = METRES_PER_DEGREE * Math.cos((TOWN_ORIGIN.lat * Math.PI) / 180);

/** Degrees of a place on the drawing board, to the centimetre. */
export function toDegrees([x, y]: Point): { lat: number; lon: number } {
  const round = (degrees: number) => Math.round(degrees * 1e7) / 1e7;
  return {
    lat: round(TOWN_ORIGIN.lat + y / METRES_PER_DEGREE),
    lon: round(TOWN_ORIGIN.lon + x / LON_METRES),
  };
}

/** Collects the town as OpenStreetMap elements with ids from 1 on. */
export class OsmDraft {
  readonly nodes: OsmNode[] = [];
  readonly ways: OsmWay[] = [];
  readonly relations: OsmRelation[] = [];
  readonly #spots = new Map<number, number>();

  node(at: Point, tags?: OsmTags): number {
    const id = this.nodes.length + 1;
    this.nodes.push({ type: 'node', id, ...toDegrees(at), ...(tags && { tags }) });
    return id;
  }

  /** The node of a spot that several roads share. */
  spot(id: number, at: Point): number {
    let node = this.#spots.get(id);
    if (node === undefined) {
      node = this.node(at);
      this.#spots.set(id, node);
    }
    return node;
  }

  way(refs: number[], tags?: OsmTags): number {
    const id = this.ways.length + 1;
    this.ways.push({ type: 'way', id, refs, ...(tags && { tags }) });
    return id;
  }

  ring(line: Line, tags?: OsmTags): number {
    const refs = line.map((at) => this.node(at));
    return this.way([...refs, refs[0]!], tags);
  }

  multipolygon(outer: Line, inners: readonly Line[], tags: OsmTags): void {
    const member = (role: string) => (line: Line) =>
      ({ type: 'way', ref: this.ring(line), role }) as const;
    const members = [member('outer')(outer), ...inners.map(member('inner'))];
    const id = this.relations.length + 1;
    this.relations.push({ type: 'relation', id, members, tags: { type: 'multipolygon', ...tags } });
  }
}
