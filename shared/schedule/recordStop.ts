import { earlySeconds, lateSeconds } from '#shared/forecast/arrivalSpread.ts';
import type { ReadyStop } from './compileDay.ts';
import type { StopTimes } from './types.ts';
import type { WalkState } from './walkState.ts';

/** Opens a recorded stop with everything known at the arrival; null in a walk without a record. */
export function openStop(
  state: WalkState,
  stop: ReadyStop,
  arrive: number,
  shown: StopTimes['state'],
): StopTimes | null {
  if (!state.record) return null;
  const early = earlySeconds(state.risk);
  const late = lateSeconds(state.risk);
  return {
    stopId: stop.id,
    kind: stop.kind,
    point: state.point,
    driveSeconds: state.leg.driveSeconds,
    driveMetres: state.leg.driveMetres,
    rough: state.leg.rough,
    departSeconds: state.leg.departSeconds,
    arriveSeconds: arrive,
    arriveEarlySeconds: early < arrive ? early : arrive,
    arriveLateSeconds: late > arrive ? late : arrive,
    waitSeconds: 0,
    startSeconds: arrive,
    setUpSeconds: 0,
    workSeconds: 0,
    endSeconds: arrive,
    onTimePermille: null,
    expectedLateSeconds: 0,
    tanksUsedMl: [],
    state: shown,
  };
}

/** Closes it with everything known once the van is free, and writes it down. */
export function closeStop(
  state: WalkState,
  times: StopTimes | null,
  begin: number,
  wait: number,
  setUp: number,
  work: number,
): void {
  if (!times || !state.record) return;
  times.waitSeconds = wait;
  times.startSeconds = begin;
  times.setUpSeconds = setUp;
  times.workSeconds = work;
  times.endSeconds = state.freeSeconds;
  times.tanksUsedMl = state.van.tanks.map((tank, i) => ({
    kind: tank.kind,
    usedMl: state.tanks[i]!,
  }));
  state.record.stops.push(times);
}
