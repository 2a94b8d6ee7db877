import { open } from 'node:fs/promises';
import { AreaImportError } from '../AreaImportError.ts';
import type { OnBytes, OsmElement } from './osmTypes.ts';
import { readOsmPbf } from './readOsmPbf.ts';
import { readOsmXml } from './readOsmXml.ts';

/**
 * Elements of an OpenStreetMap extract in file order, in batches. The format is told by the first
 * bytes, not by the name: PBF (https://wiki.openstreetmap.org/wiki/PBF_Format) or OSM XML.
 * Throws AreaImportError for anything else and for files that end too early.
 */
export async function* readOsm(file: string, onBytes?: OnBytes): AsyncGenerator<OsmElement[]> {
  const format = await formatOf(file);
  yield* format === 'pbf' ? readOsmPbf(file, onBytes) : readOsmXml(file, onBytes);
}

async function formatOf(file: string): Promise<'pbf' | 'xml'> {
  const head = await firstBytes(file);
  if (head.length === 0) throw new AreaImportError('empty', `${file} is empty.`);
  if (head[0] === 0 && head.includes('OSMHeader')) return 'pbf';
  const text = head
    .toString('utf8')
    .replace(/^\uFEFF/, '')
    .trimStart();
  if (text.startsWith('<?xml') || text.startsWith('<osm')) return 'xml';
  const packed = (head[0] === 0x1f && head[1] === 0x8b) || text.startsWith('BZh');
  throw new AreaImportError(
    'wrong-format',
    packed
      ? `${file} is compressed. Unpack it first; .osm.pbf or .osm is right.`
      : `${file} is neither .osm.pbf nor .osm (OpenStreetMap XML).`,
  );
}

async function firstBytes(file: string): Promise<Buffer> {
  try {
    const handle = await open(file);
    try {
      const { buffer, bytesRead } = await handle.read(Buffer.alloc(256), 0, 256, 0);
      return buffer.subarray(0, bytesRead);
    } finally {
      await handle.close();
    }
  } catch (cause) {
    throw new AreaImportError('file-missing', `${file} cannot be read.`, { cause });
  }
}
