import { createReadStream } from 'node:fs';
import { stat } from 'node:fs/promises';
import { SaxesParser } from 'saxes';
import { AreaImportError } from '../AreaImportError.ts';
import type { OnBytes, OsmElement, OsmMember } from './osmTypes.ts';

/** OSM XML (https://wiki.openstreetmap.org/wiki/OSM_XML), one batch per chunk read. */
export async function* readOsmXml(file: string, onBytes?: OnBytes): AsyncGenerator<OsmElement[]> {
  const { size } = await stat(file);
  const parser = new SaxesParser();
  let batch: OsmElement[] = [];
  let open: OsmElement | undefined;
  let sawOsm = false;

  parser.on('opentag', ({ name, attributes }) => {
    if (name === 'osm') sawOsm = true;
    else if (name === 'node' || name === 'way' || name === 'relation')
      open = startElement(name, attributes);
    else if (open) addChild(open, name, attributes);
  });
  parser.on('closetag', ({ name }) => {
    if (!open || name !== open.type) return;
    batch.push(open);
    open = undefined;
  });
  parser.on('error', (cause) => {
    throw new AreaImportError('wrong-format', `${file} is not sound XML: ${cause.message}`, {
      cause,
    });
  });

  let readBytes = 0;
  for await (const chunk of createReadStream(file, { encoding: 'utf8' })) {
    parser.write(chunk as string);
    readBytes += Buffer.byteLength(chunk as string);
    onBytes?.(readBytes, size);
    yield batch;
    batch = [];
  }
  try {
    parser.close();
  } catch (cause) {
    throw new AreaImportError('truncated', `${file} ends before its XML does. Download it again.`, {
      cause,
    });
  }
  if (!sawOsm)
    throw new AreaImportError('wrong-format', `${file} is XML, but not OpenStreetMap's.`);
}

type Attributes = Record<string, string>;

function startElement(type: 'node' | 'way' | 'relation', attributes: Attributes): OsmElement {
  const id = Number(attributes.id);
  if (type === 'node')
    return { type, id, lat: Number(attributes.lat), lon: Number(attributes.lon) };
  return type === 'way' ? { type, id, refs: [] } : { type, id, members: [] };
}

function addChild(open: OsmElement, name: string, attributes: Attributes) {
  if (name === 'tag' && attributes.k !== undefined && attributes.v !== undefined)
    (open.tags ??= {})[attributes.k] = attributes.v;
  else if (name === 'nd' && open.type === 'way') open.refs.push(Number(attributes.ref));
  else if (name === 'member' && open.type === 'relation')
    open.members.push({
      type: attributes.type as OsmMember['type'],
      ref: Number(attributes.ref),
      role: attributes.role ?? '',
    });
}
