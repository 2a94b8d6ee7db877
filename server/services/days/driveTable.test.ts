import { afterEach, expect, it, vi } from 'vitest';
import { driveTable } from './driveTable.ts';

const area = vi.hoisted(() => ({ name: 'town', version: 'v1', table: vi.fn() }));
vi.mock('#server/area/openAreas.ts', () => ({ areaFor: () => area }));

area.table.mockImplementation((points: unknown[]) => {
  const legs = points.length ** 2;
  return {
    seconds: new Array<number>(legs).fill(60),
    metres: new Array<number>(legs).fill(500),
    rough: new Array<boolean>(legs).fill(false),
  };
});
afterEach(() => area.table.mockClear());

const row = (count: number, lat = 41) =>
  Array.from({ length: count }, (_, i) => ({ id: `p${i}`, lat, lon: i / 100 }));

it('asks the roads once for the same points, whatever they are called', async () => {
  const first = await driveTable('town', row(3), 200);
  const renamed = row(3).map((point) => ({ ...point, id: `other ${point.id}` }));
  const second = await driveTable('town', renamed, 100);
  expect(area.table).toHaveBeenCalledTimes(1);
  expect(second.drive).toEqual({ ...first.drive, cvPermille: 100 });
  expect(second.points.map(({ id }) => id)).toEqual(['other p0', 'other p1', 'other p2']);
});

it('asks again for a moved point and for a new version of the area', async () => {
  await driveTable('town', row(3), 200);
  await driveTable('town', [...row(2), { id: 'p2', lat: 41.5, lon: 0.02 }], 200);
  area.version = 'v2';
  await driveTable('town', row(3), 200);
  expect(area.table).toHaveBeenCalledTimes(2);
});

it('forgets what was used longest ago once two million legs are kept', async () => {
  // Three tables of 810,000 legs do not fit.
  for (const lat of [1, 2, 1, 3, 1, 2]) await driveTable('town', row(900, lat), 200);
  expect(area.table.mock.calls.map(([points]) => (points as { lat: number }[])[0]!.lat)).toEqual([
    1, 2, 3, 2,
  ]);
});
