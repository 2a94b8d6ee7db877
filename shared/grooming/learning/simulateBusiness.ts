import { bodyOf } from '../body.ts';
import { findBreed } from '../breeds.ts';
import { forecastPet } from '../forecastPet.ts';
import { normalDraw } from '../normalDraw.ts';
import {
  drawCoatStylePermille,
  drawHiddenGroomer,
  drawHiddenPet,
  simulateVisit,
  type HiddenGroomer,
  type HiddenPet,
} from '../simulateVisit.ts';
import { findStyle } from '../styles.ts';
import type { MattingLevel, PetFacts, Style, Temperament } from '../types.ts';
import type { BusinessSettings } from './businessSettings.ts';
import type { GroomRecord } from './groomRecord.ts';
import { groomWork } from './groomWork.ts';

/** A visit and what its work truly took, rests apart, which no clock may have. */
export interface SimulatedRecord {
  record: GroomRecord;
  trueSeconds: number;
}

/** Draws a business's finished visits, oldest first. Same random stream, same business. */
export function simulateBusiness(
  settings: BusinessSettings,
  random: () => number,
): SimulatedRecord[] {
  const groomers = Array.from({ length: settings.groomers }, (_, index) => ({
    groomerId: `groomer-${index + 1}`,
    hidden: drawHiddenGroomer(random),
  }));
  const tilt = (settings.sizeTiltPermille / 1000) * normalDraw(random);
  const coatStyles = new Map<string, number>();
  const bookings = Array.from({ length: settings.pets }, (_, index) =>
    drawPet(index, settings, random),
  ).flatMap((pet) => pet.weeks.map((week, visit) => ({ pet, week, visit })));
  bookings.sort((a, b) => a.week - b.week);

  return bookings.slice(0, settings.visits).map(({ pet, week, visit }, index) => {
    const regular = chance(random, settings.regularGroomerPermille);
    const groomer = groomers[regular ? pet.regular : pick(random, groomers.length)]!;
    const style = chance(random, settings.otherStylePermille) ? pet.otherStyle : pet.style;
    const matting = drawMatting(random, settings);
    const told = matting > 0 && chance(random, settings.toldBetterPermille) ? matting - 1 : matting;
    const since = visit === 0 ? null : Math.round(week - pet.weeks[visit - 1]!);
    const facts = (level: number): PetFacts => ({
      ...pet.facts,
      coatState: {
        matting: level as MattingLevel,
        undercoatLoad: 0,
        soil: 0,
        lengthTenthsMm: null,
      },
      firstVisit: visit === 0,
      weeksSinceLast: since,
    });
    const coatStyle = `${pet.coat}, ${style.name.toLowerCase()}`;
    if (!coatStyles.has(coatStyle)) coatStyles.set(coatStyle, drawCoatStylePermille(random));
    const years = week / 52;
    const lean =
      coatStyles.get(coatStyle)! *
      pet.kilos8 ** tilt *
      (1 + settings.petAgeingPermille / 1000) ** years;
    return drawRecord({
      index,
      petId: pet.petId,
      breedId: pet.facts.breedId!,
      groomer,
      style,
      coatStyle,
      week,
      told: facts(told),
      truly: facts(matting),
      hidden: pet.hidden,
      leanPermille: lean,
      settings,
      random,
    });
  });
}

interface DrawInput {
  index: number;
  petId: string;
  breedId: string;
  groomer: { groomerId: string; hidden: HiddenGroomer };
  style: Style;
  coatStyle: string;
  week: number;
  told: PetFacts;
  truly: PetFacts;
  hidden: HiddenPet;
  leanPermille: number;
  settings: BusinessSettings;
  random: () => number;
}

function drawRecord(input: DrawInput): SimulatedRecord {
  const { petId, groomer, style, settings, random } = input;
  const { forecast, steps } = groomWork(forecastPet(input.told, style));
  const visit = simulateVisit({
    pets: [
      {
        petId,
        name: petId,
        pet: input.truly,
        style,
        hidden: input.hidden,
        coatStylePermille: input.leanPermille,
      },
    ],
    groomer: groomer.hidden,
    weeksSinceStart: input.week,
    random,
  });
  const sum = (isRest: boolean) =>
    visit.steps
      .filter(({ key }) => (key === 'rest') === isRest)
      .reduce((total, step) => total + step.actualSeconds, 0);
  const trueSeconds = sum(false);
  const restSeconds = sum(true);
  const timed = chance(random, settings.stepsTimedPermille);
  const forgotten = chance(random, settings.petTimerForgottenPermille);
  const nineHours = random() < 0.5 ? 0 : 32_400;
  const clock = new Map(visit.steps.map((step) => [step.key, step.recordedSeconds]));
  return {
    trueSeconds,
    record: {
      visitId: `visit-${input.index + 1}`,
      petId,
      groomerId: groomer.groomerId,
      breedId: input.breedId,
      coatStyle: input.coatStyle,
      styleId: style.id,
      day: Math.round(input.week * 7),
      forecast,
      actualSeconds: forgotten ? nineHours : trueSeconds + restSeconds,
      restSeconds,
      ended: false,
      people: 1,
      steps: steps.map(({ key, family, medianSeconds, meanSeconds, varianceSeconds2 }) => ({
        family,
        medianSeconds,
        meanSeconds,
        varianceSeconds2,
        actualSeconds: timed ? (clock.get(key) ?? null) : null,
      })),
    },
  };
}

function drawPet(index: number, settings: BusinessSettings, random: () => number) {
  const breed = findBreed(settings.breedIds[pick(random, settings.breedIds.length)]!);
  const share = (random() + random()) / 2;
  const weightGrams = Math.round(breed.minGrams + share * (breed.maxGrams - breed.minGrams));
  const temperaments: Temperament[] = ['calm', 'calm', 'calm', 'restless', 'anxious'];
  const every = settings.intervalWeeks[pick(random, settings.intervalWeeks.length)]!;
  const start = chance(random, settings.joinsLaterPermille)
    ? random() * settings.weeks
    : random() * every;
  const weeks: number[] = [];
  // A household is rarely on the dot: the gap wobbles by up to a fifth.
  for (let week = start; week < settings.weeks; week += every * (0.8 + 0.4 * random()))
    weeks.push(week);
  const facts: Omit<PetFacts, 'coatState' | 'firstVisit' | 'weeksSinceLast'> = {
    species: breed.species,
    breedId: breed.id,
    weightGrams,
    ageYears: 1 + pick(random, 12),
    temperament: temperaments[pick(random, temperaments.length)]!,
    cautions: [],
  };
  const body = bodyOf({
    ...facts,
    coatState: { matting: 0, undercoatLoad: 0, soil: 0, lengthTenthsMm: null },
    firstVisit: false,
    weeksSinceLast: null,
  });
  return {
    petId: `pet-${index + 1}`,
    facts,
    coat: body.coatType,
    kilos8: body.weightGrams / 8000,
    style: findStyle(breed.usualStyleIds[0]!),
    otherStyle: findStyle(breed.usualStyleIds[1] ?? breed.usualStyleIds[0]!),
    regular: pick(random, settings.groomers),
    hidden: drawHiddenPet(random),
    weeks,
  };
}

function drawMatting(random: () => number, settings: BusinessSettings): number {
  let left = random() * 1000;
  const level = settings.mattingPermille.findIndex((permille) => (left -= permille) < 0);
  return Math.max(0, level);
}

function chance(random: () => number, permille: number): boolean {
  return random() * 1000 < permille;
}

function pick(random: () => number, count: number): number {
  return Math.min(count - 1, Math.floor(random() * count));
}
