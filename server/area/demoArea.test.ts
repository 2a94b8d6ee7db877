import { mkdtempSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gunzipSync } from 'node:zlib';
import express from 'express';
import { MultiDirectedGraph } from 'graphology';
import { dijkstra } from 'graphology-shortest-path';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { distanceMetres } from '#shared/travel/distanceMetres.ts';
import { END_ONLY, type RoadGraph, WAIT_AT_FROM, WAIT_AT_TO } from '#tiles/roads/RoadGraph.ts';
import { readRoadGraph } from '#tiles/roads/roadGraphFile.ts';
import { tileNumbers } from '#tiles/tileNumbers.ts';
import { seededRandom } from '#tiles/town/seededRandom.ts';
import type { Area, Snap } from './Area.ts';
import { importDemoArea } from './importDemoArea.ts';
import { areaFor, listAreas } from './openAreas.ts';
import { tileRouter } from './tileRouter.ts';

const data = mkdtempSync(join(tmpdir(), 'furlong-demo-'));
let area: Area;
beforeAll(async () => {
  await importDemoArea(data);
  area = areaFor('pellan-bay', data)!;
}, 120_000);
afterAll(() => rmSync(data, { recursive: true }));

describe('importDemoArea', () => {
  it('does nothing when the same town is there already', async () => {
    const pointer = join(data, 'areas', 'pellan-bay', 'current.json');
    const before = statSync(pointer).mtimeMs;
    const steps: string[] = [];
    const meta = await importDemoArea(data, ({ step }) => steps.push(step));
    expect(steps).toEqual([]);
    expect(meta.version).toBe(area.version);
    expect(statSync(pointer).mtimeMs).toBe(before);
    expect(areaFor('pellan-bay', data)).toBe(area);
  });

  it('says that the town is invented, and is listed', () => {
    expect(area.attribution).toContain('invented');
    expect(listAreas(data).map(({ name }) => name)).toEqual(['pellan-bay']);
    expect(areaFor('nowhere', data)).toBeNull();
    expect(areaFor('../secrets', data)).toBeNull();
  });
});

describe('drives in Pellan Bay', () => {
  it('equal Dijkstra in graphology on 200 random pairs', () => {
    const graph = readRoadGraph(join(data, 'areas', 'pellan-bay', area.version, 'roads.bin'));
    const oracle = naiveGraph(graph);
    const random = seededRandom(200);
    const doors = doorsOf(area, random, 400);
    for (let i = 0; i < 200; i++) {
      const from = doors[2 * i]!;
      const to = doors[2 * i + 1]!;
      const [start, end] = [from, to].map(({ lat, lon }) => area.snap(lat, lon)!);
      const seconds = naiveMs(oracle, graph, start!, end!) / 1000;
      const track = (Math.max(0, start!.metres - 50) + Math.max(0, end!.metres - 50)) / (15 / 3.6);
      expect(area.route(from, to).seconds, `pair ${i}`).toBe(Math.round(seconds + track));
    }
  }, 120_000);

  it('has tables that equal single routes exactly, and lines as long as they say', () => {
    const doors = doorsOf(area, seededRandom(12), 12);
    const table = area.table(doors);
    expect(table.rough.some(Boolean)).toBe(false);
    doors.forEach((from, i) =>
      doors.forEach((to, j) => {
        const route = area.route(from, to);
        expect(table.seconds[i * doors.length + j]).toBe(route.seconds);
        expect(table.metres[i * doors.length + j]).toBe(route.metres);
        if (i === j) return;
        let drawn = 0;
        for (let k = 1; k < route.line.length; k++) {
          const [a, b] = [route.line[k - 1]!, route.line[k]!];
          drawn += distanceMetres({ lat: a[0], lon: a[1] }, { lat: b[0], lon: b[1] });
        }
        expect(Math.abs(drawn - route.metres)).toBeLessThan(3 + route.metres * 0.001);
      }),
    );
  });

  it('answers in whole numbers a town would believe', () => {
    const { seconds, metres } = area.table(doorsOf(area, seededRandom(3), 40));
    const speeds = seconds.flatMap((s, i) => (s > 0 ? [(metres[i]! / s) * 3.6] : []));
    expect([...seconds, ...metres].every(Number.isInteger)).toBe(true);
    const mean = speeds.reduce((sum, v) => sum + v, 0) / speeds.length;
    // Town driving at 25–45 km/h on average is common practice in planning.
    expect(mean).toBeGreaterThan(25);
    expect(mean).toBeLessThan(45);
  });
});

describe('addresses of Pellan Bay', () => {
  it('find themselves by label, and lie next to their own street', () => {
    const random = seededRandom(5);
    for (let i = 0; i < 60; i++) {
      const door = area.addressAt(Math.floor(random.next() * area.addressCount));
      const [first] = area.findAddresses(door.label);
      expect(first).toEqual({ ...door, exact: true });
      expect(area.nearestAddress(door.lat, door.lon)).toMatchObject({ metres: 0 });
      expect(area.snap(door.lat, door.lon)!.metres).toBeLessThan(40);
    }
  });
});

