import { waitUntil } from '#shared/forecast/arrivalSpread.ts';
import type { ReadyDay, ReadyStop } from './compileDay.ts';
import { driveLeg, legSeconds, noLeg, sameSite } from './driveLeg.ts';
import { servePause } from './servePause.ts';
import { serveVisit } from './serveVisit.ts';
import { stepFact } from './stepFact.ts';
import { cloneWalk, type WalkState } from './walkState.ts';

/**
 * Walks one stop of a run (RULES.md). `next` is the stop after it, null at the end: a meal may be
 * eaten there.
 */
export function stepRun(
  day: ReadyDay,
  state: WalkState,
  stop: ReadyStop,
  next: ReadyStop | null,
): void {
  if (stop.fact !== null) {
    stepFact(day, state, stop, stop.fact);
    state.stopsSeen += 1;
    return;
  }
  if (!state.ahead) beginAhead(day, state);
  state.stopsSeen += 1;
  if (stop.kind === 'visit') {
    driveLeg(day, state, stop.point, sameSite(state, stop));
    serveVisit(day, state, stop, state.freeSeconds, 0, 'ahead');
    return;
  }
  if (stop.point >= 0) driveLeg(day, state, stop.point, false);
  else noLeg(state);
  if (stop.kind === 'meal') driveOnToEat(day, state, next);
  servePause(state, stop, state.freeSeconds, 0, -1, 'ahead');
}

/** From here on nothing has started: the rest follows from now. */
export function beginAhead(day: ReadyDay, state: WalkState): void {
  state.ahead = true;
  const now = day.problem.nowSeconds;
  if (now === null) return;
  const pushed = state.stopsSeen > 0 || state.freeSeconds < now;
  if (state.freeSeconds < now) state.freeSeconds = now;
  waitUntil(state.risk, now);
  if (pushed) state.afterStarted = cloneWalk(state);
}

/** RULES.md 7: a van that would wait for the meal drives on first, unless that is too late to eat. */
function driveOnToEat(day: ReadyDay, state: WalkState, next: ReadyStop | null): void {
  const meal = state.van.meal;
  const point = next ? next.point : state.van.endPoint;
  if (!meal || state.freeSeconds >= meal.earliestStartSeconds || point < 0) return;
  const samePlace = next !== null && sameSite(state, next);
  const there =
    state.freeSeconds + (samePlace ? 0 : legSeconds(day, state.point, point, state.freeSeconds));
  if (there <= meal.latestStartSeconds) driveLeg(day, state, point, samePlace);
}
