/** OpenStreetMap's three elements as both readers hand them out. Degrees are WGS84. */
export type OsmTags = Record<string, string>;

export interface OsmNode {
  type: 'node';
  id: number;
  lat: number;
  lon: number;
  tags?: OsmTags;
}

export interface OsmWay {
  type: 'way';
  id: number;
  refs: number[];
  tags?: OsmTags;
}

export interface OsmMember {
  type: 'node' | 'way' | 'relation';
  ref: number;
  role: string;
}

export interface OsmRelation {
  type: 'relation';
  id: number;
  members: OsmMember[];
  tags?: OsmTags;
}

export type OsmElement = OsmNode | OsmWay | OsmRelation;

/** Bytes of the file taken in so far. */
export type OnBytes = (readBytes: number, totalBytes: number) => void;
