import { forecastVisit, type VisitForecast as PlainVisit } from '#shared/grooming/forecastVisit.ts';
import { groomWork } from '#shared/grooming/learning/groomWork.ts';
import { type DoorLearned, doorPermille } from '#shared/grooming/learning/doorPermille.ts';
import { type LearnedVisit, learnVisit } from '#shared/grooming/learning/learnVisit.ts';
import type { PetForecast, Style } from '#shared/grooming/types.ts';
import type { Business } from '#server/models/Business.ts';
import type { Groomer } from '#server/models/Groomer.ts';
import type { Pet } from '#server/models/Pet.ts';
import type { ForecastStep, VisitForecast, VisitLearning } from '#server/models/Visit.ts';
import { petFactsOf } from '#server/services/households/petFactsOf.ts';
import type { KeptFit } from '#server/services/learning/keptFit.ts';
import type { StyleOf } from '#server/services/styles/stylesOf.ts';
import { coatStyleOf } from './coatStyleOf.ts';

/** What the business has learned and whose pace may be asked for; null: nothing yet. */
export type Learning = (KeptFit & { groomers: Pick<Groomer, 'id' | 'name'>[] }) | null;

/** What finished visits say beside the learning. */
export interface VisitPast {
  /** By pet id, see `lastCutsOf`. */
  lastCuts?: ReadonlyMap<string, Style['cuts']>;
  /** Of the household, see `doorOf`. */
  door?: DoorLearned;
}

/**
 * The forecast booking stores: what today's model says of these pets on that date, with what was
 * learned, and each groomer's own minutes. The plain model's word is stored beside it, so that a later
 * fit compares the clock with that and never with itself.
 */
export function forecastOf(
  pets: Pet[],
  business: Business,
  date: string,
  lastVisits: ReadonlyMap<string, string>,
  styleOf: StyleOf,
  learning: Learning = null,
  past: VisitPast = {},
): { forecast: VisitForecast; modelVersion: string } {
  const door = past.door ?? doorPermille([]);
  const around = {
    setUpSeconds: business.setUpMinutes * 60,
    cleanDownSeconds: business.cleanDownMinutes * 60,
  };
  const on = new Date(`${date}T12:00:00Z`);
  const plain = forecastVisit(
    pets.map((pet) => ({
      petId: pet.id,
      name: pet.name,
      pet: petFactsOf(pet, on, lastVisits.get(pet.id) ?? null, past.lastCuts?.get(pet.id) ?? null),
      style: styleOf(pet),
    })),
    { ...around, doorPermille: door.permille },
  );
  const coatStyles = pets.map((pet) => coatStyleOf(pet, styleOf(pet)));
  const learned = learning && learnVisit(plain, learning.fit, { groomerId: null, coatStyles });
  const result = learned ?? plain;
  const { work } = result;
  return {
    modelVersion: result.modelVersion,
    forecast: {
      steps: result.pets.flatMap(({ petId, forecast }) => forecast.steps.map(stepOf(petId))),
      work: { meanSeconds: work.meanSeconds, varianceSeconds2: work.varianceSeconds2 },
      p10Seconds: work.p10Seconds,
      p90Seconds: work.p90Seconds,
      setUpSeconds: result.setUpSeconds,
      cleanDownSeconds: result.cleanDownSeconds,
      tankUse: result.tankUse,
      needs: result.needs,
      heaviestGrams: result.heaviestGrams,
      coatStyle: coatStyles[0]!,
      workByGroomer: workByGroomer(plain, coatStyles, learning),
      door: {
        ...door,
        usualSeconds:
          plain.contactSeconds > 0 ? null : around.setUpSeconds + around.cleanDownSeconds,
      },
      learning: {
        fitId: learning?.fitId ?? null,
        plain: plain.pets.map(({ forecast }, index) =>
          plainOf(pets[index]!, coatStyles[index]!, forecast),
        ),
        ...toldOf(learned),
      },
    },
  };
}

function stepOf(petId: string) {
  return (step: PetForecast['steps'][number]): ForecastStep => ({
    petId,
    key: step.key,
    family: step.family,
    label: step.label,
    medianSeconds: step.medianSeconds,
    meanSeconds: step.meanSeconds,
    varianceSeconds2: step.varianceSeconds2,
    attentionPermille: step.attentionPermille,
    reasons: step.reasons,
  });
}

/** Groomers without a finished visit are left out: they take the visit's own minutes. */
function workByGroomer(
  plain: PlainVisit,
  coatStyles: string[],
  learning: Learning,
): NonNullable<VisitForecast['workByGroomer']> {
  if (!learning) return {};
  const { fit, groomers } = learning;
  return Object.fromEntries(
    groomers
      .filter(({ id }) => fit.effects[`groomer ${id}`] !== undefined)
      .map(({ id }) => {
        const { work } = learnVisit(plain, fit, { groomerId: id, coatStyles });
        const { meanSeconds, varianceSeconds2 } = work;
        return [id, { meanSeconds, varianceSeconds2 }];
      }),
  );
}

function plainOf(
  pet: Pet,
  coatStyle: string,
  forecast: PetForecast,
): VisitLearning['plain'][number] {
  const work = groomWork(forecast);
  return {
    petId: pet.id,
    breedId: pet.breedId ?? null,
    styleId: pet.styleId,
    coatStyle,
    ...work.forecast,
    steps: work.steps.map(({ key, family, medianSeconds, meanSeconds, varianceSeconds2 }) => ({
      key,
      family,
      medianSeconds,
      meanSeconds,
      varianceSeconds2,
    })),
  };
}

function toldOf(learned: LearnedVisit | null) {
  const notes = learned?.pets.map((pet) => pet.learned) ?? [];
  return {
    words: notes.flatMap(({ words }) => words),
    petVisits: notes.reduce((sum, { petVisits }) => sum + petVisits, 0),
    learnedPermille:
      Math.min(1000, ...notes.map((note) => note.learnedPermille)) * Number(notes.length > 0),
  };
}
