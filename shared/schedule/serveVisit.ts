import {
  addDuration,
  chanceByPermille,
  expectedLateSeconds,
  waitUntil,
} from '#shared/forecast/arrivalSpread.ts';
import type { ReadyDay, ReadyStop, ReadyVisit } from './compileDay.ts';
import { legSeconds, sameSite } from './driveLeg.ts';
import { findBegin } from './findBegin.ts';
import { closeStop, openStop } from './recordStop.ts';
import type { StopTimes } from './types.ts';
import { breakRule, type WalkState } from './walkState.ts';

/**
 * The stay at a visit the van has arrived at: waiting, set-up, work, clean-down, tanks and rules.
 * `workNotBefore` holds the set-up open until now for a van that has arrived already.
 */
export function serveVisit(
  day: ReadyDay,
  state: WalkState,
  stop: ReadyStop,
  arrive: number,
  workNotBefore: number,
  shown: StopTimes['state'],
): void {
  const visit = stop.visit!;
  const started = shown !== 'ahead';
  const work = visit.workMean[state.vanIndex]!;
  const cleanDown = visit.fact.cleanDownSeconds;
  let setUp = sameSite(state, stop) ? 0 : visit.fact.setUpSeconds;
  findBegin(state.begin, visit, arrive, setUp + work + cleanDown);
  const begin = state.begin.atSeconds;
  const missed = state.begin.missedBy;
  const held = state.begin.heldUntilSeconds;
  if (missed > 0)
    breakRule(
      state,
      'window',
      stop.id,
      missed,
      started || missed <= missedByFacts(day, state, stop),
    );
  if (begin + setUp < workNotBefore) setUp = workNotBefore - begin;
  const times = openStop(state, stop, arrive, shown);
  countVisit(state, stop, visit, arrive, started, times);
  if (held >= 0) waitUntil(state.risk, held);
  state.risk.meanSeconds += setUp + cleanDown;
  addDuration(state.risk, work, visit.workVariance[state.vanIndex]!);
  state.waitSeconds += begin - arrive;
  state.workSeconds += work;
  state.freeSeconds = begin + setUp + work + cleanDown;
  useTanks(state, stop, visit, started);
  closeStop(state, times, begin, begin - arrive, setUp, work);
}

/** Rules and costs that depend on where and when in the run a visit stands, its promise included. */
export function countVisit(
  state: WalkState,
  stop: ReadyStop,
  visit: ReadyVisit,
  arrive: number,
  started: boolean,
  times: StopTimes | null,
): void {
  const { pin, promise, siteId } = visit.fact;
  if (visit.staticBroken[state.vanIndex]! > 0) staticBreaks(state, stop, visit, started);
  if (pin?.position === 'first' && state.visitsSeen > 0)
    breakRule(state, 'pin', stop.id, 0, started);
  if (state.lastPinnedId !== null) breakRule(state, 'pin', state.lastPinnedId, 0, started);
  if (pin?.position === 'last') state.lastPinnedId = stop.id;
  state.visitsSeen += 1;
  state.siteId = siteId;
  state.otherGroomers += visit.otherGroomer[state.vanIndex]!;
  if (visit.sentVan >= 0 && visit.sentVan !== state.vanIndex) state.disturbed += 1;
  if (!promise) return;
  const late = expectedLateSeconds(state.risk, promise.endSeconds);
  state.lateSeconds += late;
  if (!state.record || !times) return;
  times.expectedLateSeconds = late;
  times.onTimePermille = chanceByPermille(state.risk, promise.endSeconds);
  if (arrive > promise.endSeconds)
    state.record.broken.push({
      rule: 'promise',
      hard: false,
      vanId: state.van.vanId,
      stopId: stop.id,
      byAmount: arrive - promise.endSeconds,
      inherited: started,
    });
}

/** Adds what the visit uses and reports every tank that is over. */
export function useTanks(
  state: WalkState,
  stop: ReadyStop,
  visit: ReadyVisit,
  started: boolean,
): void {
  const uses = visit.fact.tankUse;
  if (uses.length === 0) return;
  const tanks = state.van.tanks;
  for (let i = 0; i < tanks.length; i += 1) {
    let ml = 0;
    for (let u = 0; u < uses.length; u += 1)
      if (uses[u]!.kind === tanks[i]!.kind) ml += uses[u]!.ml;
    if (ml === 0) continue;
    state.tanks[i] = state.tanks[i]! + ml;
    const over = state.tanks[i]! - tanks[i]!.capacityMl;
    if (over > 0) breakRule(state, 'tank', stop.id, over, started);
  }
}

function staticBreaks(
  state: WalkState,
  stop: ReadyStop,
  visit: ReadyVisit,
  started: boolean,
): void {
  if (!state.record) {
    if (!started) state.hard += visit.staticBroken[state.vanIndex]!;
    return;
  }
  const { needs, heaviestGrams, barredGroomerIds, pin } = visit.fact;
  const van = state.van;
  if (!needs.every((skill) => van.skills.includes(skill)))
    breakRule(state, 'skill', stop.id, 0, started);
  if (heaviestGrams > van.tableLimitGrams)
    breakRule(state, 'tableLimit', stop.id, heaviestGrams - van.tableLimitGrams, started);
  if (barredGroomerIds.includes(van.groomerId))
    breakRule(state, 'barredGroomer', stop.id, 0, started);
  if (pin?.vanId !== undefined && pin.vanId !== van.vanId)
    breakRule(state, 'pin', stop.id, 0, started);
}

/** By how much the visit's windows would be missed even if it came directly after the started stops. */
function missedByFacts(day: ReadyDay, state: WalkState, stop: ReadyStop): number {
  const from = state.afterStarted;
  if (!from) return 0;
  const visit = stop.visit!;
  const site = sameSite(from, stop);
  const arrive =
    from.freeSeconds + (site ? 0 : legSeconds(day, from.point, stop.point, from.freeSeconds));
  const stay = visit.workMean[state.vanIndex]! + visit.fact.cleanDownSeconds;
  findBegin(state.begin, visit, arrive, stay + (site ? 0 : visit.fact.setUpSeconds));
  return state.begin.missedBy;
}
