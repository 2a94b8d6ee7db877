import { createHash } from 'node:crypto';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import type { OsmElement } from '../osm/osmTypes.ts';
import { readOsm } from '../osm/readOsm.ts';
import { drawTown } from './drawTown.ts';
import { writeTown } from './writeTown.ts';

const folder = mkdtempSync(join(tmpdir(), 'furlong-town-'));
afterAll(() => rmSync(folder, { recursive: true }));

const sha256 = (data: string | Buffer) => createHash('sha256').update(data).digest('hex');

describe('writeTown', { timeout: 60_000 }, () => {
  const draft = drawTown();
  const file = join(folder, 'town.osm.pbf');
  writeTown(file);

  it('writes the same bytes every time', () => {
    const again = join(folder, 'again.osm.pbf');
    writeTown(again);
    expect(sha256(readFileSync(again))).toBe(sha256(readFileSync(file)));
  });

  it('draws the town the demo was made for', () => {
    // A change here changes the demo: raise TOWN_VERSION with it, so that areas are imported again.
    // Elements, not file bytes: zlib may pack differently on another machine.
    const { nodes, ways, relations } = draft;
    expect({
      nodes: nodes.length,
      ways: ways.length,
      relations: relations.length,
      sha256: sha256(JSON.stringify([nodes, ways, relations])).slice(0, 16),
    }).toMatchInlineSnapshot(`
      {
        "nodes": 63113,
        "relations": 1,
        "sha256": "ee93b2049af819b1",
        "ways": 14526,
      }
    `);
  });

  it('reads back as it was drawn', async () => {
    const back: OsmElement[] = [];
    for await (const batch of readOsm(file)) back.push(...batch);
    expect(back).toHaveLength(draft.nodes.length + draft.ways.length + draft.relations.length);
    expect(back.find(({ type, id }) => type === 'way' && id === 40)).toEqual(draft.ways[39]);
    expect(back.find(({ type }) => type === 'relation')).toEqual(draft.relations[0]);
    const door = draft.nodes.find(({ tags }) => tags?.['addr:housenumber'])!;
    const found = back.find(({ type, id }) => type === 'node' && id === door.id)!;
    expect(found.tags).toEqual(door.tags);
    expect((found as typeof door).lat).toBeCloseTo(door.lat, 7);
  });

  it('has about six thousand addresses, each with street, city and postcode', () => {
    const addresses = [...draft.nodes, ...draft.ways].flatMap(({ tags }) =>
      tags?.['addr:housenumber'] ? [tags] : [],
    );
    expect(addresses.length).toBeGreaterThan(5500);
    expect(addresses.length).toBeLessThan(6500);
    for (const tags of addresses) {
      expect(tags['addr:street']).toMatch(/^[A-Z]/);
      expect(tags['addr:city']).toMatch(/^[A-Z]/);
      expect(tags['addr:postcode']).toMatch(/^71\d\d$/);
    }
  });

  it('names its bridges, posts limits everywhere, and never runs out of street names', () => {
    const roads = draft.ways.filter(({ tags }) => tags?.highway && tags.highway !== 'service');
    const bridges = new Set(roads.flatMap(({ tags }) => tags?.['bridge:name'] ?? []));
    expect([...bridges].sort()).toEqual([
      'Harbour Bridge',
      'Packhorse Bridge',
      'Ropewalk Bridge',
      'Weir Bridge',
      'Whimbrel Viaduct',
    ]);
    expect(roads.every(({ tags }) => /^\d+$/.test(tags!.maxspeed!))).toBe(true);
    expect(roads.some(({ tags }) => tags!.name?.startsWith('Street '))).toBe(false);
    expect(roads.filter(({ tags }) => tags!.junction === 'roundabout')).toHaveLength(4);
    expect(roads.some(({ tags }) => tags!.oneway === 'yes')).toBe(true);
  });

  it('leaves no reference dangling', () => {
    const ids = new Set(draft.nodes.map(({ id }) => id));
    expect(draft.ways.every(({ refs }) => refs.every((ref) => ids.has(ref)))).toBe(true);
  });
});
