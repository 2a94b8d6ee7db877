import { addDuration, certainAt, waitUntil } from '#shared/forecast/arrivalSpread.ts';
import { remainingWork } from '#shared/forecast/remainingWork.ts';
import type { ReadyDay, ReadyStop } from './compileDay.ts';
import { legSeconds, noLeg, sameSite, takeLeg } from './driveLeg.ts';
import { closeStop, openStop } from './recordStop.ts';
import { afterPause, servePause } from './servePause.ts';
import { countVisit, serveVisit, useTanks } from './serveVisit.ts';
import type { StopFact } from './types.ts';
import type { WalkState } from './walkState.ts';

/** Walks a stop the groomer has started: what was tapped is true, the rest follows from now. */
export function stepFact(day: ReadyDay, state: WalkState, stop: ReadyStop, fact: StopFact): void {
  const { drivingSinceSeconds: driving, workingSinceSeconds: working, leftSeconds } = fact;
  if (isGivenUp(fact)) {
    noLeg(state);
    closeStop(
      state,
      openStop(state, stop, state.freeSeconds, 'failed'),
      state.freeSeconds,
      0,
      0,
      0,
    );
    return;
  }
  const arrived = fact.arrivedSeconds ?? working ?? leftSeconds;
  const depart = driving ?? state.freeSeconds;
  const samePlace = stop.visit ? sameSite(state, stop) : stop.point < 0;
  const point = stop.point < 0 ? state.point : stop.point;
  const planned = samePlace ? 0 : legSeconds(day, state.point, point, depart);
  const now = day.problem.nowSeconds ?? 0;
  const arrive = arrived ?? Math.max(now, depart + planned);
  // The leg is what was driven; without a tap at its start, what was planned.
  const seconds = driving !== null ? Math.max(0, arrive - driving) : planned;
  state.risk = certainAt(depart);
  if (arrived === null) {
    takeLeg(day, state, point, depart, planned, samePlace);
    state.driveSeconds += seconds - planned;
    state.leg.driveSeconds = seconds;
    waitUntil(state.risk, now);
  } else {
    takeLeg(day, state, point, depart, seconds, samePlace);
    state.risk = certainAt(arrive);
  }
  state.freeSeconds = arrive;
  if (leftSeconds !== null) left(state, stop, fact, arrive, leftSeconds);
  else if (stop.visit && working !== null) workUnderWay(state, stop, arrive, working, now);
  else {
    const shown = working !== null ? 'working' : arrived !== null ? 'arrived' : 'driving';
    const heldOpen = arrived !== null ? now : 0;
    if (stop.visit) serveVisit(day, state, stop, arrive, heldOpen, shown);
    else servePause(state, stop, arrive, heldOpen, working ?? -1, shown);
  }
}

/** True for a stop given up before the van set out for it: no time, no driving, any place in the order. */
export function isGivenUp(fact: StopFact): boolean {
  return (
    fact.failedReason !== null &&
    fact.drivingSinceSeconds === null &&
    fact.arrivedSeconds === null &&
    fact.workingSinceSeconds === null
  );
}

function left(
  state: WalkState,
  stop: ReadyStop,
  fact: StopFact,
  arrive: number,
  leftSeconds: number,
): void {
  const visit = stop.visit;
  const failed = fact.failedReason !== null;
  const times = openStop(state, stop, arrive, failed ? 'failed' : 'done');
  const setUp = visit && !sameSite(state, stop) ? visit.fact.setUpSeconds : 0;
  const working = Math.min(leftSeconds, fact.workingSinceSeconds ?? arrive + setUp);
  const begin = failed ? leftSeconds : Math.max(arrive, working - setUp);
  const cleanDown = visit ? visit.fact.cleanDownSeconds : 0;
  const work = visit && !failed ? Math.max(0, leftSeconds - working - cleanDown) : 0;
  if (visit) countVisit(state, stop, visit, arrive, true, times);
  state.freeSeconds = leftSeconds;
  state.risk = certainAt(leftSeconds);
  state.waitSeconds += begin - arrive;
  state.workSeconds += work;
  if (visit && !failed) useTanks(state, stop, visit, true);
  if (!visit && !failed) afterPause(state, stop, begin, true);
  closeStop(state, times, begin, begin - arrive, failed ? 0 : working - begin, work);
}

function workUnderWay(
  state: WalkState,
  stop: ReadyStop,
  arrive: number,
  working: number,
  now: number,
): void {
  const visit = stop.visit!;
  const times = openStop(state, stop, arrive, 'working');
  const setUp = sameSite(state, stop) ? 0 : visit.fact.setUpSeconds;
  const begin = Math.max(arrive, working - setUp);
  countVisit(state, stop, visit, arrive, true, times);
  const work = remainingWork(
    {
      meanSeconds: visit.workMean[state.vanIndex]!,
      varianceSeconds2: visit.workVariance[state.vanIndex]!,
    },
    now - working,
  );
  state.risk = certainAt(working + visit.fact.cleanDownSeconds);
  addDuration(state.risk, work.meanSeconds, work.varianceSeconds2);
  state.freeSeconds = working + work.meanSeconds + visit.fact.cleanDownSeconds;
  state.waitSeconds += begin - arrive;
  state.workSeconds += work.meanSeconds;
  useTanks(state, stop, visit, true);
  closeStop(state, times, begin, begin - arrive, working - begin, work.meanSeconds);
}
