import { expect, test } from 'vitest';
import type { Shift } from '#shared/api/groomers.ts';
import { shiftsToCopy } from './shiftsToCopy.ts';

const shift = (date: string, vanId: string, groomerId: string): Shift => ({
  id: `${date}-${vanId}`,
  date,
  vanId,
  groomerId,
  startMinutes: 480,
  endMinutes: 1020,
  mostOvertimeMinutes: 30,
  meal: null,
});

test('a week moves on by seven days, over the end of a month', () => {
  const copied = shiftsToCopy([shift('2026-04-27', 'otter', 'mika')], []);
  expect(copied).toHaveLength(1);
  expect(copied[0]).toMatchObject({ date: '2026-05-04', vanId: 'otter', groomerId: 'mika' });
  expect(copied[0]).not.toHaveProperty('id');
});

test('a van or a groomer who already has a shift that day is left alone', () => {
  const before = [
    shift('2026-04-13', 'otter', 'mika'),
    shift('2026-04-13', 'plover', 'ines'),
    shift('2026-04-14', 'otter', 'mika'),
  ];
  const present = [shift('2026-04-20', 'otter', 'tobi'), shift('2026-04-20', 'curlew', 'ines')];
  expect(shiftsToCopy(before, present).map((one) => one.date)).toEqual(['2026-04-21']);
});
