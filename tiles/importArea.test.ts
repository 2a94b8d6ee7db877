import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { afterAll, describe, expect, it } from 'vitest';
import { AreaImportError } from './AreaImportError.ts';
import { CURRENT_FILE } from './AreaMeta.ts';
import { importArea, type ImportProgress } from './importArea.ts';
import type { OsmNode, OsmWay } from './osm/osmTypes.ts';
import { readRoadGraph } from './roads/roadGraphFile.ts';
import { openTiles } from './tileFile.ts';
import { tileNumbers } from './tileNumbers.ts';
import { writeOsmPbf } from './town/writeOsmPbf.ts';

const folder = mkdtempSync(join(tmpdir(), 'furlong-import-'));
afterAll(() => rmSync(folder, { recursive: true }));

const NODES: Omit<OsmNode, 'type'>[] = [
  { id: 1, lat: 41, lon: -36 },
  { id: 2, lat: 41.002, lon: -36 },
  { id: 3, lat: 41.002, lon: -35.997 },
  { id: 4, lat: 41.001, lon: -35.999, tags: { 'addr:housenumber': '7', 'addr:street': 'Tern Street', 'addr:city': 'Skerrow', 'addr:postcode': '7127' } },
]; // prettier-ignore
const WAYS: Omit<OsmWay, 'type'>[] = [
  { id: 10, refs: [1, 2], tags: { highway: 'residential', name: 'Tern Street' } },
  { id: 11, refs: [2, 3], tags: { highway: 'primary', name: 'Strand', oneway: 'no' } },
  { id: 12, refs: [1, 2, 3, 1], tags: { natural: 'water', name: 'The Pool' } },
  { id: 13, refs: [1, 99, 3], tags: { highway: 'footway' } },
];

function xmlOf(nodes: typeof NODES, ways: typeof WAYS): string {
  const tags = (of?: Record<string, string>) =>
    Object.entries(of ?? {})
      .map(([k, v]) => `<tag k="${k}" v="${v}"/>`)
      .join('');
  return `<?xml version="1.0"?><osm version="0.6">${nodes
    .map((n) => `<node id="${n.id}" lat="${n.lat}" lon="${n.lon}">${tags(n.tags)}</node>`)
    .join('')}${ways
    .map(
      (w) =>
        `<way id="${w.id}">${w.refs.map((r) => `<nd ref="${r}"/>`).join('')}${tags(w.tags)}</way>`,
    )
    .join('')}</osm>`;
}

const fileWith = (name: string, content: string | Buffer) => {
  const file = join(folder, name);
  writeFileSync(file, content);
  return file;
};
const pbfFile = () => {
  const file = join(folder, 'tiny.osm.pbf');
  writeOsmPbf(file, {
    nodes: NODES.map((node) => ({ type: 'node', ...node })),
    ways: WAYS.map((way) => ({ type: 'way', ...way })),
    relations: [],
  });
  return file;
};
const codeOf = async (file: string, name = 'broken') => {
  const failure = await importArea({ file, name, outDir: join(folder, 'out', name) }).catch(
    (error: unknown) => error,
  );
  expect(failure).toBeInstanceOf(AreaImportError);
  expect((failure as AreaImportError).message).not.toBe('');
  return (failure as AreaImportError).code;
};

