import { describe, expect, it } from 'vitest';
import { secondsAt, timeAxis, xOf } from './timeAxis.ts';

const day = { dayStartUtc: '2026-04-14T00:00:00.000Z', timeZone: 'UTC' };

describe('timeAxis', () => {
  it('spans whole half hours and ticks every hour', () => {
    const axis = timeAxis(day, 7.75 * 3600, 17.9 * 3600, 1050);
    expect([axis.fromSeconds / 3600, axis.toSeconds / 3600]).toEqual([7.5, 18]);
    expect(axis.ticks.map((tick) => tick.words)).toEqual(
      ['8:00', '9:00', '10:00', '11:00', '12:00', '13:00', '14:00', '15:00', '16:00'].concat(
        '17:00',
        '18:00',
      ),
    );
    expect(xOf(axis, 8 * 3600)).toBe(50);
    expect(secondsAt(axis, 50)).toBe(8 * 3600);
  });
  it('thins its ticks where hours are narrow', () => {
    const axis = timeAxis(day, 8 * 3600, 18 * 3600, 300);
    expect(axis.ticks.map((tick) => tick.words)).toEqual(
      ['8:00', '10:00', '12:00'].concat('14:00', '16:00', '18:00'),
    );
  });
  it('reads the wall on a day of 23 hours', () => {
    // EU clock change 2026-03-29, Directive 2000/84/EC.
    const spring = { dayStartUtc: '2026-03-28T23:00:00.000Z', timeZone: 'Europe/Vaduz' };
    expect(timeAxis(spring, 7 * 3600, 9 * 3600, 400).ticks[0]!.words).toBe('8:00');
  });
});
