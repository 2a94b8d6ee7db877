import type { BrokenRule, DayProblem, DayTimes, StopTimes } from './types.ts';

/** A van's finish before and after; only vans whose run changed. */
export interface RunChange {
  vanId: string;
  vanName: string;
  finishBeforeSeconds: number;
  finishAfterSeconds: number;
  driveSeconds: number;
}

/** A visit whose arrival or van changed; null where it is not placed. */
export interface ArrivalChange {
  visitId: string;
  label: string;
  vanBeforeId: string | null;
  vanAfterId: string | null;
  arriveBeforeSeconds: number | null;
  arriveAfterSeconds: number | null;
}

/** A promise whose chance changed; null where the visit is not placed. */
export interface PromiseChange {
  visitId: string;
  label: string;
  beforePermille: number | null;
  afterPermille: number | null;
}

export interface RefillChange {
  vanId: string;
  vanName: string;
  placeId: string;
  placeName: string;
}

/** Everything a move changes. Bare numbers are after − before. */
export interface KnockOn {
  driveSeconds: number;
  driveMetres: number;
  waitSeconds: number;
  overtimeSeconds: number;
  runs: RunChange[];
  arrivals: ArrivalChange[];
  promises: PromiseChange[];
  refillsAdded: RefillChange[];
  refillsRemoved: RefillChange[];
  /** Broken rules that are new or worse, soft ones too; and those that are gone. */
  newlyBroken: BrokenRule[];
  mended: BrokenRule[];
}

/** The knock-on of going from one evaluated day to another of the same problem. */
export function diffDay(problem: DayProblem, before: DayTimes, after: DayTimes): KnockOn {
  const labels = new Map(problem.visits.map((visit) => [visit.id, visit.label]));
  const was = stopsByVisit(before);
  const is = stopsByVisit(after);
  const arrivals: ArrivalChange[] = [];
  const promises: PromiseChange[] = [];
  for (const { id: visitId } of problem.visits) {
    const old = was.get(visitId);
    const now = is.get(visitId);
    const label = labels.get(visitId)!;
    if (old?.vanId !== now?.vanId || old?.stop.arriveSeconds !== now?.stop.arriveSeconds)
      arrivals.push({
        visitId,
        label,
        vanBeforeId: old?.vanId ?? null,
        vanAfterId: now?.vanId ?? null,
        arriveBeforeSeconds: old?.stop.arriveSeconds ?? null,
        arriveAfterSeconds: now?.stop.arriveSeconds ?? null,
      });
    const beforePermille = old?.stop.onTimePermille ?? null;
    const afterPermille = now?.stop.onTimePermille ?? null;
    if (beforePermille !== afterPermille)
      promises.push({ visitId, label, beforePermille, afterPermille });
  }
  return {
    driveSeconds: after.driveSeconds - before.driveSeconds,
    driveMetres: after.driveMetres - before.driveMetres,
    waitSeconds: after.waitSeconds - before.waitSeconds,
    overtimeSeconds: sumOvertime(after) - sumOvertime(before),
    runs: runChanges(problem, before, after),
    arrivals,
    promises,
    ...refillChanges(problem, before, after),
    newlyBroken: worse(before, after),
    mended: brokenOf(before).filter((old) => !brokenOf(after).some((now) => sameRule(old, now))),
  };
}

function stopsByVisit(times: DayTimes): Map<string, { vanId: string; stop: StopTimes }> {
  const found = new Map<string, { vanId: string; stop: StopTimes }>();
  for (const run of times.runs)
    for (const stop of run.stops)
      if (stop.kind === 'visit') found.set(stop.stopId, { vanId: run.vanId, stop });
  return found;
}

function runChanges(problem: DayProblem, before: DayTimes, after: DayTimes): RunChange[] {
  return problem.vans.flatMap((van) => {
    const old = before.runs.find((run) => run.vanId === van.vanId);
    const now = after.runs.find((run) => run.vanId === van.vanId);
    const shape = (run: typeof old) =>
      run ? [run.finishSeconds, ...run.stops.flatMap((s) => [s.stopId, s.endSeconds])] : [];
    if (shape(old).join() === shape(now).join()) return [];
    return {
      vanId: van.vanId,
      vanName: van.vanName,
      finishBeforeSeconds: old?.finishSeconds ?? van.startSeconds,
      finishAfterSeconds: now?.finishSeconds ?? van.startSeconds,
      driveSeconds: (now?.driveSeconds ?? 0) - (old?.driveSeconds ?? 0),
    };
  });
}

function refillChanges(problem: DayProblem, before: DayTimes, after: DayTimes) {
  const old = refillsOf(problem, before);
  const now = refillsOf(problem, after);
  const key = (refill: RefillChange) => `${refill.vanId} ${refill.placeId}`;
  const minus = (one: RefillChange[], other: RefillChange[]) => {
    const left = other.map(key);
    return one.filter((refill) => {
      const at = left.indexOf(key(refill));
      if (at >= 0) left.splice(at, 1);
      return at < 0;
    });
  };
  return { refillsAdded: minus(now, old), refillsRemoved: minus(old, now) };
}

function refillsOf(problem: DayProblem, times: DayTimes): RefillChange[] {
  return times.runs.flatMap((run) =>
    run.stops.flatMap((stop) => {
      const place = problem.refills.find((each) => each.point === stop.point);
      if (stop.kind !== 'refill' || !place) return [];
      const vanName = problem.vans.find((van) => van.vanId === run.vanId)?.vanName ?? run.vanId;
      return { vanId: run.vanId, vanName, placeId: place.id, placeName: place.name };
    }),
  );
}

function worse(before: DayTimes, after: DayTimes): BrokenRule[] {
  const old = brokenOf(before);
  return brokenOf(after).filter(
    (now) => !old.some((each) => sameRule(each, now) && each.byAmount >= now.byAmount),
  );
}

function brokenOf(times: DayTimes): BrokenRule[] {
  return times.runs.flatMap((run) => run.broken);
}

function sameRule(one: BrokenRule, other: BrokenRule): boolean {
  return one.rule === other.rule && one.vanId === other.vanId && one.stopId === other.stopId;
}

function sumOvertime(times: DayTimes): number {
  return times.runs.reduce((sum, run) => sum + run.overtimeSeconds, 0);
}