describe('importArea', () => {
  it('makes the same area of XML and of PBF', async () => {
    const fromXml = await importArea({
      file: fileWith('tiny.osm', xmlOf(NODES, WAYS)),
      name: 'tiny-xml',
      outDir: join(folder, 'tiny-xml'),
    });
    const fromPbf = await importArea({
      file: pbfFile(),
      name: 'tiny-pbf',
      outDir: join(folder, 'tiny-pbf'),
    });
    expect(fromXml.counts).toEqual(fromPbf.counts);
    expect(fromXml.counts).toMatchObject({
      nodes: 4,
      ways: 4,
      carWays: 2,
      junctions: 3,
      sections: 2,
      addresses: 1,
      streets: 1,
    });
    expect(fromPbf.attribution).toBe('© OpenStreetMap contributors');
    const roads = ({ name, version }: typeof fromXml) =>
      readRoadGraph(join(folder, name, version, 'roads.bin'));
    expect(roads(fromXml)).toEqual(roads(fromPbf));
    expect(roads(fromPbf).names).toEqual(['Tern Street', 'Strand']);
    // 0.002 degrees of latitude: 222.39 m; at the 25 km/h of a residential street 32.02 s.
    expect(roads(fromPbf).sectionCm[0]).toBe(22239);
    expect(roads(fromPbf).sectionForwardMs[0]).toBe(32024);
  });

  it('cuts tiles for every zoom around the place', async () => {
    const { version } = await importArea({
      file: pbfFile(),
      name: 'tiles',
      outDir: join(folder, 'tiles'),
    });
    const path = (file: string) => join(folder, 'tiles', version, file);
    const tiles = openTiles(path('tiles.bin'), path('tiles.json'));
    for (let z = 8; z <= 14; z++) {
      const { x, y } = tileNumbers(41.001, -35.999, z);
      expect(tiles.read(z, x, y), `zoom ${z}`).not.toBeNull();
    }
    expect(tiles.read(14, 0, 0)).toBeNull();
    tiles.close();
  });

  it('reports progress that never runs back', async () => {
    const seen: ImportProgress[] = [];
    await importArea({
      file: pbfFile(),
      name: 'steps',
      outDir: join(folder, 'steps'),
      onProgress: (progress) => seen.push(progress),
    });
    expect(seen.at(-1)).toEqual({ step: 'done', permille: 1000 });
    expect(seen.map(({ permille }) => permille)).toEqual(
      seen.map(({ permille }) => permille).toSorted((a, b) => a - b),
    );
  });

  it('refuses files it cannot use, saying why', async () => {
    const whole = readFileSync(pbfFile());
    const xml = xmlOf(NODES, WAYS);
    expect(await codeOf(join(folder, 'nowhere.osm.pbf'))).toBe('file-missing');
    expect(await codeOf(fileWith('text.osm.pbf', 'hello'))).toBe('wrong-format');
    expect(await codeOf(fileWith('zip.osm', gzipSync(xml)))).toBe('wrong-format');
    expect(await codeOf(fileWith('page.osm', '<?xml version="1.0"?><html/>'))).toBe('wrong-format');
    expect(await codeOf(fileWith('zero.osm', ''))).toBe('empty');
    expect(await codeOf(fileWith('bare.osm', '<osm version="0.6"></osm>'))).toBe('empty');
    expect(await codeOf(fileWith('cut.osm', xml.slice(0, -40)))).toBe('truncated');
    expect(await codeOf(fileWith('cut.osm.pbf', whole.subarray(0, whole.length - 30)))).toBe(
      'truncated',
    );
    expect(await codeOf(fileWith('footpaths.osm', xmlOf(NODES, WAYS.slice(2))))).toBe('roadless');
    expect(await codeOf(pbfFile(), 'Bad Name')).toBe('bad-name');
  });

  it('notices a flipped byte inside a block', async () => {
    const bytes = Buffer.from(readFileSync(pbfFile()));
    bytes[bytes.length - 12]! ^= 0xff;
    expect(await codeOf(fileWith('flipped.osm.pbf', bytes))).toBe('wrong-format');
  });

  it('leaves the old area in use when a later import fails, and replaces it when one succeeds', async () => {
    const outDir = join(folder, 'kept');
    const current = () => readFileSync(join(outDir, CURRENT_FILE), 'utf8');
    const first = await importArea({ file: pbfFile(), name: 'kept', outDir });
    const cut = fileWith('kept.osm', xmlOf(NODES, WAYS).slice(0, -40));
    await expect(importArea({ file: cut, name: 'kept', outDir })).rejects.toThrow('ends before');
    expect(JSON.parse(current())).toEqual({ version: first.version });
    expect(existsSync(join(outDir, first.version, 'roads.bin'))).toBe(true);

    const second = await importArea({
      file: fileWith('grown.osm', xmlOf(NODES, [...WAYS, { ...WAYS[0]!, id: 20 }])),
      name: 'kept',
      outDir,
    });
    expect(second.version).not.toBe(first.version);
    expect(JSON.parse(current())).toEqual({ version: second.version });
    expect(readdirSync(outDir).sort()).toEqual([second.version, CURRENT_FILE].sort());
  });
});
