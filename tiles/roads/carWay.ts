import type { OsmTags } from '../osm/osmTypes.ts';
import type { CarProfile } from './carProfile.ts';
import { parseMaxspeed } from './parseMaxspeed.ts';

/** What one way lets a car do. */
export interface CarWay {
  /** km/h along and against the way's direction; 0 where driving that way is forbidden. */
  forwardKmh: number;
  backwardKmh: number;
  /** Usable only in the first or last part of a drive (private, destination, customers …). */
  endOnly: boolean;
  /** No junction cost along it: a roundabout, or a road that has the right of way. */
  flows: boolean;
  /** Nobody's door is on it: motorways, ramps, tunnels. */
  doorless: boolean;
  /** Too small to make a junction of the road it joins. */
  minor: boolean;
}

const BLOCKED = new Set([
  'no',
  'agricultural',
  'forestry',
  'emergency',
  'psv',
  'bus',
  'use_sidepath',
]);
const END_ONLY = new Set([
  'private',
  'delivery',
  'destination',
  'customers',
  'residents',
  'permit',
]);
const HALF_SPEED_SERVICE = new Set(['alley', 'driveway', 'parking_aisle', 'drive-through']);

/** The car rules of a way's tags, or null when a car may not use it at all. */
export function carWay(tags: OsmTags, profile: CarProfile): CarWay | null {
  const kind = tags.highway;
  const classKmh = kind === undefined ? undefined : profile.classKmh[kind];
  if (kind === undefined || classKmh === undefined || tags.area === 'yes') return null;
  const access = tags.motorcar ?? tags.motor_vehicle ?? tags.vehicle ?? tags.access ?? 'yes';
  if (BLOCKED.has(access) || tags.service === 'emergency_access') return null;
  const direction = directionOf(tags);
  if (!direction) return null;

  const slow = kind === 'service' && HALF_SPEED_SERVICE.has(tags.service ?? '') ? 0.5 : 1;
  const speed = (way: 'forward' | 'backward') => {
    const limit = parseMaxspeed(tags[`maxspeed:${way}`] ?? tags.maxspeed);
    return (limit === null ? classKmh : limit * profile.limitShare) * slow;
  };
  return {
    forwardKmh: direction.forward ? speed('forward') : 0,
    backwardKmh: direction.backward ? speed('backward') : 0,
    endOnly: END_ONLY.has(access),
    flows: isRoundabout(tags) || /^(motorway|trunk)/.test(kind),
    doorless:
      kind.startsWith('motorway') || kind === 'trunk_link' || (tags.tunnel ?? 'no') !== 'no',
    minor: kind === 'service',
  };
}

function isRoundabout(tags: OsmTags): boolean {
  return tags.junction === 'roundabout' || tags.junction === 'circular';
}

/** Motorways and roundabouts are one-way unless they say no; "reversible" has no fixed direction. */
function directionOf(tags: OsmTags): { forward: boolean; backward: boolean } | null {
  switch (tags.oneway) {
    case 'yes':
    case '1':
    case 'true':
      return { forward: true, backward: false };
    case '-1':
    case 'reverse':
      return { forward: false, backward: true };
    case 'reversible':
      return null;
    case 'no':
    case '0':
    case 'false':
      return { forward: true, backward: true };
  }
  const implied = isRoundabout(tags) || /^motorway(_link)?$/.test(tags.highway ?? '');
  return { forward: true, backward: !implied };
}
