import { orderEvents, type DeviceEvent } from './orderEvents.ts';
import type { StopFact } from './types.ts';

/** A groomer's tap; the wire's `RunEvent` fits. */
export type TapEvent = DeviceEvent & { stopId: string } & (
    | { kind: 'startDriving' | 'arrived' }
    | { kind: 'petOnTable' | 'petDone'; petId: string }
    | { kind: 'stepDone'; petId: string; stepKey: string }
    | { kind: 'stopDone'; note: string }
    | { kind: 'cannotDo'; reason: string; note: string }
  );

export interface StepClock {
  stepKey: string;
  endSeconds: number;
  /** Since the step before ended, or since the pet was put on the table. */
  tookSeconds: number;
}

/** One pet's stopwatch at a stop. */
export interface PetClock {
  petId: string;
  startedSeconds: number;
  /** No tap said so: taken from the tap before. Such clocks teach nothing about pace. */
  startImplied: boolean;
  doneSeconds: number | null;
  doneImplied: boolean;
  steps: StepClock[];
}

export type StopState = 'ahead' | 'driving' | 'arrived' | 'working' | 'done' | 'failed';

export interface StopHappened {
  stopId: string;
  state: StopState;
  fact: StopFact;
  pets: PetClock[];
  note: string;
  /** Facts no tap gave: forgotten taps filled in from the next one. */
  implied: ('arrived' | 'left')[];
}

/** What happened on one van's run so far. */
export interface RunHappened {
  /** For `DayProblem.facts`, in the order the stops were first touched. */
  facts: StopFact[];
  stops: Map<string, StopHappened>;
  /** The stop being driven to or worked at. */
  currentStopId: string | null;
}

/**
 * The one reducer of a run's taps: phone, server and review read the same facts from it. The answer
 * does not depend on the order or number of times events arrive. Three taps a stop are enough
 * (start driving, arrived, done); a forgotten one is filled in from the next and named in `implied`.
 */
export function reduceEvents(
  events: readonly TapEvent[],
  { vanId, dayStartUtc }: { vanId: string; dayStartUtc: string },
): RunHappened {
  const dayStartMs = Date.parse(dayStartUtc);
  if (Number.isNaN(dayStartMs))
    throw new RangeError(`dayStartUtc: '${dayStartUtc}' is not an ISO instant`);
  const stops = new Map<string, StopHappened>();
  let current: StopHappened | null = null;
  for (const { event, atMs } of orderEvents(events)) {
    const at = Math.floor((atMs - dayStartMs) / 1000);
    let stop = stops.get(event.stopId);
    if (!stop) stops.set(event.stopId, (stop = untouched(event.stopId, vanId)));
    if (!takes(stop, event)) continue;
    // Closing another stop (given up in advance, say) moves nobody; every other tap does.
    const moves = event.kind !== 'cannotDo' && event.kind !== 'stopDone';
    if (moves && current && current !== stop)
      leaveBehind(current, stop.fact.drivingSinceSeconds ?? at);
    apply(stop, event, at);
    stop.state = stateOf(stop.fact);
    if (stop.state !== 'done' && stop.state !== 'failed') current = stop;
    else if (current === stop) current = null;
  }
  return {
    facts: [...stops.values()].filter(({ state }) => state !== 'ahead').map(({ fact }) => fact),
    stops,
    currentStopId: current?.stopId ?? null,
  };
}

/** Work that was done stays done; a stop given up may be taken up again. */
function takes(stop: StopHappened, event: TapEvent): boolean {
  if (stop.state === 'done') return false;
  return stop.state !== 'failed' || event.kind !== 'cannotDo';
}

