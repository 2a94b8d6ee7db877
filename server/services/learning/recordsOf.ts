import type { GroomRecord } from '#shared/grooming/learning/groomRecord.ts';
import { styles } from '#shared/grooming/styles.ts';
import type { StepFamily } from '#shared/grooming/types.ts';
import type { PetClock, StepClock, StopHappened } from '#shared/schedule/reduceEvents.ts';
import { daysBetween } from '#shared/time/localDate.ts';
import type { Pet } from '#server/models/Pet.ts';
import type { Run } from '#server/models/Run.ts';
import type { Visit, VisitForecast, VisitLearning } from '#server/models/Visit.ts';
import { workSeconds } from '#server/services/runs/workSeconds.ts';
import { coatStyleOf } from '#server/services/visits/coatStyleOf.ts';

type Plain = VisitLearning['plain'][number];

/**
 * What one finished stop teaches, a record per pet whose clock can be told: its own stopwatch, or for
 * a single pet the stay less the booked set-up and clean-down. Stops given up give nothing.
 */
export function recordsOf(
  run: Pick<Run, 'groomerId' | 'date'>,
  visit: Pick<Visit, 'id' | 'forecast'>,
  stop: StopHappened,
  pets: ReadonlyMap<string, Pet>,
): GroomRecord[] {
  if (stop.state !== 'done') return [];
  const plain = visit.forecast.learning?.plain ?? plainBefore(visit.forecast, pets);
  return plain.flatMap((pet): GroomRecord[] => {
    const clock = stop.pets.find(({ petId }) => petId === pet.petId);
    const seconds = secondsOf(clock) ?? staySeconds(plain, stop, visit.forecast);
    if (seconds === null) return [];
    const { steps, restSeconds } = stepsOf(pet, clock);
    return [
      {
        visitId: visit.id,
        petId: pet.petId,
        groomerId: run.groomerId,
        breedId: pet.breedId,
        coatStyle: pet.coatStyle,
        styleId: pet.styleId,
        day: daysBetween('2020-01-01', run.date),
        forecast: { meanSeconds: pet.meanSeconds, varianceSeconds2: pet.varianceSeconds2 },
        actualSeconds: seconds,
        restSeconds,
        ended: false,
        people: 1,
        steps,
      },
    ];
  });
}

function secondsOf(clock: PetClock | undefined): number | null {
  if (!clock || clock.startImplied || clock.doneImplied || clock.doneSeconds === null) return null;
  return clock.doneSeconds - clock.startedSeconds;
}

function staySeconds(
  plain: readonly Plain[],
  stop: StopHappened,
  forecast: VisitForecast,
): number | null {
  // A stay whose ends were filled in from other taps, or with several pets in it, says too little.
  if (plain.length !== 1 || stop.implied.length > 0) return null;
  return workSeconds(stop, forecast);
}

/**
 * A step's clock counts from the tap before, so it is the step's own only when the step before it was
 * tapped too and took a believable time; a forgotten tap makes the next step look long.
 */
function stepsOf(pet: Plain, clock: PetClock | undefined) {
  const taps = clock && !clock.startImplied ? clock.steps : [];
  const restSeconds = taps
    .filter(({ stepKey }) => stepKey === 'rest')
    .reduce((sum, { tookSeconds }) => sum + tookSeconds, 0);
  const order: string[] = pet.steps.map(({ key }) => key);
  const work = taps.filter(({ stepKey }) => stepKey !== 'rest');
  const steps = pet.steps.map((step, index) => {
    const at = work.findIndex(({ stepKey }) => stepKey === step.key);
    return {
      family: step.family as StepFamily,
      medianSeconds: step.medianSeconds,
      meanSeconds: step.meanSeconds,
      varianceSeconds2: step.varianceSeconds2,
      actualSeconds: at >= 0 && isOwn(work, at, order, index) ? work[at]!.tookSeconds : null,
    };
  });
  return { steps, restSeconds };
}

function isOwn(
  taps: readonly StepClock[],
  at: number,
  order: readonly string[],
  index: number,
): boolean {
  if (at === 0) return index === 0;
  const before = taps[at - 1]!;
  // Two taps within seconds are one forgotten and made up for.
  return before.stepKey === order[index - 1] && before.tookSeconds > 5;
}

/** Visits booked before learning hold the plain model's steps; the pet is taken as it is now. */
function plainBefore(forecast: VisitForecast, pets: ReadonlyMap<string, Pet>): Plain[] {
  const petIds = [...new Set(forecast.steps.map(({ petId }) => petId))];
  return petIds.flatMap((petId) => {
    const pet = pets.get(petId);
    const style = pet && styles.find(({ id }) => id === pet.styleId);
    if (!pet || !style) return [];
    const steps = forecast.steps.filter((step) => step.petId === petId);
    const meanSeconds = steps.reduce((sum, step) => sum + step.meanSeconds, 0);
    const all = forecast.steps.reduce((sum, step) => sum + step.meanSeconds, 0);
    // The stop's variance is the pets' sum; it goes by the square of their minutes.
    const squares = petIds.reduce(
      (sum, id) =>
        sum +
        forecast.steps
          .filter((step) => step.petId === id)
          .reduce((total, step) => total + step.meanSeconds, 0) **
          2,
      0,
    );
    const share = all > 0 ? meanSeconds ** 2 / squares : 0;
    return [
      {
        petId,
        breedId: pet.breedId ?? null,
        styleId: pet.styleId,
        coatStyle: petIds.length === 1 ? forecast.coatStyle : coatStyleOf(pet, style),
        meanSeconds,
        varianceSeconds2: Math.max(1, Math.round(forecast.work.varianceSeconds2 * share)),
        steps,
      },
    ];
  });
}
