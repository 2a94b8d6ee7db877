import { promiseWindow, type WindowShape } from '#shared/forecast/promiseWindow.ts';
import { applyMove } from './applyMove.ts';
import { compileDay } from './compileDay.ts';
import { evaluateRun } from './evaluateDay.ts';
import type { DayProblem, Plan, Run, RunTimes, StopTimes, VisitFact } from './types.ts';

/** A place for one more visit in a day, and what it costs. */
export interface DayOffer {
  vanId: string;
  /** Where among the run's visits it goes; `placeVisit` with it makes the same run. */
  index: number;
  /** The window to promise, seconds of the day. */
  startSeconds: number;
  endSeconds: number;
  arriveSeconds: number;
  /** The van's driving with it, less its driving without. */
  driveSecondsMore: number;
  /** A leg to or from it is a straight-line estimate. */
  rough: boolean;
  /** Chance to arrive before the window ends. */
  onTimePermille: number;
  /** The least chance among the van's other promises; null when it has none. */
  othersOnTimePermille: number | null;
}

export interface OfferLimits {
  /** Insertions tried in full, those with the least detour first; default 24. */
  mostTrials?: number;
  /** Offers kept a van; default 1. */
  perVan?: number;
  /** What the offer's own promise must reach; default 850. */
  leastOnTimePermille?: number;
  window?: WindowShape;
}

/** As in the day's count of safe promises: none may fall below by an offer. */
const safePermille = 900;

/**
 * Where one more visit fits, found by trying: least added driving first. `visit.point` is a point of
 * the problem; the visit itself is in neither problem nor plan. Kept are insertions that break no
 * hard rule not broken before, push no other promise from safe to at risk, and can be promised.
 * Throws a RangeError for a visit the day already has.
 */
export function findOffers(
  problem: DayProblem,
  plan: Plan,
  visit: VisitFact,
  limits: OfferLimits = {},
): DayOffer[] {
  if (problem.visits.some(({ id }) => id === visit.id))
    throw new RangeError(`visit.id: '${visit.id}' is a visit of this day already`);
  const asked: DayProblem = {
    ...problem,
    visits: [...problem.visits, { ...visit, promise: null }],
  };
  const start: Plan = {
    runs: problem.vans.map(
      ({ vanId }) => plan.runs.find((run) => run.vanId === vanId) ?? { vanId, stops: [] },
    ),
    notPlaced: [...plan.notPlaced, visit.id],
  };
  const before = new Map(
    start.runs.map((run) => [run.vanId, evaluateRun(asked, run).times] as const),
  );
  const tries = placesByDetour(asked, start, visit).slice(0, limits.mostTrials ?? 24);
  const found = tries
    .flatMap((place) => tryPlace(asked, start, visit.id, place, before.get(place.vanId)!) ?? [])
    .sort((a, b) => a.more - b.more || a.place.index - b.place.index);
  const perVan = new Map<string, number>();
  const offers: DayOffer[] = [];
  for (const trial of found) {
    const taken = perVan.get(trial.place.vanId) ?? 0;
    if (taken >= (limits.perVan ?? 1)) continue;
    const offer = promised(asked, visit, trial, limits);
    if (!offer) continue;
    perVan.set(trial.place.vanId, taken + 1);
    offers.push(offer);
  }
  return offers;
}

interface Place {
  vanId: string;
  index: number;
  detour: number;
}

interface Trial {
  place: Place;
  run: Run;
  before: RunTimes;
  stop: StopTimes;
  more: number;
}

/** Every place in vans that can take it at all, by the straight detour between its neighbours. */
function placesByDetour(problem: DayProblem, plan: Plan, visit: VisitFact): Place[] {
  const day = compileDay(problem);
  const ready = day.visits.at(-1)!;
  const base = (from: number, to: number) => day.base[from * day.pointCount + to]!;
  const places = problem.vans.flatMap((van, vanIndex): Place[] => {
    if (ready.staticBroken[vanIndex]! > 0) return [];
    const { stops } = plan.runs.find((run) => run.vanId === van.vanId)!;
    const points = stops.flatMap((stop) =>
      stop.kind === 'visit' ? day.visits[day.visitIndex.get(stop.visitId)!]!.fact.point : [],
    );
    return [...points, van.endPoint].map((next, index) => {
      const last = index === 0 ? van.startPoint : points[index - 1]!;
      const through = base(last, visit.point) + base(visit.point, next);
      return { vanId: van.vanId, index, detour: through - base(last, next) };
    });
  });
  return places.sort((a, b) => a.detour - b.detour);
}

function tryPlace(
  problem: DayProblem,
  plan: Plan,
  visitId: string,
  place: Place,
  before: RunTimes,
): Trial | null {
  const { vanId, index } = place;
  const { plan: next, refusedBecause } = applyMove(problem, plan, {
    kind: 'placeVisit',
    visitId,
    vanId,
    index,
  });
  if (refusedBecause !== undefined) return null;
  const run = next.runs.find((one) => one.vanId === vanId)!;
  const after = evaluateRun(problem, run).times;
  if (hardRules(after) > hardRules(before)) return null;
  const stop = after.stops.find((one) => one.stopId === visitId)!;
  return { place, run, before, stop, more: after.driveSeconds - before.driveSeconds };
}

/** The trial with its window promised: waiting for the window's start may delay what comes after. */
function promised(
  problem: DayProblem,
  visit: VisitFact,
  trial: Trial,
  limits: OfferLimits,
): DayOffer | null {
  // A tenth lies before the early and a tenth after the late arrival: 1.2816 standard deviations.
  const sigma = (trial.stop.arriveLateSeconds - trial.stop.arriveEarlySeconds) / 2.5632;
  const { startSeconds, endSeconds } = promiseWindow(
    {
      meanSeconds: trial.stop.arriveSeconds,
      varianceSeconds2: Math.round(sigma * sigma),
      thirdSeconds3: 0,
    },
    limits.window,
  );
  const told = {
    ...problem,
    visits: problem.visits.with(-1, {
      ...visit,
      promise: { startSeconds, endSeconds, version: 1 },
    }),
  };
  const after = evaluateRun(told, trial.run).times;
  if (hardRules(after) > hardRules(trial.before)) return null;
  const at = after.stops.findIndex((one) => one.stopId === visit.id);
  const stop = after.stops[at]!;
  const others = after.stops.filter((one) => one !== stop && one.onTimePermille !== null);
  const chances = new Map(trial.before.stops.map((one) => [one.stopId, one.onTimePermille]));
  const isWorse = others.some(
    (one) => one.onTimePermille! < Math.min(chances.get(one.stopId) ?? 0, safePermille),
  );
  if (isWorse || stop.onTimePermille! < (limits.leastOnTimePermille ?? 850)) return null;
  return {
    vanId: trial.place.vanId,
    index: trial.place.index,
    startSeconds,
    endSeconds,
    arriveSeconds: stop.arriveSeconds,
    driveSecondsMore: after.driveSeconds - trial.before.driveSeconds,
    rough: stop.rough || (after.stops[at + 1]?.rough ?? after.homeRough),
    onTimePermille: stop.onTimePermille!,
    othersOnTimePermille:
      others.length > 0 ? Math.min(...others.map((one) => one.onTimePermille!)) : null,
  };
}

function hardRules(times: RunTimes): number {
  return times.broken.filter((broken) => broken.hard && !broken.inherited).length;
}
