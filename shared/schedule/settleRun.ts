import { compileDay, type ReadyDay, type ReadyStop, readyStop } from './compileDay.ts';
import { walkStarted } from './finishRun.ts';
import { settleStops, walkAll } from './settleStops.ts';
import type { DayProblem, Run, Stop, StopFact } from './types.ts';
import type { WalkState } from './walkState.ts';

/**
 * A run put in order: started stops first, as they were touched; unpinned and unstarted refills,
 * meals and rests taken out and put back at least cost. Depends only on the order of visits, errands
 * and pinned stops, so settling twice changes nothing.
 */
export function settleRun(problem: DayProblem, run: Run): Run {
  const day = compileDay(problem);
  const { started, fixed, rests, from } = takeApart(day, run);
  const stops =
    fixed.length === 0 ? [] : putRests(day, from, settleStops(day, from, fixed).stops, rests);
  return { vanId: run.vanId, stops: toStops(run, started, stops) };
}

/** A run's parts: what has started, what keeps its order, and the rests to be put back. */
export interface RunParts {
  vanIndex: number;
  started: ReadyStop[];
  fixed: ReadyStop[];
  rests: ReadyStop[];
  /** The walk after the started stops. */
  from: WalkState;
}

/** Takes a run apart for settling. Throws a RangeError for what the problem does not know. */
export function takeApart(day: ReadyDay, run: Run): RunParts {
  const vanIndex = day.vanIndex.get(run.vanId);
  if (vanIndex === undefined)
    throw new RangeError(`vanId: '${run.vanId}' has no shift on this day`);
  const stops = run.stops.map((stop) => readyStop(day, stop, run.vanId));
  const started = stops
    .filter((stop) => stop.fact !== null)
    .sort((a, b) => touchedSeconds(a.fact!) - touchedSeconds(b.fact!));
  const ahead = stops.filter((stop) => stop.fact === null);
  const keeps = (stop: ReadyStop) => stop.pinned || stop.kind === 'visit' || stop.kind === 'errand';
  return {
    vanIndex,
    started,
    fixed: ahead.filter(keeps),
    rests: ahead.filter((stop) => stop.kind === 'rest' && !stop.pinned),
    from: walkStarted(day, vanIndex, started),
  };
}

/** Puts each rest where it costs least, earlier places first. */
export function putRests(
  day: ReadyDay,
  from: WalkState,
  stops: ReadyStop[],
  rests: ReadyStop[],
): ReadyStop[] {
  let current = stops;
  for (const rest of rests) {
    let best: { stops: ReadyStop[]; hard: number; cost: number } | null = null;
    for (let at = 0; at <= current.length; at += 1) {
      const tried = walkAll(day, from, current.toSpliced(at, 0, rest));
      if (!best || tried.hard < best.hard || (tried.hard === best.hard && tried.cost < best.cost))
        best = tried;
    }
    current = best!.stops;
  }
  return current;
}

/** Ready stops as the plan's stops, with ids for those that settling made. */
export function toStops(run: Run, started: ReadyStop[], ahead: ReadyStop[]): Stop[] {
  const known = new Map(run.stops.map((stop) => [stop.id, stop]));
  const taken = new Set(started.map((stop) => stop.id));
  for (const stop of ahead) if (stop.pinned) taken.add(stop.id);
  return [...started, ...ahead].map((stop): Stop => {
    const isMade =
      stop.fact === null && !stop.pinned && (stop.kind === 'meal' || stop.kind === 'refill');
    if (!isMade)
      return known.get(stop.id) ?? { kind: 'visit', id: stop.id, visitId: stop.visit!.fact.id };
    let number = 1;
    while (taken.has(`${stop.kind}:${run.vanId}:${number}`)) number += 1;
    const id = `${stop.kind}:${run.vanId}:${number}`;
    taken.add(id);
    return stop.place ? { kind: 'refill', id, placeId: stop.place.id } : { kind: 'meal', id };
  });
}

/** The first tap of a started stop. */
export function touchedSeconds(fact: StopFact): number {
  return (
    fact.drivingSinceSeconds ??
    fact.arrivedSeconds ??
    fact.workingSinceSeconds ??
    fact.leftSeconds ??
    0
  );
}