function apply(stop: StopHappened, event: TapEvent, at: number): void {
  const { fact } = stop;
  if (stop.state === 'failed') {
    fact.leftSeconds = null;
    fact.failedReason = null;
  }
  switch (event.kind) {
    case 'startDriving':
      if (fact.arrivedSeconds === null) fact.drivingSinceSeconds ??= at;
      return;
    case 'arrived':
      fact.arrivedSeconds ??= at;
      return;
    case 'petOnTable':
      return startPet(stop, event.petId, at, false);
    case 'stepDone':
      return endStep(stop, event.petId, event.stepKey, at);
    case 'petDone':
      return endPet(petOf(stop, event.petId, at), at, false);
    case 'stopDone':
      arriveAtLeast(stop, at);
      closePets(stop, at);
      fact.leftSeconds = at;
      if (event.note) stop.note = event.note;
      return;
    case 'cannotDo':
      closePets(stop, at);
      fact.leftSeconds = at;
      fact.failedReason = event.reason;
      if (event.note) stop.note = event.note;
  }
}

/** Driving to or standing at another stop ends the one before, or calls the drive to it off. */
function leaveBehind(stop: StopHappened, at: number): void {
  const { fact } = stop;
  if (fact.arrivedSeconds === null) {
    fact.drivingSinceSeconds = null;
  } else {
    const left = Math.max(at, lastMark(stop));
    closePets(stop, left);
    fact.leftSeconds = left;
    stop.implied.push('left');
  }
  stop.state = stateOf(fact);
}

function startPet(stop: StopHappened, petId: string, at: number, implied: boolean): void {
  arriveAtLeast(stop, at);
  if (stop.pets.some((pet) => pet.petId === petId)) return;
  closePets(stop, at);
  stop.fact.workingSinceSeconds ??= at;
  stop.pets.push({
    petId,
    startedSeconds: at,
    startImplied: implied,
    doneSeconds: null,
    doneImplied: false,
    steps: [],
  });
}

function petOf(stop: StopHappened, petId: string, at: number): PetClock {
  if (!stop.pets.some((pet) => pet.petId === petId)) {
    arriveAtLeast(stop, at);
    startPet(stop, petId, lastMark(stop), true);
  }
  return stop.pets.find((pet) => pet.petId === petId)!;
}

function endStep(stop: StopHappened, petId: string, stepKey: string, at: number): void {
  const pet = petOf(stop, petId, at);
  if (pet.steps.some((step) => step.stepKey === stepKey)) return;
  const since = pet.steps.at(-1)?.endSeconds ?? pet.startedSeconds;
  pet.steps.push({ stepKey, endSeconds: at, tookSeconds: Math.max(0, at - since) });
}

function endPet(pet: PetClock, at: number, implied: boolean): void {
  if (pet.doneSeconds !== null && !pet.doneImplied) return;
  pet.doneSeconds = at;
  pet.doneImplied = implied;
}

function closePets(stop: StopHappened, at: number): void {
  for (const pet of stop.pets) if (pet.doneSeconds === null) endPet(pet, at, true);
}

function arriveAtLeast(stop: StopHappened, at: number): void {
  if (stop.fact.arrivedSeconds !== null) return;
  stop.fact.arrivedSeconds = at;
  stop.implied.push('arrived');
}

function lastMark({ fact, pets }: StopHappened): number {
  let mark = fact.workingSinceSeconds ?? fact.arrivedSeconds ?? 0;
  for (const pet of pets)
    mark = Math.max(mark, pet.doneSeconds ?? 0, pet.steps.at(-1)?.endSeconds ?? 0);
  return mark;
}

function stateOf(fact: StopFact): StopState {
  if (fact.failedReason !== null) return 'failed';
  if (fact.leftSeconds !== null) return 'done';
  if (fact.workingSinceSeconds !== null) return 'working';
  if (fact.arrivedSeconds !== null) return 'arrived';
  return fact.drivingSinceSeconds !== null ? 'driving' : 'ahead';
}

function untouched(stopId: string, vanId: string): StopHappened {
  return {
    stopId,
    state: 'ahead',
    fact: {
      stopId,
      vanId,
      drivingSinceSeconds: null,
      arrivedSeconds: null,
      workingSinceSeconds: null,
      leftSeconds: null,
      failedReason: null,
    },
    pets: [],
    note: '',
    implied: [],
  };
}
