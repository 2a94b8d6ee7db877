import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { straightLineLeg } from '#shared/travel/straightLineLeg.ts';
import { importArea } from '#tiles/importArea.ts';
import { openArea } from './openArea.ts';

const folder = mkdtempSync(join(tmpdir(), 'furlong-drives-'));
afterAll(() => rmSync(folder, { recursive: true }));

/** Hand-drawn maps: 0.001 degree of latitude is 111.195 m; of longitude, at 60° N, half of that. */
const place = (x: number, y: number) => ({ lat: 60 + y * 0.001, lon: 10 + x * 0.002 });

let maps = 0;
async function mapOf(
  places: Record<string, [x: number, y: number]>,
  ways: [path: string, tags: Record<string, string>][],
  nodeTags: Record<string, Record<string, string>> = {},
) {
  const names = Object.keys(places);
  const tagsXml = (tags: Record<string, string> = {}) =>
    Object.entries(tags)
      .map(([k, v]) => `<tag k="${k}" v="${v}"/>`)
      .join('');
  const nodes = names.map((name, i) => {
    const { lat, lon } = place(...places[name]!);
    return `<node id="${i + 1}" lat="${lat}" lon="${lon}">${tagsXml(nodeTags[name])}</node>`;
  });
  const wayXml = ways.map(([path, tags], i) => {
    const refs = path.split('').map((name) => `<nd ref="${names.indexOf(name) + 1}"/>`);
    const all = { highway: 'residential', maxspeed: '50', ...tags };
    return `<way id="${i + 1}">${refs.join('')}${tagsXml(all)}</way>`;
  });
  const file = join(folder, `map${maps}.osm`);
  const outDir = join(folder, `map${maps++}`);
  writeFileSync(file, `<osm version="0.6">${nodes.join('')}${wayXml.join('')}</osm>`);
  await importArea({ file, name: 'drawn', outDir });
  const area = openArea(outDir);
  return {
    area,
    /** Metres from one named place to another. */
    metres: (path: string) =>
      area.route(place(...places[path[0]!]!), place(...places[path[1]!]!)).metres,
    seconds: (path: string) =>
      area.route(place(...places[path[0]!]!), place(...places[path[1]!]!)).seconds,
  };
}

// One block is 111.195 m; at 40 km/h (0.8 of the posted 50) it takes 10.0 s.
const SQUARE: Record<string, [number, number]> = { a: [0, 0], b: [1, 0], c: [1, 1], d: [0, 1] };

