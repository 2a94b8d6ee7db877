import { distribution } from './distribution.ts';
import { dryingOverlap } from './dryingOverlap.ts';
import { forecastPet, type ForecastOptions } from './forecastPet.ts';
import type { Distribution, PetFacts, PetForecast, Skill, Style } from './types.ts';

export interface VisitPet {
  petId: string;
  name: string;
  pet: PetFacts;
  style: Style;
}

export interface VisitOptions extends ForecastOptions {
  /** Park, power, water, walk to the door. */
  setUpSeconds?: number;
  /** Hand back, payment, wash down, pack up. */
  cleanDownSeconds?: number;
  /** How much of `cleanDownSeconds` is hand-back and payment. */
  handBackSeconds?: number;
  /** Learned of the household: its door, gate, stairs and talk against the usual, 1000 = usual. */
  doorPermille?: number;
  /** Table, tub and tools between two pets at one stop. */
  betweenPetsSeconds?: number;
  /**
   * The business lets a pet finish drying in sight while the next one is prepared. Off by default;
   * allowed only where `dryingOverlap` allows it.
   */
  overlapDrying?: boolean;
}

/** Minutes around the pets, in order: what the household's door minutes are made of. */
export interface AroundStep {
  key: 'hookUp' | 'disinfect' | 'handBack' | 'cleanDown';
  label: string;
  seconds: number;
}

/** One stop's forecast. `work` is what the schedule spreads; `stop` adds set-up and clean-down. */
export interface VisitForecast {
  pets: { petId: string; name: string; forecast: PetForecast }[];
  /** Work on pets one after the other, with the cleaning between them. */
  work: Distribution;
  /** The whole stay from parked to packed up. */
  stop: Distribution;
  setUpSeconds: number;
  /** Includes the contact time a last pet with fleas leaves behind. */
  cleanDownSeconds: number;
  /** Cleaning between pets, all of it. */
  disinfectSeconds: number;
  /** Of the clean-down: contact time of the disinfectant, which may pass while driving. */
  contactSeconds: number;
  /** Saved by preparing a pet while the one before finishes drying in sight; 0 unless allowed. */
  overlapSeconds: number;
  around: AroundStep[];
  /** Fresh water used, which becomes as much grey water. */
  waterMl: number;
  /** The same, in the shape a schedule's visit takes. */
  tankUse: { kind: 'fresh' | 'grey'; ml: number }[];
  needs: Skill[];
  heaviestGrams: number;
  /** Any pet's stop sign: the visit must not start before it is cleared. */
  stopped: boolean;
  modelVersion: string;
}

/**
 * Defaults a business changes: set-up and clean-down 5–10 min each are habitual (from memory, no
 * source found); cleaning between pets is our guess at tub, table and tools.
 */
export const visitDefaults = {
  setUpSeconds: 420,
  cleanDownSeconds: 480,
  handBackSeconds: 180,
  betweenPetsSeconds: 240,
} as const;

/**
 * Forecasts one stop: pets in the order given, worked one after the other (a drying pet is never
 * left alone), disinfecting between them, set-up paid once, door minutes as learned. Pets' day effects are taken as
 * independent.
 * @throws RangeError when there is no pet, a duration is negative, or a pet's field is wrong; a
 * pet's error starts with its name.
 */
export function forecastVisit(
  visitPets: readonly VisitPet[],
  options: VisitOptions = {},
): VisitForecast {
  if (visitPets.length === 0)
    throw new RangeError('pets is empty: a visit needs at least one pet.');
  const door = options.doorPermille ?? 1000;
  if (!Number.isInteger(door) || door <= 0) {
    throw new RangeError(`doorPermille must be a whole number above 0, got ${door}.`);
  }
  const atDoor = (seconds: number) => Math.round((seconds * door) / 1000);
  const setUpSeconds = atDoor(whole('setUpSeconds', options));
  const cleanDown = atDoor(whole('cleanDownSeconds', options));
  const handBackSeconds = Math.min(cleanDown, atDoor(whole('handBackSeconds', options)));
  const between = whole('betweenPetsSeconds', options);

  const pets = visitPets.map(({ petId, name, pet, style }) => ({
    petId,
    name,
    forecast: named(name, () => forecastPet(pet, style, options)),
  }));
  const forecasts = pets.map(({ forecast }) => forecast);
  const disinfectSeconds = forecasts
    .slice(0, -1)
    .reduce((sum, { extraCleanSeconds }) => sum + between + extraCleanSeconds, 0);
  const contactSeconds = forecasts.at(-1)!.extraCleanSeconds;
  const cleanDownSeconds = cleanDown + contactSeconds;
  const overlapSeconds = options.overlapDrying
    ? pets.slice(1).reduce((total, { forecast }, index) => {
        const { pet } = visitPets[index]!;
        return total + dryingOverlap(pet, forecasts[index]!, forecast).seconds;
      }, 0)
    : 0;
  const moments = {
    meanSeconds: sum(forecasts, 'meanSeconds'),
    varianceSeconds2: sum(forecasts, 'varianceSeconds2'),
  };
  const waterMl = sum(forecasts, 'waterMl');

  return {
    pets,
    work: distribution(moments, disinfectSeconds - overlapSeconds),
    stop: distribution(
      moments,
      disinfectSeconds - overlapSeconds + setUpSeconds + cleanDownSeconds,
    ),
    setUpSeconds,
    cleanDownSeconds,
    disinfectSeconds,
    contactSeconds,
    overlapSeconds,
    around: around(setUpSeconds, disinfectSeconds, handBackSeconds, cleanDownSeconds),
    waterMl,
    tankUse: [
      { kind: 'fresh', ml: waterMl },
      { kind: 'grey', ml: waterMl },
    ],
    needs: [...new Set(forecasts.flatMap(({ needs }) => needs))],
    heaviestGrams: Math.max(...forecasts.map(({ heaviestGrams }) => heaviestGrams)),
    stopped: forecasts.some(({ cautions }) => cautions.some(({ stop }) => stop)),
    modelVersion: forecasts[0]!.modelVersion,
  };
}

function around(
  hookUp: number,
  disinfect: number,
  handBack: number,
  cleanDown: number,
): AroundStep[] {
  const steps: AroundStep[] = [
    { key: 'hookUp', label: 'arrive, power and water, to the door', seconds: hookUp },
    { key: 'disinfect', label: 'disinfect between pets', seconds: disinfect },
    { key: 'handBack', label: 'hand back and payment', seconds: handBack },
    { key: 'cleanDown', label: 'wash down and pack up', seconds: cleanDown - handBack },
  ];
  return steps.filter(({ seconds }) => seconds > 0);
}

function whole(field: keyof typeof visitDefaults, options: VisitOptions): number {
  const value = options[field] ?? visitDefaults[field];
  if (!Number.isInteger(value) || value < 0) {
    throw new RangeError(`${field} must be whole seconds, 0 or more, got ${value}.`);
  }
  return value;
}

function sum<K extends 'meanSeconds' | 'varianceSeconds2' | 'waterMl'>(
  forecasts: readonly PetForecast[],
  field: K,
): number {
  return forecasts.reduce((total, forecast) => total + forecast[field], 0);
}

function named<T>(name: string, work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (error instanceof RangeError) throw new RangeError(`${name}: ${error.message}`);
    throw error;
  }
}
