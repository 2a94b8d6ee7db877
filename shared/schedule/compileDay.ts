import { badProblem } from './badProblem.ts';
import type {
  AllowedWindow,
  DayProblem,
  DriveBand,
  RefillPlace,
  Stop,
  StopFact,
  VanShift,
  VisitFact,
} from './types.ts';

/** A stop made ready for walking: every look-up done once. `visit` and `place` are null elsewhere. */
export interface ReadyStop {
  id: string;
  kind: Stop['kind'];
  /** −1: no place of its own (meal, rest). */
  point: number;
  lengthSeconds: number;
  visit: ReadyVisit | null;
  place: RefillPlace | null;
  pinned: boolean;
  fact: StopFact | null;
}

/** A visit with its per-van numbers in arrays by van index. */
export interface ReadyVisit {
  index: number;
  fact: VisitFact;
  /** 0: the van lacks nothing; else how many static hard rules it would break. */
  staticBroken: Uint8Array;
  otherGroomer: Uint8Array;
  /** The van it was sent to, −1 when none. */
  sentVan: number;
  workMean: Float64Array;
  workVariance: Float64Array;
  /** Latest of promise start and pin start; −1 when neither. */
  notBefore: number;
  windows: AllowedWindow[];
}

/** A day with its look-ups done. Made once per problem, shared by every evaluation of it. */
export interface ReadyDay {
  problem: DayProblem;
  pointCount: number;
  base: readonly number[];
  metres: readonly number[];
  bands: readonly DriveBand[];
  /** The fastest band: a floor under driving. */
  leastPermille: number;
  cvPermille: number;
  vanIndex: Map<string, number>;
  visitIndex: Map<string, number>;
  visits: ReadyVisit[];
  visitStops: ReadyStop[];
  facts: Map<string, StopFact>;
}

const known = new WeakMap<DayProblem, { day: ReadyDay; parts: unknown[] }>();

/**
 * The day's look-ups; remembered per problem object. Treat a `DayProblem` as a value: replace its
 * parts (`{...problem, nowSeconds}`), never write into its arrays.
 * Throws a RangeError naming the field when the problem contradicts itself.
 */
export function compileDay(problem: DayProblem): ReadyDay {
  const parts = [
    problem.points,
    problem.drive,
    problem.vans,
    problem.visits,
    problem.refills,
    problem.weights,
    problem.nowSeconds,
    problem.facts,
    problem.sent,
  ];
  const seen = known.get(problem);
  if (seen && seen.parts.every((part, i) => part === parts[i])) return seen.day;
  const wrong = badProblem(problem);
  if (wrong) throw new RangeError(wrong);
  const day = makeReady(problem);
  known.set(problem, { day, parts });
  return day;
}

/** A plan's stop made ready. Throws a RangeError for a stop the problem does not know. */
export function readyStop(day: ReadyDay, stop: Stop, vanId: string): ReadyStop {
  const fact = factOf(day, stop.id, vanId);
  if (stop.kind === 'visit') {
    const index = day.visitIndex.get(stop.visitId);
    if (index === undefined)
      throw new RangeError(`visitId: '${stop.visitId}' is no visit of this day`);
    const ready = day.visitStops[index]!;
    if (!fact && !stop.pinned && stop.id === ready.id) return ready;
    return { ...ready, id: stop.id, fact, pinned: stop.pinned === true };
  }
  const place =
    stop.kind === 'refill'
      ? day.problem.refills.find((refill) => refill.id === stop.placeId)
      : undefined;
  if (stop.kind === 'refill' && !place)
    throw new RangeError(`placeId: '${stop.placeId}' is no refill place of this day`);
  const meal = stop.kind === 'meal' ? day.problem.vans[day.vanIndex.get(vanId)!]!.meal : null;
  return {
    id: stop.id,
    kind: stop.kind,
    point: place ? place.point : stop.kind === 'errand' ? stop.point : -1,
    lengthSeconds: place
      ? place.lengthSeconds
      : stop.kind === 'meal'
        ? (meal?.lengthSeconds ?? 0)
        : 'lengthSeconds' in stop
          ? stop.lengthSeconds
          : 0,
    visit: null,
    place: place ?? null,
    pinned: stop.pinned === true,
    fact,
  };
}

/** The facts a van tapped for a stop; null when nothing was tapped yet. */
export function factOf(day: ReadyDay, stopId: string, vanId: string): StopFact | null {
  const fact = day.facts.get(stopId);
  return fact && fact.vanId === vanId ? fact : null;
}

function makeReady(problem: DayProblem): ReadyDay {
  const vanIndex = new Map(problem.vans.map((van, i) => [van.vanId, i]));
  const sentVan = new Map<string, number>();
  for (const run of problem.sent?.runs ?? [])
    for (const stop of run.stops)
      if (stop.kind === 'visit') sentVan.set(stop.visitId, vanIndex.get(run.vanId) ?? -1);
  const visits = problem.visits.map((fact, index) =>
    readyVisit(fact, index, problem.vans, sentVan.get(fact.id) ?? -1),
  );
  const started = problem.facts.filter(
    (fact) =>
      fact.drivingSinceSeconds !== null ||
      fact.arrivedSeconds !== null ||
      fact.workingSinceSeconds !== null ||
      fact.leftSeconds !== null ||
      fact.failedReason !== null,
  );
  return {
    problem,
    pointCount: problem.points.length,
    base: problem.drive.baseSeconds,
    metres: problem.drive.metres,
    bands: problem.drive.bands,
    leastPermille: Math.min(...problem.drive.bands.map((band) => band.permille)),
    cvPermille: problem.drive.cvPermille,
    vanIndex,
    visitIndex: new Map(problem.visits.map((visit, i) => [visit.id, i])),
    visits,
    visitStops: visits.map((visit) => ({
      id: visit.fact.id,
      kind: 'visit' as const,
      point: visit.fact.point,
      lengthSeconds: 0,
      visit,
      place: null,
      pinned: false,
      fact: null,
    })),
    facts: new Map(started.map((fact) => [fact.stopId, fact])),
  };
}

function readyVisit(fact: VisitFact, index: number, vans: VanShift[], sentVan: number): ReadyVisit {
  const work = vans.map((van) => fact.workByGroomer[van.groomerId] ?? fact.work);
  return {
    index,
    fact,
    staticBroken: Uint8Array.from(vans, (van) => staticRules(fact, van)),
    otherGroomer: Uint8Array.from(vans, (van) =>
      fact.preferredGroomerIds.length > 0 && !fact.preferredGroomerIds.includes(van.groomerId)
        ? 1
        : 0,
    ),
    sentVan,
    workMean: Float64Array.from(work, (spread) => spread.meanSeconds),
    workVariance: Float64Array.from(work, (spread) => spread.varianceSeconds2),
    notBefore: Math.max(fact.promise?.startSeconds ?? -1, fact.pin?.startSeconds ?? -1),
    windows: [...fact.allowed].sort((a, b) => a.startSeconds - b.startSeconds),
  };
}

function staticRules(visit: VisitFact, van: VanShift): number {
  return (
    (visit.needs.every((skill) => van.skills.includes(skill)) ? 0 : 1) +
    (visit.heaviestGrams > van.tableLimitGrams ? 1 : 0) +
    (visit.barredGroomerIds.includes(van.groomerId) ? 1 : 0) +
    (visit.pin?.vanId !== undefined && visit.pin.vanId !== van.vanId ? 1 : 0)
  );
}
