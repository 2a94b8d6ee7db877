import type { RunDetail, RunEvent } from '#shared/api/runs.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { reduceEvents, type StopHappened, type StopState } from '#shared/schedule/reduceEvents.ts';
import type { DayProblem, PromiseWindow, RunTimes, StopTimes } from '#shared/schedule/types.ts';
import { withHappened } from '#shared/schedule/withHappened.ts';
import { instantToSeconds } from '#shared/time/wallSeconds.ts';
import { writeList } from '#src/lib/words.ts';
import { atHousehold } from './householdWords.ts';

export type RunVisit = RunDetail['visits'][number];
export type RunPlace = RunDetail['places'][number];

/** One stop of the run as the phone shows it. */
export interface RunStop {
  stopId: string;
  kind: StopTimes['kind'];
  /** 1-based, in the order driven. */
  number: number;
  state: StopState;
  times: StopTimes;
  happened: StopHappened | null;
  visit: RunVisit | null;
  place: RunPlace | null;
  lat: number;
  lon: number;
  promise: PromiseWindow | null;
  /** "Clover at the Adeyemis'", "Water at Quay Yard", "Meal". */
  title: string;
  addressLabel: string;
}

export interface RunView {
  problem: DayProblem;
  nowSeconds: number;
  times: RunTimes;
  stops: RunStop[];
  /** The stop under way, else the next one; null when all are over. */
  current: RunStop | null;
  /** Ahead and not the current one. */
  later: RunStop[];
}

/**
 * A run as it stands now: what was sent, laid over with what happened (events of the server and the
 * phone's own queue; an id counts once), forecast on from `nowMs` of the server's clock. null while
 * nothing was sent.
 */
export function runView(
  run: RunDetail,
  events: readonly RunEvent[],
  nowMs: number,
): RunView | null {
  if (!run.problem || !run.plan) return null;
  const happened = reduceEvents(events, {
    vanId: run.vanId,
    dayStartUtc: run.problem.dayStartUtc,
  });
  const nowSeconds = instantToSeconds(run.problem.dayStartUtc, nowMs);
  const { problem, plan } = withHappened(run.problem, run.plan, run.vanId, happened, nowSeconds);
  const times = evaluateDay(problem, plan).runs.find(({ vanId }) => vanId === run.vanId);
  if (!times) return null;
  const planned = plan.runs.find(({ vanId }) => vanId === run.vanId)?.stops ?? [];
  const stops = times.stops.map((stop, index): RunStop => {
    const plannedStop = planned[index];
    const visitId = plannedStop?.kind === 'visit' ? plannedStop.visitId : null;
    const visit = run.visits.find(({ id }) => id === visitId) ?? null;
    const placeId = plannedStop?.kind === 'refill' ? plannedStop.placeId : null;
    const place = run.places.find(({ id }) => id === placeId) ?? null;
    const refill = problem.refills.find(({ id }) => id === placeId);
    const point = problem.points[stop.point];
    const fact = problem.visits.find(({ id }) => id === visitId);
    return {
      stopId: stop.stopId,
      kind: stop.kind,
      number: index + 1,
      state: happened.stops.get(stop.stopId)?.state ?? 'ahead',
      times: stop,
      happened: happened.stops.get(stop.stopId) ?? null,
      visit,
      place,
      lat: visit?.lat ?? point?.lat ?? 0,
      lon: visit?.lon ?? point?.lon ?? 0,
      promise: fact?.promise ?? null,
      title: titleOf(stop.kind, visit, place?.name ?? refill?.name ?? null, fact?.label),
      addressLabel: visit?.addressLabel ?? place?.addressLabel ?? '',
    };
  });
  const open = stops.filter(({ state }) => state !== 'done' && state !== 'failed');
  const current = open.find(({ stopId }) => stopId === happened.currentStopId) ?? open[0] ?? null;
  return {
    problem,
    nowSeconds,
    times,
    stops,
    current,
    later: open.filter((stop) => stop !== current),
  };
}

function titleOf(
  kind: StopTimes['kind'],
  visit: RunVisit | null,
  placeName: string | null,
  label = 'Visit',
): string {
  if (visit)
    return `${writeList(visit.pets.map(({ name }) => name))} at ${atHousehold(visit.householdName)}`;
  if (kind === 'refill') return placeName ? `Water at ${placeName}` : 'Water';
  if (kind === 'meal') return 'Meal';
  if (kind === 'rest') return 'Rest';
  if (kind === 'errand') return 'Errand';
  return label;
}
