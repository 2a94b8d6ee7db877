import { waitUntil } from '#shared/forecast/arrivalSpread.ts';
import type { ReadyStop } from './compileDay.ts';
import { closeStop, openStop } from './recordStop.ts';
import type { StopTimes } from './types.ts';
import { breakRule, type WalkState } from './walkState.ts';

/**
 * A refill, errand, rest or meal the van is ready for. `endNotBefore`: now, for one under way;
 * `begunSeconds`: the tap that began it, −1 without.
 */
export function servePause(
  state: WalkState,
  stop: ReadyStop,
  arrive: number,
  endNotBefore: number,
  begunSeconds: number,
  shown: StopTimes['state'],
): void {
  const times = openStop(state, stop, arrive, shown);
  const held = begunSeconds >= 0 ? begunSeconds : heldUntil(state, stop);
  const begin = arrive > held ? arrive : held;
  if (held >= 0) waitUntil(state.risk, held);
  state.waitSeconds += begin - arrive;
  state.freeSeconds = begin + stop.lengthSeconds;
  state.risk.meanSeconds += stop.lengthSeconds;
  if (endNotBefore > 0) waitUntil(state.risk, endNotBefore);
  if (state.freeSeconds < endNotBefore) state.freeSeconds = endNotBefore;
  afterPause(state, stop, begin, shown !== 'ahead');
  closeStop(state, times, begin, begin - arrive, 0, 0);
}

/** Tanks and rules once a pause is over. */
export function afterPause(
  state: WalkState,
  stop: ReadyStop,
  begin: number,
  started: boolean,
): void {
  const place = stop.place;
  if (place) {
    const tanks = state.van.tanks;
    for (let i = 0; i < tanks.length; i += 1)
      if (place.kinds.includes(tanks[i]!.kind)) state.tanks[i] = 0;
    const over = state.freeSeconds - place.closesSeconds;
    if (over > 0) breakRule(state, 'refillHours', stop.id, over, started);
  }
  if (stop.kind === 'refill' || stop.kind === 'errand') state.siteId = null;
  if (stop.kind === 'meal' && state.mealStopId === null) {
    state.mealStopId = stop.id;
    const late = begin - (state.van.meal?.latestStartSeconds ?? begin);
    state.mealLateBy = late > 0 ? late : 0;
  }
}

function heldUntil(state: WalkState, stop: ReadyStop): number {
  if (stop.place) return stop.place.opensSeconds;
  return stop.kind === 'meal' && state.van.meal ? state.van.meal.earliestStartSeconds : -1;
}
