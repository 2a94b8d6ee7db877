import geodesic from 'geographiclib-geodesic';
import { describe, expect, it } from 'vitest';
import { distanceMetres } from './distanceMetres.ts';
import { straightLineLeg } from './straightLineLeg.ts';

const place = (lat: number, lon: number) => ({ lat, lon });

describe('distanceMetres', () => {
  it('agrees with the published haversine cases', () => {
    // docs.rs geo, Sofia → Plovdiv; radius 6371008.8 m.
    expect(distanceMetres(place(42.698334, 23.319941), place(42.136097, 24.742168))).toBeCloseTo(
      132433.0993,
      3,
    );
    // Rosetta Code "Haversine formula", BNA → LAX, at radius 6371008.8 m: 2886.4484 km.
    expect(distanceMetres(place(36.12, -86.67), place(33.94, -118.4)) / 1000).toBeCloseTo(
      2886.4484,
      3,
    );
    // One degree of latitude on the mean sphere.
    expect(distanceMetres(place(0, 0), place(1, 0))).toBeCloseTo(111195.08, 1);
  });

  it('stays within 0.3 % of the ellipsoid at the scale of a city', () => {
    // Oracle: geographiclib-geodesic (WGS84); reference value 9870.499 m.
    const truth = geodesic.Geodesic.WGS84.Inverse(51.5074, -0.1278, 51.556, -0.0088).s12!;
    expect(truth).toBeCloseTo(9870.499, 2);
    const ours = distanceMetres(place(51.5074, -0.1278), place(51.556, -0.0088));
    expect(Math.abs(ours / truth - 1)).toBeLessThan(0.003);
  });
});

describe('straightLineLeg', () => {
  it('stretches the line by 1.4 and drives it at 30 km/h, in whole numbers, marked rough', () => {
    // 1 degree of latitude: 111195.08 m × 1.4 = 155673 m; at 30 km/h 18681 s.
    expect(straightLineLeg(place(0, 0), place(1, 0))).toEqual({
      metres: 155673,
      seconds: 18681,
      rough: true,
    });
  });

  it('is nothing from a door to itself', () => {
    expect(straightLineLeg(place(41, -36), place(41, -36))).toMatchObject({
      seconds: 0,
      metres: 0,
    });
  });
});
