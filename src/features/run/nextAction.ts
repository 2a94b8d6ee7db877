import type { Tap } from '#src/offline/EventQueue.ts';
import { householdWords } from './householdWords.ts';
import type { RunStop, RunVisit } from './runView.ts';

/** What the big button does next, and the taps it makes. */
export interface NextAction {
  words: string;
  taps: Tap[];
}

export type RunPet = RunVisit['pets'][number];
export type RunStep = RunVisit['steps'][number];

/** The pet on the table with its steps, or the one to be put there next. */
export interface PetAtWork {
  pet: RunPet;
  steps: RunStep[];
  /** Seconds of the day; null until on the table. */
  startedSeconds: number | null;
  /** Steps with their clock, in the order tapped. */
  done: { step: RunStep; tookSeconds: number }[];
  /** The step under way: the first not done. null when none is left or the visit has no steps. */
  step: RunStep | null;
  stepSinceSeconds: number | null;
}

/** The pet being worked on, or waiting to be; null when all are done or the stop is no visit. */
export function petAtWork(stop: RunStop): PetAtWork | null {
  const { visit, happened } = stop;
  if (!visit) return null;
  const clocks = happened?.pets ?? [];
  const clockOf = (petId: string) => clocks.find((clock) => clock.petId === petId);
  const onTable = visit.pets.find((pet) => clockOf(pet.id)?.doneSeconds === null);
  const pet = onTable ?? visit.pets.find(({ id }) => !clockOf(id));
  if (!pet) return null;
  const clock = clockOf(pet.id);
  const steps = visit.steps.filter(({ petId }) => petId === pet.id);
  const done = (clock?.steps ?? []).flatMap(({ stepKey, tookSeconds }) => {
    const step = steps.find(({ key }) => key === stepKey);
    return step ? [{ step, tookSeconds }] : [];
  });
  const step = clock
    ? (steps.find(({ key }) => !clock.steps.some(({ stepKey }) => stepKey === key)) ?? null)
    : null;
  return {
    pet,
    steps,
    startedSeconds: clock?.startedSeconds ?? null,
    done,
    step,
    stepSinceSeconds: clock ? (clock.steps.at(-1)?.endSeconds ?? clock.startedSeconds) : null,
  };
}

/** The one thing to do next at a stop; null when it is over. Three taps a stop are enough. */
export function nextAction(stop: RunStop): NextAction | null {
  const { stopId, state } = stop;
  if (state === 'done' || state === 'failed') return null;
  if (state === 'ahead' && stop.times.driveSeconds > 0) {
    const asked = mayText(stop.visit);
    const text = asked && stop.visit ? ` · text ${householdWords(stop.visit.householdName)}` : '';
    return { words: `Start driving${text}`, taps: [{ kind: 'startDriving', stopId }] };
  }
  if (state === 'ahead' || state === 'driving')
    return { words: beginWords(stop), taps: [{ kind: 'arrived', stopId }] };
  const work = petAtWork(stop);
  if (!work) return { words: endWords(stop), taps: [doneTap(stopId)] };
  const petId = work.pet.id;
  if (work.startedSeconds === null)
    return {
      words: `${work.pet.name} on the table`,
      taps: [{ kind: 'petOnTable', stopId, petId }],
    };
  const left = work.steps.length - work.done.length;
  if (work.step && left > 1)
    return {
      words: 'Section done',
      taps: [{ kind: 'stepDone', stopId, petId, stepKey: work.step.key }],
    };
  const last: Tap[] = work.step
    ? [{ kind: 'stepDone', stopId, petId, stepKey: work.step.key }]
    : [];
  return {
    words: `${work.pet.name} is done`,
    taps: [...last, { kind: 'petDone', stopId, petId }],
  };
}

/** The short way: from arrival on, the whole stop can be closed with one tap. */
export function mayFinish(stop: RunStop): boolean {
  return (
    (stop.state === 'arrived' || stop.state === 'working') &&
    nextAction(stop)?.taps[0]?.kind !== 'stopDone'
  );
}

export function doneTap(stopId: string): Tap {
  return { kind: 'stopDone', stopId, note: '' };
}

/** A text goes out only with consent and a number to send it to. */
export function mayText(visit: RunVisit | null): boolean {
  return visit !== null && visit.textsConsent && visit.phone !== null;
}

function beginWords(stop: RunStop): string {
  if (stop.kind === 'meal') return 'Start the meal';
  if (stop.kind === 'rest') return 'Start the rest';
  return 'Arrived';
}

function endWords(stop: RunStop): string {
  if (stop.kind === 'meal') return 'Meal over';
  if (stop.kind === 'rest') return 'Rest over';
  if (stop.kind === 'refill') return 'Filled and emptied · done here';
  return 'Done here';
}
