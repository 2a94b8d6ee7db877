import { forecastVisit, type VisitOptions, type VisitPet } from './forecastVisit.ts';
import { familyOfStep, pacelessSteps } from './handling.ts';
import { normalDraw } from './normalDraw.ts';
import { simulationSettings, type SimulationSettings } from './simulationSettings.ts';
import type { StepFamily, StepKey } from './types.ts';

/** What is true of a pet and no one has been told: 1000 = as forecast, 1200 = a fifth longer. */
export interface HiddenPet {
  permille: number;
  byFamilyPermille: Record<StepFamily, number>;
}

/** What is true of a groomer. Drift is per week since the first day: 998 = 0.2 % faster each week. */
export interface HiddenGroomer {
  byFamilyPermille: Record<StepFamily, number>;
  weeklyDriftPermille: number;
}

export interface SimulatedPet extends VisitPet {
  hidden: HiddenPet;
  /** True effect of this coat in this style; 1000 when left out. */
  coatStylePermille?: number;
}

export interface SimulateVisitInput {
  pets: readonly SimulatedPet[];
  groomer: HiddenGroomer;
  /** True effect of the household's door, gate and talk on set-up and clean-down; 1000 = usual. */
  doorPermille?: number;
  weeksSinceStart?: number;
  /** Seeded; uniform in [0, 1). The only source of chance. */
  random: () => number;
  options?: VisitOptions;
  settings?: SimulationSettings;
}

export interface SimulatedStep {
  petId: string;
  key: StepKey;
  family: StepFamily;
  /** The forecast's median, for comparing. */
  forecastSeconds: number;
  /** What it really took. */
  actualSeconds: number;
  /** What the phone has: the same, or a forgotten timer's 0 or many hours. */
  recordedSeconds: number;
}

export interface SimulatedVisit {
  setUpSeconds: number;
  steps: SimulatedStep[];
  disinfectSeconds: number;
  cleanDownSeconds: number;
  /** Steps and cleaning between pets. */
  workSeconds: number;
  /** Parked to packed up. */
  stopSeconds: number;
}

/**
 * Draws one visit as it might have gone:
 * actual = forecast median × groomer's family effect × drift × pet × pet's family × coat-style
 * × exp(day) × exp(noise), where day is one normal draw per pet and visit, and noise one per step,
 * a few of them drawn much wider (see `simulationSettings`). Same random stream, same visit.
 */
export function simulateVisit(input: SimulateVisitInput): SimulatedVisit {
  const { random, groomer, settings = simulationSettings } = input;
  // The household's door is drawn here, never learned and drawn as well.
  const forecast = forecastVisit(input.pets, { ...input.options, doorPermille: 1000 });
  const drift = (groomer.weeklyDriftPermille / 1000) ** (input.weeksSinceStart ?? 0);
  const steps = input.pets.flatMap((pet, index): SimulatedStep[] => {
    const day = draw(random, settings.dayPermille);
    return forecast.pets[index]!.forecast.steps.map(({ key, medianSeconds }) => {
      const family = familyOfStep[key];
      const hidden = [
        pacelessSteps.includes(key) ? 1000 : groomer.byFamilyPermille[family],
        pet.hidden.permille,
        pet.hidden.byFamilyPermille[family],
        pet.coatStylePermille ?? 1000,
      ].reduce((product, permille) => (product * permille) / 1000, drift);
      const noise = stepNoise(random, settings);
      const actualSeconds = Math.max(1, Math.round(medianSeconds * hidden * day * noise));
      const recordedSeconds = timer(actualSeconds, random, settings);
      return {
        petId: pet.petId,
        key,
        family,
        forecastSeconds: medianSeconds,
        actualSeconds,
        recordedSeconds,
      };
    });
  });

  const door = (seconds: number) =>
    Math.round(
      seconds * ((input.doorPermille ?? 1000) / 1000) * draw(random, settings.doorPermille),
    );
  const setUpSeconds = door(forecast.setUpSeconds);
  const cleanDownSeconds = door(forecast.cleanDownSeconds);
  // Disinfectant needs its contact time: cleaning between pets is never rushed.
  const { disinfectSeconds } = forecast;
  const workSeconds = steps.reduce((sum, step) => sum + step.actualSeconds, disinfectSeconds);
  const stopSeconds = setUpSeconds + workSeconds + cleanDownSeconds;
  return { setUpSeconds, steps, disinfectSeconds, cleanDownSeconds, workSeconds, stopSeconds };
}

/** A groomer's true pace, drawn once per groomer. */
export function drawHiddenGroomer(
  random: () => number,
  settings: SimulationSettings = simulationSettings,
): HiddenGroomer {
  const whole = draw(random, settings.groomerPermille);
  return {
    byFamilyPermille: byFamily(() => whole * draw(random, settings.groomerFamilyPermille)),
    // Practice makes a little faster; nobody slows.
    weeklyDriftPermille: 1000 - Math.floor(random() * 3),
  };
}

/** A pet's true difficulty, drawn once per pet. */
export function drawHiddenPet(
  random: () => number,
  settings: SimulationSettings = simulationSettings,
): HiddenPet {
  return {
    permille: Math.round(1000 * draw(random, settings.petPermille)),
    byFamilyPermille: byFamily(() => draw(random, settings.petFamilyPermille)),
  };
}

/** True effect of a coat in a style, drawn once per pair. */
export function drawCoatStylePermille(
  random: () => number,
  settings: SimulationSettings = simulationSettings,
): number {
  return Math.round(1000 * draw(random, settings.coatStylePermille));
}

/** A household's true door effect, drawn once per household. */
export function drawDoorPermille(
  random: () => number,
  settings: SimulationSettings = simulationSettings,
): number {
  return Math.round(1000 * draw(random, settings.householdPermille));
}

const NINE_HOURS_SECONDS = 32_400;

function byFamily(next: () => number): Record<StepFamily, number> {
  const permille = () => Math.round(1000 * next());
  return {
    prep: permille(),
    wash: permille(),
    dry: permille(),
    clip: permille(),
    scissor: permille(),
    wrap: permille(),
  };
}

function draw(random: () => number, sigmaPermille: number): number {
  return Math.exp((sigmaPermille / 1000) * normalDraw(random));
}

function stepNoise(random: () => number, settings: SimulationSettings): number {
  const wild = random() * 1000 < settings.wildChancePermille;
  const widen = wild ? settings.wildTimesPermille / 1000 : 1;
  return draw(random, settings.stepPermille * widen);
}

function timer(actualSeconds: number, random: () => number, settings: SimulationSettings): number {
  if (random() * 1000 >= settings.forgottenTimerPermille) return actualSeconds;
  return random() < 0.5 ? 0 : NINE_HOURS_SECONDS;
}
