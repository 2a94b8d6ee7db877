import { describe, expect, it } from 'vitest';
import { breeds } from './breeds.ts';
import { forecastVisit } from './forecastVisit.ts';
import { normalDraw } from './normalDraw.ts';
import { petLike } from './petLike.ts';
import {
  drawCoatStylePermille,
  drawDoorPermille,
  drawHiddenGroomer,
  drawHiddenPet,
  simulateVisit,
  type HiddenGroomer,
  type HiddenPet,
} from './simulateVisit.ts';
import { simulationSettings, type SimulationSettings } from './simulationSettings.ts';
import { findStyle } from './styles.ts';

const flat = { prep: 1000, wash: 1000, dry: 1000, clip: 1000, scissor: 1000, wrap: 1000 };
const usualPet: HiddenPet = { permille: 1000, byFamilyPermille: flat };
const usualGroomer: HiddenGroomer = { byFamilyPermille: flat, weeklyDriftPermille: 1000 };
const still = Object.fromEntries(
  Object.keys(simulationSettings).map((key) => [key, 0]),
) as unknown as SimulationSettings;

const rook = { petId: 'rook', name: 'Rook', pet: petLike({}), style: findStyle('teddy') };

describe('simulateVisit', () => {
  it('without any noise is the forecast’s medians', () => {
    const visit = simulateVisit({
      pets: [{ ...rook, hidden: usualPet }],
      groomer: usualGroomer,
      random: seeded(1),
      settings: still,
    });
    for (const step of visit.steps) {
      expect(step.actualSeconds).toBe(step.forecastSeconds);
      expect(step.recordedSeconds).toBe(step.actualSeconds);
    }
    const forecast = forecastVisit([rook]);
    expect(visit.setUpSeconds).toBe(forecast.setUpSeconds);
    expect(visit.stopSeconds).toBe(
      visit.workSeconds + forecast.setUpSeconds + forecast.cleanDownSeconds,
    );
  });

  it('hidden effects multiply: a slow scissor hand, a hard pet, four weeks of practice', () => {
    const visit = simulateVisit({
      pets: [{ ...rook, hidden: { ...usualPet, permille: 1200 }, coatStylePermille: 1100 }],
      groomer: { byFamilyPermille: { ...flat, scissor: 1250 }, weeklyDriftPermille: 990 },
      weeksSinceStart: 4,
      random: seeded(1),
      settings: still,
    });
    const others = 1.2 * 1.1 * 0.99 ** 4;
    for (const { family, forecastSeconds, actualSeconds } of visit.steps) {
      const factor = family === 'scissor' ? 1.25 * others : others;
      expect(Math.abs(actualSeconds - forecastSeconds * factor)).toBeLessThanOrEqual(0.5);
    }
  });

  it('the same random stream gives the same visit, another one another', () => {
    const run = (seed: number) =>
      simulateVisit({
        pets: [{ ...rook, hidden: usualPet }],
        groomer: usualGroomer,
        random: seeded(seed),
      });
    expect(run(7)).toEqual(run(7));
    expect(run(7)).not.toEqual(run(8));
  });

  it('records are what the phone has: about 1 in 100 timers is forgotten', () => {
    const random = seeded(3);
    const steps = Array.from({ length: 400 }, () =>
      simulateVisit({ pets: [{ ...rook, hidden: usualPet }], groomer: usualGroomer, random }),
    ).flatMap((visit) => visit.steps);
    const wrong = steps.filter((step) => step.recordedSeconds !== step.actualSeconds);
    for (const step of wrong) expect([0, 32_400]).toContain(step.recordedSeconds);
    // Binomial: n = 4,800 steps at 1 % has mean 48, SD 6.9; four SDs either way.
    expect(steps.length).toBe(4_800);
    expect(wrong.length).toBeGreaterThan(20);
    expect(wrong.length).toBeLessThan(76);
    for (const step of steps) expect(Number.isInteger(step.actualSeconds)).toBe(true);
  });

  it('a forecast that knows no hidden effect still covers about 8 in 10', () => {
    const random = seeded(11);
    const forecast = forecastVisit([rook]);
    let inside = 0;
    for (let visit = 0; visit < 400; visit += 1) {
      const { workSeconds } = simulateVisit({
        pets: [
          {
            ...rook,
            hidden: drawHiddenPet(random),
            coatStylePermille: drawCoatStylePermille(random),
          },
        ],
        groomer: drawHiddenGroomer(random),
        doorPermille: drawDoorPermille(random),
        random,
      });
      if (workSeconds >= forecast.work.p10Seconds && workSeconds <= forecast.work.p90Seconds) {
        inside += 1;
      }
    }
    // Acceptance band of an honest 80 % window at n = 400 (binomial, 95 %).
    expect(inside).toBeGreaterThanOrEqual(304);
    expect(inside).toBeLessThanOrEqual(335);
  });
});

