import { DateTime } from 'luxon';
import { describe, expect, it } from 'vitest';
import { dayStart, localDateAt } from './dayStart.ts';
import { formatWall, formatWallRange } from './formatWall.ts';
import { addDays, daysBetween, isLocalDate, weekdayOf } from './localDate.ts';
import { instantToSeconds, secondsToInstant, secondsToWall, wallToSeconds } from './wallSeconds.ts';
import { weekOf } from './weekOf.ts';

// EU clock changes: last Sundays of March and October at 01:00 UTC (Directive 2000/84/EC).
const zone = 'Europe/Vaduz';

describe('days of 23, 24 and 25 hours', () => {
  it('starts at local midnight', () => {
    expect(dayStart('2026-03-29', zone)).toEqual({
      dayStartUtc: '2026-03-28T23:00:00.000Z',
      dayLengthSeconds: 82_800,
    });
    expect(dayStart('2026-10-25', zone)).toEqual({
      dayStartUtc: '2026-10-24T22:00:00.000Z',
      dayLengthSeconds: 90_000,
    });
    expect(dayStart('2026-07-01', 'America/Los_Angeles')).toEqual({
      dayStartUtc: '2026-07-01T07:00:00.000Z',
      dayLengthSeconds: 86_400,
    });
  });

  it('counts elapsed seconds to a wall time', () => {
    expect(wallToSeconds('2026-03-29', zone, 9 * 60)).toBe(8 * 3600);
    expect(wallToSeconds('2026-10-25', zone, 9 * 60)).toBe(10 * 3600);
    expect(wallToSeconds('2026-06-01', zone, 9 * 60)).toBe(9 * 3600);
    // 02:30 does not exist in spring (03:30 instead), and happens twice in autumn (the first).
    expect(wallToSeconds('2026-03-29', zone, 150)).toBe(wallToSeconds('2026-03-29', zone, 210));
    expect(wallToSeconds('2026-10-25', zone, 150)).toBe(9_000);
    // Past midnight: the next date's wall clock.
    expect(wallToSeconds('2026-10-25', zone, 1440 + 60)).toBe(26 * 3600);
  });

  it('reads the wall clock back', () => {
    expect(secondsToWall('2026-03-29', zone, 8 * 3600)).toBe(540);
    expect(secondsToWall('2026-10-25', zone, 10 * 3600 + 59)).toBe(540);
    expect(secondsToWall('2026-10-25', zone, 26 * 3600)).toBe(1500);
    const day = { timeZone: zone, ...dayStart('2026-10-25', zone) };
    expect(formatWall(day, 10 * 3600 + 48 * 60 + 59)).toBe('9:48');
    expect(formatWall(day, 0)).toBe('0:00');
    expect(formatWallRange(day, 10 * 3600, 12 * 3600)).toBe('9:00–11:00');
  });

  it('agrees with luxon in many zones through a year', () => {
    const zones = [
      'Europe/Vaduz',
      'America/New_York',
      'Australia/Lord_Howe',
      'Asia/Kathmandu',
      'Pacific/Apia',
      'America/Sao_Paulo',
    ];
    for (const timeZone of zones)
      for (let day = 0; day < 366; day += 1) {
        const date = addDays('2026-01-01', day);
        const start = DateTime.fromISO(date, { zone: timeZone }).startOf('day');
        expect(dayStart(date, timeZone).dayStartUtc).toBe(start.toUTC().toISO());
        const nine = start.set({ hour: 9, minute: 15 });
        expect(wallToSeconds(date, timeZone, 555)).toBe(nine.diff(start, 'seconds').seconds);
      }
  });

  it('starts a date whose midnight is skipped at its first moment', () => {
    // Beirut 2021-03-28: clocks go from 00:00 to 01:00 (IANA tz database).
    expect(dayStart('2021-03-28', 'Asia/Beirut')).toEqual({
      dayStartUtc: '2021-03-27T22:00:00.000Z',
      dayLengthSeconds: 82_800,
    });
  });
});

describe('instants and dates', () => {
  it('turns instants to seconds and back', () => {
    expect(instantToSeconds('2026-10-24T22:00:00.000Z', '2026-10-24T23:00:01.900Z')).toBe(3601);
    expect(instantToSeconds('2026-10-24T22:00:00.000Z', Date.UTC(2026, 9, 24, 21))).toBe(-3600);
    expect(secondsToInstant('2026-10-24T22:00:00.000Z', 3601)).toBe('2026-10-24T23:00:01.000Z');
    expect(() => instantToSeconds('2026-10-24T22:00:00.000Z', 'soon')).toThrow(/instant: 'soon'/);
    expect(localDateAt('2026-10-24T22:00:00.000Z', zone)).toBe('2026-10-25');
    expect(localDateAt('2026-10-24T21:59:59.999Z', zone)).toBe('2026-10-24');
  });

  it('knows dates and weeks', () => {
    expect(isLocalDate('2028-02-29')).toBe(true);
    expect(isLocalDate('2026-02-29')).toBe(false);
    expect(isLocalDate('2026-2-3')).toBe(false);
    expect(addDays('2028-02-28', 2)).toBe('2028-03-01');
    expect(daysBetween('2026-12-31', '2027-01-02')).toBe(2);
    expect(weekdayOf('2026-03-29')).toBe(7);
    expect(weekOf('2026-03-29')[0]).toBe('2026-03-23');
    expect(weekOf('2026-03-23')).toHaveLength(7);
    expect(weekOf('2026-03-23')[6]).toBe('2026-03-29');
  });

  it('names what is wrong', () => {
    expect(() => dayStart('29.3.2026', zone)).toThrow(/date: '29.3.2026'.*YYYY-MM-DD/);
    expect(() => dayStart('2026-03-29', 'Mars/Base')).toThrow(/timeZone: 'Mars\/Base'/);
  });
});
