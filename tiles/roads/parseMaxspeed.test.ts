import { describe, expect, it } from 'vitest';
import { parseMaxspeed } from './parseMaxspeed.ts';

describe('parseMaxspeed', () => {
  // Forms and meaning: OSM wiki, Key:maxspeed. One mile is 1.609344 km.
  it.each([
    ['50', 50],
    ['50 mph', 80.4672],
    ['20mph', 32.18688],
    ['30 km/h', 30],
    ['none', null],
    ['signals', null],
    ['RO:urban', null],
    ['2', null],
    ['50;30', null],
    [undefined, null],
  ])('reads %s as %s km/h', (value, kmh) => {
    expect(parseMaxspeed(value)).toBe(kmh);
  });
});
