import { addDuration } from '#shared/forecast/arrivalSpread.ts';
import type { ReadyDay, ReadyStop } from './compileDay.ts';
import { driveTime } from './driveTime.ts';
import type { WalkState } from './walkState.ts';

/** Drives the van to a point from when it is free; `samePlace` when the leg costs nothing (one site). */
export function driveLeg(day: ReadyDay, state: WalkState, point: number, samePlace: boolean): void {
  const seconds = samePlace ? 0 : legSeconds(day, state.point, point, state.freeSeconds);
  takeLeg(day, state, point, state.freeSeconds, seconds, samePlace);
  state.freeSeconds += seconds;
}

/** Counts a leg of known seconds in driving, risk and the recorded leg. */
export function takeLeg(
  day: ReadyDay,
  state: WalkState,
  point: number,
  departSeconds: number,
  seconds: number,
  samePlace: boolean,
): void {
  const leg = state.leg;
  leg.departSeconds = departSeconds;
  leg.driveSeconds = seconds;
  leg.driveMetres = samePlace ? 0 : day.metres[state.point * day.pointCount + point]!;
  if (state.record) {
    const points = day.problem.points;
    leg.rough = leg.driveMetres > 0 && (points[state.point]!.rough || points[point]!.rough);
  }
  state.driveSeconds += seconds;
  state.driveMetres += leg.driveMetres;
  state.point = point;
  const cv = day.cvPermille;
  addDuration(state.risk, seconds, Math.floor((cv * cv * seconds * seconds) / 1_000_000 + 0.5));
}

/** The van does not move: the recorded leg is empty. */
export function noLeg(state: WalkState): void {
  state.leg.departSeconds = state.freeSeconds;
  state.leg.driveSeconds = 0;
  state.leg.driveMetres = 0;
  state.leg.rough = false;
}

/** Seconds from one point to another leaving at `departSeconds`. */
export function legSeconds(day: ReadyDay, from: number, to: number, departSeconds: number): number {
  return driveTime(day.bands, day.base[from * day.pointCount + to]!, departSeconds);
}

/** True when the van already stands at the visit's site with the set-up done. */
export function sameSite(state: WalkState, stop: ReadyStop): boolean {
  const site = stop.visit === null ? null : stop.visit.fact.siteId;
  return site !== null && site === state.siteId;
}
