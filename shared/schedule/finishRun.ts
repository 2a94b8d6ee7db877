import type { ReadyDay, ReadyStop } from './compileDay.ts';
import { driveLeg } from './driveLeg.ts';
import { beginAhead, stepRun } from './stepRun.ts';
import type { VanShift } from './types.ts';
import {
  breakRule,
  cloneWalk,
  type InheritedAmounts,
  startWalk,
  type WalkState,
} from './walkState.ts';

/** A finished run's last numbers; the rest is in the state. */
export interface RunEnd {
  finishSeconds: number;
  overtimeSeconds: number;
  /** In drive-seconds, what is not placed left out. */
  cost: number;
}

/** Drives home, washes down, and judges the rules of the whole run. Changes the state; fills `end`. */
export function finishRun(day: ReadyDay, state: WalkState, end: RunEnd): void {
  const van = state.van;
  if (state.stopsSeen === 0) {
    end.finishSeconds = van.startSeconds;
    end.overtimeSeconds = 0;
    end.cost = 0;
    return;
  }
  if (!state.ahead) beginAhead(day, state);
  driveLeg(day, state, van.endPoint, false);
  state.freeSeconds += van.washDownSeconds;
  const finish = state.freeSeconds;
  const overtime = finish - van.endSeconds;
  end.finishSeconds = finish;
  end.overtimeSeconds = overtime > 0 ? overtime : 0;
  judgeWhole(state, finish);
  const weights = day.problem.weights;
  end.cost =
    state.driveSeconds +
    weights.lateFactor * state.lateSeconds +
    Math.floor((weights.waitFactorPermille * state.waitSeconds + 500) / 1000) +
    weights.overtimeFactor * end.overtimeSeconds +
    weights.otherGroomerSeconds * state.otherGroomers +
    weights.disturbSeconds * state.disturbed;
}

/** A van after its started stops, knowing what those alone break: where every walk of the search begins. */
export function walkStarted(day: ReadyDay, vanIndex: number, started: ReadyStop[]): WalkState {
  const state = startWalk(day.problem.vans[vanIndex]!, vanIndex);
  for (let i = 0; i < started.length; i += 1)
    stepRun(day, state, started[i]!, started[i + 1] ?? null);
  if (started.length > 0) {
    const home = cloneWalk(state);
    home.inherited = nothingInherited;
    finishRun(day, home, { finishSeconds: 0, overtimeSeconds: 0, cost: 0 });
    state.inherited = amountsOver(home, home.freeSeconds);
  }
  beginAhead(day, state);
  return state;
}

/** Whether a run that finishes then must hold a meal: never for a short day, nor one that ends before meal time. */
export function isMealDue(van: VanShift, finishSeconds: number): boolean {
  const meal = van.meal;
  return (
    meal !== null &&
    finishSeconds - van.startSeconds > meal.dueAfterSeconds &&
    finishSeconds > meal.earliestStartSeconds &&
    van.startSeconds <= meal.latestStartSeconds
  );
}

/** The facts have settled the meal: it has started, or its latest start is behind the van. */
export function isMealPast(state: WalkState): boolean {
  const began = state.afterStarted;
  if (began === null || state.van.meal === null) return false;
  return began.mealStopId !== null || began.freeSeconds > state.van.meal.latestStartSeconds;
}

const nothingInherited: InheritedAmounts = { overtimeBy: 0, driveBy: 0 };

function judgeWhole(state: WalkState, finish: number): void {
  const over = amountsOver(state, finish);
  if (over.overtimeBy === 0 && over.driveBy === 0 && over.mealBy === 0) return;
  const known = state.inherited ?? nothingInherited;
  if (over.overtimeBy > 0)
    breakRule(state, 'overtime', null, over.overtimeBy, over.overtimeBy <= known.overtimeBy);
  if (over.driveBy > 0)
    breakRule(state, 'driveLimit', null, over.driveBy, over.driveBy <= known.driveBy);
  if (over.mealBy > 0)
    breakRule(
      state,
      'meal',
      state.mealStopId,
      over.mealBy,
      isMealPast(state) || state.afterStarted?.stopsSeen === state.stopsSeen,
    );
}

function amountsOver(state: WalkState, finish: number): InheritedAmounts & { mealBy: number } {
  const { van, mealStopId, mealLateBy, driveSeconds } = state;
  const overtime = finish - van.endSeconds - van.mostOvertimeSeconds;
  const drive = van.mostDriveSeconds === null ? 0 : driveSeconds - van.mostDriveSeconds;
  let mealBy = 0;
  if (isMealDue(van, finish))
    mealBy =
      mealStopId === null ? finish - van.startSeconds - van.meal!.dueAfterSeconds : mealLateBy;
  return {
    overtimeBy: overtime > 0 ? overtime : 0,
    driveBy: drive > 0 ? drive : 0,
    mealBy,
  };
}
