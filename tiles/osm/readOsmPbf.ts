import { open, type FileHandle } from 'node:fs/promises';
import { inflateSync } from 'node:zlib';
import { parse } from 'osm-pbf-parser-node';
import { PbfReader } from 'pbf';
import { AreaImportError } from '../AreaImportError.ts';
import type { OnBytes, OsmElement } from './osmTypes.ts';

/** The format's own limits (PBF_Format wiki page): a header block stays under 64 kB, a blob under 32 MB. */
const MOST_HEADER_BYTES = 64 * 1024;
const MOST_BLOB_BYTES = 32 * 1024 * 1024;
const KNOWN_FEATURES = new Set(['OsmSchema-V0.6', 'DenseNodes', 'HistoricalInformation']);

/**
 * One blob at a time, so that memory stays bounded. The frames are read here rather than by the
 * parser's stream because its asserts throw inside stream callbacks, where nobody can catch them.
 */
export async function* readOsmPbf(file: string, onBytes?: OnBytes): AsyncGenerator<OsmElement[]> {
  const handle = await open(file);
  try {
    const { size } = await handle.stat();
    let position = 0;
    while (position < size) {
      const headerBytes = (await readExactly(handle, file, position, 4)).readUInt32BE(0);
      position += 4;
      if (headerBytes === 0 || headerBytes > MOST_HEADER_BYTES) throw damaged(file, position);
      const header = readBlobHeader(await readExactly(handle, file, position, headerBytes));
      position += headerBytes;
      if (header.dataBytes > MOST_BLOB_BYTES) throw damaged(file, position);
      const blob = await readExactly(handle, file, position, header.dataBytes);
      position += header.dataBytes;
      onBytes?.(position, size);
      if (header.type === 'OSMHeader')
        checkFeatures(
          file,
          decode(file, position, () => unpack(blob)),
        );
      if (header.type === 'OSMData')
        yield decode(file, position, () => parse(unpack(blob), {}) as OsmElement[]);
    }
  } finally {
    await handle.close();
  }
}

async function readExactly(handle: FileHandle, file: string, at: number, bytes: number) {
  const { buffer, bytesRead } = await handle.read(Buffer.alloc(bytes), 0, bytes, at);
  if (bytesRead < bytes)
    throw new AreaImportError(
      'truncated',
      `${file} ends in the middle of a block (byte ${at + bytesRead}). Download it again.`,
    );
  return buffer;
}

function readBlobHeader(bytes: Buffer) {
  return new PbfReader(bytes).readFields(
    (tag, header, pbf) => {
      if (tag === 1) header.type = pbf.readString();
      else if (tag === 3) header.dataBytes = pbf.readVarint();
    },
    { type: '', dataBytes: 0 },
  );
}

function unpack(bytes: Buffer): Buffer {
  const blob = new PbfReader(bytes).readFields(
    (tag, found: { raw?: Uint8Array; zlib?: Uint8Array }, pbf) => {
      if (tag === 1) found.raw = pbf.readBytes();
      else if (tag === 3) found.zlib = pbf.readBytes();
    },
    {},
  );
  if (blob.raw) return Buffer.from(blob.raw);
  if (blob.zlib) return inflateSync(blob.zlib);
  throw new Error('a block is packed with neither zlib nor nothing');
}

function checkFeatures(file: string, block: Buffer) {
  const features = new PbfReader(block).readFields((tag, found: string[], pbf) => {
    if (tag === 4) found.push(pbf.readString());
  }, []);
  const unknown = features.filter((feature) => !KNOWN_FEATURES.has(feature));
  if (unknown.length > 0)
    throw new AreaImportError('wrong-format', `${file} needs ${unknown.join(', ')}, unknown here.`);
}

function decode<T>(file: string, position: number, read: () => T): T {
  try {
    return read();
  } catch (cause) {
    throw damaged(file, position, cause);
  }
}

function damaged(file: string, position: number, cause?: unknown) {
  return new AreaImportError('wrong-format', `${file} is damaged near byte ${position}.`, {
    cause,
  });
}