describe('tileRouter', () => {
  const app = express().use(tileRouter((name) => areaFor(name, data)));
  const address = (z: number, version = area.version, name = 'pellan-bay') => {
    const { x, y } = tileNumbers(41.004, -36, z);
    return `/tiles/${name}/${version}/${z}/${x}/${y}.mvt`;
  };

  it('answers whole, gzipped, for ever', async () => {
    const answer = await request(app).get(address(14)).buffer(true);
    expect(answer.status).toBe(200);
    expect(answer.headers['content-encoding']).toBe('gzip');
    expect(answer.headers['cache-control']).toBe('public, max-age=31536000, immutable');
    expect(answer.headers['content-type']).toBe('application/vnd.mapbox-vector-tile');
    const again = await request(app).get(address(14)).set('If-None-Match', answer.headers.etag!);
    expect(again.status).toBe(304);
  });

  it('unpacks for whoever cannot', async () => {
    const answer = await request(app)
      .get(address(12))
      .set('Accept-Encoding', 'identity')
      .responseType('blob');
    expect(answer.headers['content-encoding']).toBeUndefined();
    const { x, y } = tileNumbers(41.004, -36, 12);
    expect(answer.body).toEqual(gunzipSync(area.tile(12, x, y)!.data));
  });

  it('tells blank map from unknown map', async () => {
    const status = async (path: string) => (await request(app).get(path)).status;
    expect(await status(`/tiles/pellan-bay/${area.version}/14/1/1.mvt`)).toBe(204);
    expect(await status(address(14, 'ffffffffffff'))).toBe(404);
    expect(await status(address(14, area.version, 'nowhere'))).toBe(404);
    expect(await status(`/tiles/pellan-bay/${area.version}/14/1/x.mvt`)).toBe(404);
    expect(await status(`/tiles/..%2f..%2f/${area.version}/14/1/1.mvt`)).toBe(404);
  });
});

function doorsOf(of: Area, random: ReturnType<typeof seededRandom>, count: number) {
  return Array.from({ length: count }, () =>
    of.addressAt(Math.floor(random.next() * of.addressCount)),
  );
}

/**
 * The same rules said another way: three copies of every node (still on end-only roads, on open road,
 * on end-only roads again) joined by free steps, straight from the sections and not from our arcs.
 */
function naiveGraph(graph: RoadGraph): MultiDirectedGraph {
  const oracle = new MultiDirectedGraph();
  for (let node = 0; node < graph.nodeCount; node++) {
    for (const phase of ['out', 'open', 'in']) oracle.addNode(`${phase}${node}`);
    oracle.addDirectedEdge(`out${node}`, `open${node}`, { ms: 0 });
    oracle.addDirectedEdge(`open${node}`, `in${node}`, { ms: 0 });
  }
  for (let section = 0; section < graph.sectionCount; section++) {
    const phases = graph.sectionFlags[section]! & END_ONLY ? ['out', 'in'] : ['open'];
    for (const { from, to, ms } of directionsOf(graph, section))
      for (const phase of phases)
        oracle.addDirectedEdge(`${phase}${from}`, `${phase}${to}`, { ms });
  }
  return oracle;
}

function directionsOf(graph: RoadGraph, section: number) {
  const [a, b] = [graph.sectionFrom[section]!, graph.sectionTo[section]!];
  const wait = (bit: number) => (graph.sectionFlags[section]! & bit ? graph.junctionMs : 0);
  const [forward, backward] = [graph.sectionForwardMs[section]!, graph.sectionBackwardMs[section]!];
  return [
    ...(forward ? [{ from: a, to: b, own: forward, ms: forward + wait(WAIT_AT_TO) }] : []),
    ...(backward ? [{ from: b, to: a, own: backward, ms: backward + wait(WAIT_AT_FROM) }] : []),
  ];
}

function naiveMs(oracle: MultiDirectedGraph, graph: RoadGraph, start: Snap, end: Snap): number {
  oracle.addNode('start');
  oracle.addNode('end');
  const phasesOf = (snap: Snap) =>
    graph.sectionFlags[snap.section]! & END_ONLY ? ['out', 'in'] : ['open'];
  for (const { from, to, own, ms } of directionsOf(graph, start.section)) {
    const forward = from === graph.sectionFrom[start.section];
    const rest = Math.round(own * (forward ? 1 - start.share : start.share));
    oracle.addDirectedEdge('start', `${phasesOf(start)[0]}${to}`, { ms: rest + ms - own });
  }
  for (const { from, own } of directionsOf(graph, end.section)) {
    const forward = from === graph.sectionFrom[end.section];
    const part = Math.round(own * (forward ? end.share : 1 - end.share));
    for (const phase of phasesOf(end))
      oracle.addDirectedEdge(`${phase}${from}`, 'end', { ms: part });
  }
  if (start.section === end.section) {
    const part = end.share - start.share;
    const own = part >= 0 ? graph.sectionForwardMs : graph.sectionBackwardMs;
    if (own[start.section]! > 0)
      oracle.addDirectedEdge('start', 'end', {
        ms: Math.round(Math.abs(part) * own[start.section]!),
      });
  }
  const path = dijkstra.bidirectional(oracle, 'start', 'end', 'ms');
  let ms = 0;
  for (let i = 1; i < path.length; i++) {
    const between = oracle.outEdges(path[i - 1]!, path[i]!);
    ms += Math.min(...between.map((edge) => oracle.getEdgeAttribute(edge, 'ms') as number));
  }
  oracle.dropNode('start');
  oracle.dropNode('end');
  return ms;
}