describe('simulated businesses', () => {
  it('80 % intervals cover inside the binomial band: middle of 20 businesses of 200 visits', () => {
    const hits = Array.from({ length: 20 }, (_, index) => coveredOf200(100 + index));
    hits.sort((a, b) => a - b);
    const middle = (hits[9]! + hits[10]!) / 2;
    // Acceptance band of an honest 80 % window at n = 200 (binomial, 95 %).
    expect(middle).toBeGreaterThanOrEqual(149);
    expect(middle).toBeLessThanOrEqual(171);
  }, 20_000);
});

/**
 * A business of six groomers and 150 pets of the whole breed table, each with hidden effects, in
 * usual styles; how many of 200 visits end inside the unlearned forecast's 10–90 % interval.
 */
function coveredOf200(seed: number): number {
  const random = seeded(seed);
  const pick = <T>(from: readonly T[]): T => from[Math.floor(random() * from.length)]!;
  const groomers = Array.from({ length: 6 }, () => drawHiddenGroomer(random));
  const coatStyles = new Map<string, number>();
  const pets = Array.from({ length: 150 }, (_, index) => {
    const breed = pick(breeds);
    const styleId = pick(breed.usualStyleIds);
    const group = `${breed.coatType} ${styleId}`;
    if (!coatStyles.has(group)) coatStyles.set(group, drawCoatStylePermille(random));
    return {
      petId: String(index),
      name: `Pet ${index}`,
      pet: petLike({
        species: breed.species,
        breedId: breed.id,
        weightGrams: null,
        coatType: null,
        ageYears: Math.floor(random() * 14),
        temperament: pick(['calm', 'calm', 'restless', 'anxious'] as const),
      }),
      style: findStyle(styleId),
      hidden: drawHiddenPet(random),
      coatStylePermille: coatStyles.get(group)!,
    };
  });
  let inside = 0;
  for (let visit = 0; visit < 200; visit += 1) {
    const pet = pick(pets);
    const { work } = forecastVisit([pet]);
    const drawn = simulateVisit({ pets: [pet], groomer: pick(groomers), random });
    if (drawn.workSeconds >= work.p10Seconds && drawn.workSeconds <= work.p90Seconds) inside += 1;
  }
  return inside;
}

describe('draws', () => {
  it('normalDraw has mean 0 and SD 1', () => {
    const random = seeded(5);
    const draws = Array.from({ length: 20_000 }, () => normalDraw(random));
    const mean = draws.reduce((sum, value) => sum + value, 0) / draws.length;
    const variance = draws.reduce((sum, value) => sum + (value - mean) ** 2, 0) / draws.length;
    // Standard errors are 0.007 and 0.01.
    expect(Math.abs(mean)).toBeLessThan(0.03);
    expect(Math.abs(variance - 1)).toBeLessThan(0.04);
  });

  it('normalDraw survives the ends of the random range', () => {
    expect(normalDraw(() => 0)).toBeCloseTo(0, 12);
    expect(Number.isFinite(normalDraw(() => 1 - 2 ** -53))).toBe(true);
  });

  it('groomers differ from each other and between families', () => {
    const random = seeded(2);
    const [one, two] = [drawHiddenGroomer(random), drawHiddenGroomer(random)];
    expect(one).not.toEqual(two);
    expect(new Set(Object.values(one.byFamilyPermille)).size).toBeGreaterThan(1);
    expect(one.weeklyDriftPermille).toBeLessThanOrEqual(1000);
    expect(one.weeklyDriftPermille).toBeGreaterThanOrEqual(998);
  });
});

/** mulberry32: a small seeded generator, enough for tests. */
function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}
