import { type ArrivalSpread, certainAt } from '#shared/forecast/arrivalSpread.ts';
import type { BrokenRule, RuleName, StopTimes, VanShift } from './types.ts';

/** Where a van is in its run, and what the run has cost so far. Walked forward by `stepRun`. */
export interface WalkState {
  van: VanShift;
  vanIndex: number;
  /** When the van is free to leave where it stands. */
  freeSeconds: number;
  point: number;
  siteId: string | null;
  risk: ArrivalSpread;
  /** Used ml by index of `van.tanks`. */
  tanks: number[];
  stopsSeen: number;
  visitsSeen: number;
  /** Stop id of a visit pinned last that has been passed; null before. */
  lastPinnedId: string | null;
  mealStopId: string | null;
  mealLateBy: number;
  /** False while only started stops were walked. */
  ahead: boolean;
  driveSeconds: number;
  driveMetres: number;
  lateSeconds: number;
  waitSeconds: number;
  workSeconds: number;
  otherGroomers: number;
  disturbed: number;
  /** Hard rules broken and not inherited. */
  hard: number;
  /** Those of them a meal or refill could mend. */
  mendable: number;
  /** What the started stops alone break; null until something ahead needs to know. */
  inherited: InheritedAmounts | null;
  /** State after the started stops, for inherited windows; null when none may be inherited. */
  afterStarted: WalkState | null;
  record: RunRecord | null;
  /** The last leg driven; what a recorded stop shows. */
  leg: Leg;
  /** What `findBegin` found last. */
  begin: Begin;
}

/** One leg. `rough` is only kept up in recorded walks. */
export interface Leg {
  departSeconds: number;
  driveSeconds: number;
  driveMetres: number;
  rough: boolean;
}

/** When a stay may begin, by how much its windows are missed, and until when an early van is held (−1: never). */
export interface Begin {
  atSeconds: number;
  missedBy: number;
  heldUntilSeconds: number;
}

/** Amounts a run breaks with its started stops alone. */
export interface InheritedAmounts {
  overtimeBy: number;
  driveBy: number;
}

/** Where a walk writes its details; the search walks without one. */
export interface RunRecord {
  stops: StopTimes[];
  broken: BrokenRule[];
}

/** A van at the start of its shift, loaded and about to leave. */
export function startWalk(
  van: VanShift,
  vanIndex: number,
  record: RunRecord | null = null,
): WalkState {
  const leave = van.startSeconds + van.loadSeconds;
  const tanks: number[] = [];
  for (let i = 0; i < van.tanks.length; i += 1) tanks.push(van.tanks[i]!.usedAtStartMl);
  return {
    van,
    vanIndex,
    freeSeconds: leave,
    point: van.startPoint,
    siteId: null,
    risk: certainAt(leave),
    tanks,
    stopsSeen: 0,
    visitsSeen: 0,
    lastPinnedId: null,
    mealStopId: null,
    mealLateBy: 0,
    ahead: false,
    driveSeconds: 0,
    driveMetres: 0,
    lateSeconds: 0,
    waitSeconds: 0,
    workSeconds: 0,
    otherGroomers: 0,
    disturbed: 0,
    hard: 0,
    mendable: 0,
    inherited: null,
    afterStarted: null,
    record,
    leg: { departSeconds: leave, driveSeconds: 0, driveMetres: 0, rough: false },
    begin: { atSeconds: 0, missedBy: 0, heldUntilSeconds: -1 },
  };
}

/** Makes `to` what `from` is, without garbage; `to` keeps its own record, leg and begin. */
export function copyWalk(from: WalkState, to: WalkState): void {
  to.van = from.van;
  to.vanIndex = from.vanIndex;
  to.freeSeconds = from.freeSeconds;
  to.point = from.point;
  to.siteId = from.siteId;
  to.risk.meanSeconds = from.risk.meanSeconds;
  to.risk.varianceSeconds2 = from.risk.varianceSeconds2;
  to.risk.thirdSeconds3 = from.risk.thirdSeconds3;
  const tanks = from.tanks.length;
  if (to.tanks.length !== tanks) to.tanks.length = tanks;
  for (let i = 0; i < tanks; i += 1) to.tanks[i] = from.tanks[i]!;
  to.stopsSeen = from.stopsSeen;
  to.visitsSeen = from.visitsSeen;
  to.lastPinnedId = from.lastPinnedId;
  to.mealStopId = from.mealStopId;
  to.mealLateBy = from.mealLateBy;
  to.ahead = from.ahead;
  to.driveSeconds = from.driveSeconds;
  to.driveMetres = from.driveMetres;
  to.lateSeconds = from.lateSeconds;
  to.waitSeconds = from.waitSeconds;
  to.workSeconds = from.workSeconds;
  to.otherGroomers = from.otherGroomers;
  to.disturbed = from.disturbed;
  to.hard = from.hard;
  to.mendable = from.mendable;
  to.inherited = from.inherited;
  to.afterStarted = from.afterStarted;
}

/** A copy of its own, with no record. */
export function cloneWalk(from: WalkState): WalkState {
  const to = startWalk(from.van, from.vanIndex);
  copyWalk(from, to);
  return to;
}

/** Counts a broken hard rule and writes it down when the walk is recorded. */
export function breakRule(
  state: WalkState,
  rule: RuleName,
  stopId: string | null,
  byAmount: number,
  inherited: boolean,
): void {
  if (!inherited) {
    state.hard += 1;
    if (rule === 'tank' || rule === 'meal') state.mendable += 1;
  }
  state.record?.broken.push({
    rule,
    hard: true,
    vanId: state.van.vanId,
    stopId,
    byAmount,
    inherited,
  });
}
