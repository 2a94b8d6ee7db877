import { describe, expect, it } from 'vitest';
import { tileCorner, tileNumbers } from './tileNumbers.ts';

describe('tileNumbers', () => {
  it('matches the published tile of Brandenburg Gate', () => {
    // R package slippymath, documented example: zoom 17 → 70406, 42987.
    expect(tileNumbers(52.51628011262304, 13.37771496361961, 17)).toEqual({ x: 70406, y: 42987 });
  });

  it('finds London at zoom 12', () => {
    // Formula of the OSM wiki page "Slippy map tilenames".
    expect(tileNumbers(51.5074, -0.1278, 12)).toEqual({ x: 2046, y: 1362 });
  });

  it('stays inside the scheme at the poles and the date line', () => {
    expect(tileNumbers(90, 180, 3)).toEqual({ x: 7, y: 0 });
    expect(tileNumbers(-90, -180, 3)).toEqual({ x: 0, y: 7 });
  });
});

describe('tileCorner', () => {
  it('is the north-west corner of the published tile', () => {
    // slippymath: 52.517892228, 13.375854492.
    const corner = tileCorner(17, 70406, 42987);
    expect(corner.lat).toBeCloseTo(52.517892228, 8);
    expect(corner.lon).toBeCloseTo(13.375854492, 8);
  });
});