describe('routes on hand-drawn maps', () => {
  it('takes the short way round a block, and the long way against a one-way street', async () => {
    const plain = await mapOf(SQUARE, [['abcda', {}]]);
    expect(plain.metres('ab')).toBe(111);
    expect(plain.seconds('ab')).toBe(10);
    expect(plain.metres('ba')).toBe(111);
    const oneway = await mapOf(SQUARE, [
      ['ab', { oneway: 'yes' }],
      ['bcda', {}],
    ]);
    expect(oneway.metres('ab')).toBe(111);
    expect(oneway.metres('ba')).toBe(334);
    const reversed = await mapOf(SQUARE, [
      ['ab', { oneway: '-1' }],
      ['bcda', {}],
    ]);
    expect(reversed.metres('ab')).toBe(334);
    expect(reversed.metres('ba')).toBe(111);
  });

  it('goes round a roundabout one way only', async () => {
    const { metres } = await mapOf({ ...SQUARE, e: [-1, 0], f: [2, 0] }, [
      ['abcda', { junction: 'roundabout' }],
      ['ea', {}],
      ['bf', {}],
    ]);
    expect(metres('ef')).toBe(334);
    expect(metres('fe')).toBe(556);
  });

  it('reaches a house on a private drive but never cuts through one', async () => {
    const places = { ...SQUARE, h: [0.5, 0.2] as [number, number] };
    const { metres } = await mapOf(places, [
      ['ad', {}],
      ['dcb', {}],
      ['ahb', { access: 'private' }],
    ]);
    // From a to b the drive would be 121 m; the open road is three blocks.
    expect(metres('ab')).toBe(334);
    // To the house itself the drive is used, from either end.
    expect(metres('ah')).toBeLessThan(65);
    expect(metres('hb')).toBeLessThan(65);
    expect(metres('dh')).toBe(111 + metres('ah'));
  });

  it('treats streets that hang on a destination-only road as ends too', async () => {
    const places: Record<string, [number, number]> = {
      ...SQUARE,
      p: [0.5, 1.2],
      q: [0.5, 2],
    };
    const { metres } = await mapOf(places, [
      ['abcda', {}],
      ['dpc', { motor_vehicle: 'destination' }],
      ['pq', {}],
    ]);
    expect(metres('dc')).toBe(111);
    expect(metres('dq')).toBe(metres('dp') + metres('pq'));
    expect(metres('qc')).toBe(metres('qp') + metres('pc'));
  });

  it('is stopped by a bollard but not by a gate that is open', async () => {
    const bollard = await mapOf({ ...SQUARE, m: [0.5, 0] }, [['ambcda', {}]], {
      m: { barrier: 'bollard' },
    });
    expect(bollard.metres('ab')).toBe(334);
    const gate = await mapOf({ ...SQUARE, m: [0.5, 0] }, [['ambcda', {}]], {
      m: { barrier: 'gate' },
    });
    expect(gate.metres('ab')).toBe(111);
  });

  it('prefers the quicker road over the shorter one', async () => {
    const { metres, seconds } = await mapOf(SQUARE, [
      ['ab', { highway: 'living_street', maxspeed: '' }],
      ['adcb', { highway: 'trunk', maxspeed: '100' }],
    ]);
    // 111 m at 10 km/h is 40 s; 334 m at 80 km/h is 15 s.
    expect(metres('ab')).toBe(334);
    expect(seconds('ab')).toBe(15);
  });

  it('waits three seconds where three real roads meet, not at a driveway', async () => {
    const line: Record<string, [number, number]> = { a: [0, 0], b: [1, 0], c: [2, 0], s: [1, 1] };
    const side = await mapOf(line, [
      ['abc', {}],
      ['bs', {}],
    ]);
    expect(side.seconds('ac')).toBe(23);
    const driveway = await mapOf(line, [
      ['abc', {}],
      ['bs', { highway: 'service' }],
    ]);
    expect(driveway.seconds('ac')).toBe(20);
  });

  it('starts and ends between junctions, going the right way along a one-way street', async () => {
    const { area } = await mapOf(SQUARE, [
      ['ab', { oneway: 'yes' }],
      ['bcda', {}],
    ]);
    const near = place(0.25, 0.05);
    const far = place(0.75, 0.05);
    expect(area.route(near, far).metres).toBe(56);
    // Back again means round the block: 28 m to b, three blocks, 28 m from a.
    expect(area.route(far, near).metres).toBe(389);
  });

  it('guesses in a straight line, and says so, where no road is near', async () => {
    const { area } = await mapOf(SQUARE, [['abcda', {}]]);
    const far = place(60, 60);
    const home = place(0, 0);
    expect(area.snap(far.lat, far.lon)).toBeNull();
    expect(area.route(home, far)).toEqual({
      ...straightLineLeg(home, far),
      line: [
        [home.lat, home.lon],
        [far.lat, far.lon],
      ],
    });
    const table = area.table([home, far, place(1, 0)]);
    expect(table.rough).toEqual([false, true, false, true, false, true, false, true, false]);
    expect(table.metres[2]).toBe(111);
  });

  it('is at no distance from itself, and adds a slow farm track off the road', async () => {
    const { area } = await mapOf(SQUARE, [['abcda', {}]]);
    const door = place(0.5, -0.1);
    expect(area.route(door, door)).toMatchObject({ seconds: 0, metres: 0, rough: false });
    // 500 m off the road: 450 m beyond the free 50, at 15 km/h 108 s.
    const farm = { lat: 60 - 500 / 111195.08, lon: 10 };
    const drive = area.route(farm, place(0, 1));
    expect(drive.metres).toBe(561);
    expect(drive.seconds).toBe(118);
  });

  it('draws the line along the road, from snapped start to snapped end', async () => {
    const { area } = await mapOf(SQUARE, [['abcda', {}]]);
    const { line } = area.route(place(0.5, 0), place(1, 0.5));
    const corner = place(1, 0);
    expect(line).toHaveLength(3);
    expect(line[1]![0]).toBeCloseTo(corner.lat, 6);
    expect(line[1]![1]).toBeCloseTo(corner.lon, 6);
    expect(line[0]![1]).toBeCloseTo(place(0.5, 0).lon, 6);
    expect(line[2]![0]).toBeCloseTo(place(1, 0.5).lat, 6);
  });

  it('leaves out roads a van could not come back from', async () => {
    const { area } = await mapOf({ ...SQUARE, x: [3, 0], y: [3, 1] }, [
      ['abcda', {}],
      ['ac', {}],
      ['bx', { oneway: 'yes' }],
      ['xy', {}],
    ]);
    const end = place(3, 1);
    expect(area.snap(end.lat, end.lon)!.lon).toBeLessThan(place(1.01, 0).lon);
  });
});
