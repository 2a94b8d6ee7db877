import { closeSync, fsyncSync, openSync, writeSync } from 'node:fs';
import { deflateSync } from 'node:zlib';
import { PbfWriter } from 'pbf';
import type { OsmNode, OsmRelation, OsmTags, OsmWay } from '../osm/osmTypes.ts';

/** Elements per block; the format's readers expect about 8,000. */
const BLOCK = 8000;
const MEMBER_TYPE = { node: 0, way: 1, relation: 2 } as const;

/**
 * Writes an `.osm.pbf` (https://wiki.openstreetmap.org/wiki/PBF_Format): dense nodes, ways, relations,
 * zlib blocks, no metadata. Each list must be sorted by id. No maintained npm package writes PBF.
 */
export function writeOsmPbf(
  file: string,
  elements: {
    nodes: readonly OsmNode[];
    ways: readonly OsmWay[];
    relations: readonly OsmRelation[];
  },
): void {
  const fd = openSync(file, 'w');
  const write = (type: string, content: Uint8Array) => writeSync(fd, blob(type, content));
  try {
    write('OSMHeader', header());
    for (const part of parts(elements.nodes)) write('OSMData', block(part, nodeGroup));
    for (const part of parts(elements.ways)) write('OSMData', block(part, wayGroup));
    for (const part of parts(elements.relations)) write('OSMData', block(part, relationGroup));
    fsyncSync(fd);
  } finally {
    closeSync(fd);
  }
}

function* parts<T>(list: readonly T[]): Generator<readonly T[]> {
  for (let i = 0; i < list.length; i += BLOCK) yield list.slice(i, i + BLOCK);
}

function blob(type: string, content: Uint8Array): Buffer {
  const body = new PbfWriter();
  body.writeVarintField(2, content.length);
  body.writeBytesField(3, deflateSync(content));
  const data = body.finish();
  const head = new PbfWriter();
  head.writeStringField(1, type);
  head.writeVarintField(3, data.length);
  const headBytes = head.finish();
  const length = Buffer.alloc(4);
  length.writeUInt32BE(headBytes.length);
  return Buffer.concat([length, headBytes, data]);
}

function header(): Uint8Array {
  const pbf = new PbfWriter();
  pbf.writeStringField(4, 'OsmSchema-V0.6');
  pbf.writeStringField(4, 'DenseNodes');
  pbf.writeStringField(16, 'furlong');
  return pbf.finish();
}

type IdOf = (text: string) => number;

/** A PrimitiveBlock: its strings first, so the group is written before it is wrapped. */
function block<T>(part: readonly T[], group: (part: readonly T[], idOf: IdOf) => Uint8Array) {
  const ids = new Map<string, number>([['', 0]]);
  const content = group(part, (text) => {
    const id = ids.get(text) ?? ids.size;
    ids.set(text, id);
    return id;
  });
  const pbf = new PbfWriter();
  pbf.writeMessage(
    1,
    (strings: string[], table) => {
      for (const text of strings) table.writeBytesField(1, Buffer.from(text));
    },
    [...ids.keys()],
  );
  pbf.writeBytesField(2, content);
  return pbf.finish();
}

function nodeGroup(nodes: readonly OsmNode[], idOf: IdOf): Uint8Array {
  const degrees = (value: number) => Math.round(value * 1e7);
  const pbf = new PbfWriter();
  pbf.writeMessage(
    2,
    (_: null, dense) => {
      dense.writePackedSVarint(
        1,
        deltas(nodes, ({ id }) => id),
      );
      dense.writePackedSVarint(
        8,
        deltas(nodes, ({ lat }) => degrees(lat)),
      );
      dense.writePackedSVarint(
        9,
        deltas(nodes, ({ lon }) => degrees(lon)),
      );
      dense.writePackedVarint(
        10,
        nodes.flatMap(({ tags = {} }) => [
          ...Object.entries(tags).flatMap(([k, v]) => [idOf(k), idOf(v)]),
          0,
        ]),
      );
    },
    null,
  );
  return pbf.finish();
}

function wayGroup(ways: readonly OsmWay[], idOf: IdOf): Uint8Array {
  const pbf = new PbfWriter();
  for (const way of ways) {
    pbf.writeMessage(
      3,
      ({ id, refs, tags }: OsmWay, out) => {
        writeHead(out, id, tags, idOf);
        out.writePackedSVarint(
          8,
          deltas(refs, (ref) => ref),
        );
      },
      way,
    );
  }
  return pbf.finish();
}

function relationGroup(relations: readonly OsmRelation[], idOf: IdOf): Uint8Array {
  const pbf = new PbfWriter();
  for (const relation of relations) {
    pbf.writeMessage(
      4,
      ({ id, members, tags }: OsmRelation, out) => {
        writeHead(out, id, tags, idOf);
        out.writePackedVarint(8, members.map(({ role }) => idOf(role))); // prettier-ignore
        out.writePackedSVarint(
          9,
          deltas(members, ({ ref }) => ref),
        );
        out.writePackedVarint(10, members.map(({ type }) => MEMBER_TYPE[type])); // prettier-ignore
      },
      relation,
    );
  }
  return pbf.finish();
}

function writeHead(out: PbfWriter, id: number, tags: OsmTags = {}, idOf: IdOf) {
  out.writeVarintField(1, id);
  out.writePackedVarint(2, Object.keys(tags).map(idOf));
  out.writePackedVarint(3, Object.values(tags).map(idOf));
}

function deltas<T>(list: readonly T[], valueOf: (item: T) => number): number[] {
  let last = 0;
  return list.map((item) => {
    const value = valueOf(item);
    const step = value - last;
    last = value;
    return step;
  });
}
