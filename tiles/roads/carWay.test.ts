import { describe, expect, it } from 'vitest';
import { CAR_PROFILE } from './carProfile.ts';
import { carWay } from './carWay.ts';

const rules = (tags: Record<string, string>) =>
  carWay({ highway: 'residential', ...tags }, CAR_PROFILE);
const directions = (tags: Record<string, string>) => {
  const found = rules(tags);
  return found && { forward: found.forwardKmh > 0, backward: found.backwardKmh > 0 };
};
const BOTH = { forward: true, backward: true };
const FORWARD = { forward: true, backward: false };
const BACKWARD = { forward: false, backward: true };

// Rules: OSRM's car profile and the OSM wiki pages of each key.
describe('carWay', () => {
  it.each([
    [{}, BOTH],
    [{ oneway: 'yes' }, FORWARD],
    [{ oneway: '1' }, FORWARD],
    [{ oneway: 'true' }, FORWARD],
    [{ oneway: '-1' }, BACKWARD],
    [{ oneway: 'alternating' }, BOTH],
    [{ oneway: 'reversible' }, null],
    [{ junction: 'roundabout' }, FORWARD],
    [{ junction: 'roundabout', oneway: '-1' }, BACKWARD],
    [{ highway: 'motorway' }, FORWARD],
    [{ highway: 'motorway', oneway: 'no' }, BOTH],
    [{ highway: 'trunk' }, BOTH],
  ])('drives %o as %o', (tags, expected) => {
    expect(directions(tags)).toEqual(expected);
  });

  it.each([
    [{ access: 'no' }, 'closed'],
    [{ access: 'no', motor_vehicle: 'yes' }, 'open'],
    [{ access: 'no', vehicle: 'yes', motorcar: 'no' }, 'closed'],
    [{ motor_vehicle: 'agricultural' }, 'closed'],
    [{ motor_vehicle: 'forestry' }, 'closed'],
    [{ access: 'private' }, 'ends'],
    [{ vehicle: 'destination' }, 'ends'],
    [{ motor_vehicle: 'customers' }, 'ends'],
    [{ access: 'private', motorcar: 'designated' }, 'open'],
    [{ highway: 'footway' }, 'closed'],
    [{ highway: 'service', service: 'emergency_access' }, 'closed'],
  ])('takes %o as %s', (tags, expected) => {
    const found = rules(tags as Record<string, string>);
    expect(found === null ? 'closed' : found.endOnly ? 'ends' : 'open').toBe(expected);
  });

  it('drives four fifths of a posted limit, and class speed where none is posted', () => {
    expect(rules({})!.forwardKmh).toBe(25);
    expect(rules({ maxspeed: '50' })!.forwardKmh).toBe(40);
    // 30 mph = 48.28 km/h.
    expect(rules({ maxspeed: '30 mph' })!.forwardKmh).toBeCloseTo(38.62, 2);
    expect(rules({ maxspeed: 'walk' })!.forwardKmh).toBe(25);
    expect(rules({ highway: 'service', service: 'driveway' })!.forwardKmh).toBe(7.5);
  });

  it('knows limits that differ by direction', () => {
    const found = rules({ maxspeed: '50', 'maxspeed:backward': '30' })!;
    expect([found.forwardKmh, found.backwardKmh]).toEqual([40, 24]);
  });
});
