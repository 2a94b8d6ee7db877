import { closeSync, fstatSync, openSync, readSync } from 'node:fs';
import { ROAD_ARRAYS, type RoadGraph } from './RoadGraph.ts';

const MAGIC = 'FURLROAD';
const align = (bytes: number) => (bytes + 7) & ~7;

type SharedView = new (buffer: SharedArrayBuffer, at: number, length: number) => unknown;

interface Header {
  nodeCount: number;
  stateCount: number;
  sectionCount: number;
  junctionMs: number;
  names: string[];
  lengths: number[];
}

/** Magic, header length, JSON header, then each array at a multiple of eight bytes. */
export function encodeRoadGraph(graph: RoadGraph): Buffer {
  const { nodeCount, stateCount, sectionCount, junctionMs, names } = graph;
  const lengths = ROAD_ARRAYS.map(([field]) => graph[field].length);
  const header: Header = { nodeCount, stateCount, sectionCount, junctionMs, names, lengths };
  const json = Buffer.from(JSON.stringify(header));
  const start = align(12 + json.length);
  const total = ROAD_ARRAYS.reduce((sum, [field]) => sum + align(graph[field].byteLength), start);
  const out = Buffer.alloc(total);
  out.write(MAGIC, 0, 'latin1');
  out.writeUInt32LE(json.length, 8);
  json.copy(out, 12);
  let at = start;
  for (const [field] of ROAD_ARRAYS) {
    const array = graph[field];
    out.set(new Uint8Array(array.buffer, array.byteOffset, array.byteLength), at);
    at += align(array.byteLength);
  }
  return out;
}

/** Reads the file into shared memory, so that worker threads can search the same arrays. */
export function readRoadGraph(file: string): RoadGraph {
  const fd = openSync(file, 'r');
  try {
    const shared = new SharedArrayBuffer(fstatSync(fd).size);
    const bytes = new Uint8Array(shared);
    let read = 0;
    while (read < bytes.length) {
      const count = readSync(fd, bytes, read, bytes.length - read, read);
      if (count === 0) break;
      read += count;
    }
    return decodeRoadGraph(shared, file);
  } finally {
    closeSync(fd);
  }
}

function decodeRoadGraph(shared: SharedArrayBuffer, file: string): RoadGraph {
  // Copies: text decoding refuses shared memory.
  const copy = (from: number, to: number) =>
    Buffer.from(Uint8Array.from(new Uint8Array(shared).subarray(from, to)));
  if (copy(0, 8).toString('latin1') !== MAGIC) throw new Error(`${file} is not a road graph.`);
  const headerBytes = copy(8, 12).readUInt32LE(0);
  const json = copy(12, 12 + headerBytes).toString('utf8');
  const { lengths, ...counts } = JSON.parse(json) as Header;
  let at = align(12 + headerBytes);
  const arrays: Record<string, unknown> = {};
  ROAD_ARRAYS.forEach(([field, ArrayType], i) => {
    const View: SharedView = ArrayType;
    arrays[field] = new View(shared, at, lengths[i]!);
    at += align(lengths[i]! * ArrayType.BYTES_PER_ELEMENT);
  });
  return { ...counts, ...arrays } as unknown as RoadGraph;
}
