import { expect, it } from 'vitest';
import { writeMoment } from './writeMoment.ts';

it('writes the time alone on the day itself, by the business’s clock', () => {
  // Vaduz is two hours ahead of UTC in April (Central European Summer Time).
  expect(writeMoment('2026-04-14T07:48:00.000Z', 'Europe/Vaduz', '2026-04-14')).toMatch(/^0?9:48$/);
  expect(writeMoment('2026-04-13T22:30:00.000Z', 'Europe/Vaduz', '2026-04-14')).toMatch(/^0?0:30$/);
  expect(writeMoment('2026-04-13T21:30:00.000Z', 'Europe/Vaduz', '2026-04-14')).toMatch(
    /^Mon 13 Apr, 23:30$/,
  );
});
