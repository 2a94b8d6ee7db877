import {
  simulateVisit,
  drawCoatStylePermille,
  drawDoorPermille,
  drawHiddenGroomer,
  drawHiddenPet,
} from '#shared/grooming/simulateVisit.ts';
import { normalDraw } from '#shared/grooming/normalDraw.ts';
import type { DayProblem } from '#shared/schedule/types.ts';
import { secondsToInstant } from '#shared/time/wallSeconds.ts';
import { newId } from '#server/db/newId.ts';
import type { Business } from '#server/models/Business.ts';
import type { RunVersion } from '#server/models/RunVersion.ts';
import { petFactsOf } from '#server/services/households/petFactsOf.ts';
import type { PhoneEvent } from '#server/services/runs/addRunEvents.ts';
import type { VisitFacts } from '#server/services/visits/visitFacts.ts';
import { randomFor } from './randomFor.ts';

interface RunToWork {
  business: Business;
  version: RunVersion;
  visits: VisitFacts[];
  lastVisits: ReadonlyMap<string, string>;
  groomerName: string;
  weeksSinceStart: number;
}

/** Spread of a drive (log-normal), and how often nobody opens the door: part of the fixed model. */
const driveSigma = 0.2;
const noAnswerShare = 0.015;
const noAnswerSeconds = 600;

/**
 * One past run's taps, drawn from the documented model: hidden effects of groomer, pet, coat and
 * style, and door; heavy tails; drift; forgotten timers. The stream is fixed by date and van.
 */
export function simulateRun(work: RunToWork): PhoneEvent[] {
  const { problem, plan } = work.version;
  const van = problem.vans[0]!;
  const random = randomFor(`run ${problem.date} ${van.vanName}`);
  const tap = tapper(work);
  let clock = van.startSeconds + van.loadSeconds + Math.round(random() * 300);
  let point = van.startPoint;
  for (const stop of plan.runs[0]?.stops ?? []) {
    const target = pointOf(problem, stop);
    if (target !== null && target !== point) {
      tap(stop.id, clock, { kind: 'startDriving' });
      const planned = problem.drive.baseSeconds[point * problem.points.length + target]!;
      clock += Math.round(planned * Math.exp(driveSigma * normalDraw(random)));
      point = target;
    }
    tap(stop.id, clock, { kind: 'arrived' });
    clock =
      stop.kind === 'visit'
        ? workVisit(work, stop.visitId, clock, random, tap)
        : clock + lengthOf(problem, stop);
    if (stop.kind !== 'visit') tap(stop.id, clock, { kind: 'stopDone', note: '' });
    clock += Math.round(random() * 60);
  }
  return tap.events;
}

type Plan = RunVersion['plan'];
type AnyStop = Plan['runs'][number]['stops'][number];
type Tap = ReturnType<typeof tapper>;

function workVisit(
  work: RunToWork,
  visitId: string,
  arrived: number,
  random: () => number,
  tap: Tap,
): number {
  const facts = work.visits.find(({ visit }) => visit.id === visitId)!;
  const planned = work.version.problem.visits.find((visit) => visit.id === visitId)!;
  let clock = Math.max(arrived, planned.promise?.startSeconds ?? 0);
  if (random() < noAnswerShare) {
    tap(visitId, clock + noAnswerSeconds, { kind: 'cannotDo', reason: 'noAnswer', note: '' });
    return clock + noAnswerSeconds;
  }
  const on = new Date(`${facts.visit.date}T12:00:00Z`);
  const drawn = simulateVisit({
    pets: facts.pets.map(({ pet, style }) => ({
      petId: pet.id,
      name: pet.name,
      pet: petFactsOf(pet, on, work.lastVisits.get(pet.id) ?? null),
      style,
      hidden: drawHiddenPet(randomFor(`pet ${facts.household.name} ${pet.name} ${pet.breedId}`)),
      coatStylePermille: drawCoatStylePermille(randomFor(`coat ${facts.visit.forecast.coatStyle}`)),
    })),
    groomer: drawHiddenGroomer(randomFor(`groomer ${work.groomerName}`)),
    doorPermille: drawDoorPermille(randomFor(`door ${facts.household.addressLabel}`)),
    weeksSinceStart: work.weeksSinceStart,
    random,
    options: {
      // As usual, not as booked: the door is drawn, and what was learned of it must not come on top.
      setUpSeconds: work.business.setUpMinutes * 60,
      cleanDownSeconds: work.business.cleanDownMinutes * 60,
    },
  });
  clock += drawn.setUpSeconds;
  for (const { pet } of facts.pets) {
    tap(visitId, clock, { kind: 'petOnTable', petId: pet.id });
    for (const step of drawn.steps.filter((one) => one.petId === pet.id)) {
      // A forgotten timer: the tap comes with the step before, or not at all.
      if (step.recordedSeconds === 0)
        tap(visitId, clock, { kind: 'stepDone', petId: pet.id, stepKey: step.key });
      clock += step.actualSeconds;
      if (step.recordedSeconds === step.actualSeconds)
        tap(visitId, clock, { kind: 'stepDone', petId: pet.id, stepKey: step.key });
    }
    tap(visitId, clock, { kind: 'petDone', petId: pet.id });
    clock += Math.round(drawn.disinfectSeconds / Math.max(1, facts.pets.length));
  }
  clock += drawn.cleanDownSeconds;
  tap(visitId, clock, { kind: 'stopDone', note: '' });
  return clock;
}

/** What a tap adds to the common fields, by kind. */
type TapBody = PhoneEvent extends infer Event
  ? Event extends PhoneEvent
    ? Omit<
        Event,
        'id' | 'v' | 'deviceId' | 'deviceSeq' | 'deviceAt' | 'offsetMs' | 'runVersion' | 'stopId'
      >
    : never
  : never;

function tapper(work: RunToWork) {
  const { problem, version } = work.version;
  const deviceId = deviceOf(work.groomerName);
  const events: PhoneEvent[] = [];
  const tap = (stopId: string, seconds: number, body: TapBody) => {
    events.push({
      id: newId(),
      v: 1,
      deviceId,
      deviceSeq: Date.parse(problem.dayStartUtc) / 1000 + events.length,
      deviceAt: secondsToInstant(problem.dayStartUtc, seconds),
      offsetMs: 0,
      runVersion: version,
      stopId,
      ...body,
    } as PhoneEvent);
  };
  return Object.assign(tap, { events });
}

/** One phone per groomer, the same in every run. */
function deviceOf(name: string): string {
  const random = randomFor(`device ${name}`);
  const hex = () => Math.floor(random() * 16).toString(16);
  return 'xxxxxxxx-xxxx-4xxx-8xxx-xxxxxxxxxxxx'.replace(/x/g, hex);
}

function pointOf(problem: DayProblem, stop: AnyStop): number | null {
  if (stop.kind === 'visit')
    return problem.visits.find((visit) => visit.id === stop.visitId)!.point;
  if (stop.kind === 'refill')
    return problem.refills.find((place) => place.id === stop.placeId)!.point;
  return stop.kind === 'errand' ? stop.point : null;
}

function lengthOf(problem: DayProblem, stop: AnyStop): number {
  if (stop.kind === 'refill')
    return problem.refills.find((place) => place.id === stop.placeId)!.lengthSeconds;
  if (stop.kind === 'meal') return problem.vans[0]!.meal?.lengthSeconds ?? 1800;
  return 'lengthSeconds' in stop ? stop.lengthSeconds : 0;
}
