import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, expect, it } from 'vitest';
import { importArea } from '#tiles/importArea.ts';
import { tileNumbers } from '#tiles/tileNumbers.ts';
import { openArea } from './openArea.ts';

/** A real OpenStreetMap extract (ODbL), kept outside the project. */
const EXTRACT = fileURLToPath(
  new URL('../../../shared/data/area/liechtenstein-2022.osm.pbf', import.meta.url),
);

const folder = mkdtempSync(join(tmpdir(), 'furlong-real-'));
afterAll(() => rmSync(folder, { recursive: true }));

it('imports a real extract through the same door', { timeout: 180_000 }, async () => {
  if (!existsSync(EXTRACT)) {
    // oxlint-disable-next-line no-console -- said aloud, so that a green run does not hide it
    console.warn(`skipped: ${EXTRACT} is not there, the real extract was not imported`);
    expect(existsSync(EXTRACT)).toBe(false);
    return;
  }
  const meta = await importArea({ file: EXTRACT, name: 'liechtenstein', outDir: folder });
  // Counts of the file as five independent readers agree on them.
  expect(meta.counts).toMatchObject({ nodes: 308_720, ways: 32_731, relations: 891 });
  expect(meta.counts.addresses).toBeGreaterThan(12_000);
  expect(meta.counts.brokenShapes).toBe(0);

  const area = openArea(folder);
  const [townHall] = area.findAddresses('städtle 6 vaduz');
  expect(townHall).toMatchObject({ city: 'Vaduz', exact: true });
  // Vaduz to Balzers: 9 to 10 km of main road through Triesen (from memory; straight line 8.3 km).
  const drive = area.route({ lat: 47.1412, lon: 9.5215 }, { lat: 47.0679, lon: 9.5024 });
  expect(drive.rough).toBe(false);
  expect(drive.metres).toBeGreaterThan(8_500);
  expect(drive.metres).toBeLessThan(10_500);
  expect(drive.seconds / 60).toBeGreaterThan(9);
  expect(drive.seconds / 60).toBeLessThan(18);
  const { x, y } = tileNumbers(47.1412, 9.5215, 14);
  expect(area.tile(14, x, y)!.data.length).toBeGreaterThan(10_000);
  area.close();
});
