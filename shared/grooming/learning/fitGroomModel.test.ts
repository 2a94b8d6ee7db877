import { describe, expect, it } from 'vitest';
import { forecastPet } from '../forecastPet.ts';
import { normalDraw } from '../normalDraw.ts';
import { findStyle } from '../styles.ts';
import type { PetFacts } from '../types.ts';
import { fitGroomModel } from './fitGroomModel.ts';
import { goodSeconds } from './goodSeconds.ts';
import type { GroomRecord } from './groomRecord.ts';
import { keepsBetter } from './keepsBetter.ts';
import { learnForecast } from './learnForecast.ts';
import { isHeldOut, learnFromRecords } from './learnFromRecords.ts';
import { predictMinutes } from './predictMinutes.ts';

const bichon: PetFacts = {
  species: 'dog',
  breedId: 'bichon-frise',
  weightGrams: 6000,
  ageYears: 4,
  coatState: { matting: 0, undercoatLoad: 0, soil: 0, lengthTenthsMm: null },
  temperament: 'calm',
  cautions: [],
  firstVisit: false,
  weeksSinceLast: 5,
};
const plain = forecastPet(bichon, findStyle('teddy'));

/** Mika works as forecast, Tobi a fifth slower with scissors; pet-0 takes 30 % longer with anybody. */
function makeRecords(count: number, seed = 1, timed = true): GroomRecord[] {
  const random = seeded(seed);
  return Array.from({ length: count }, (_, index) => {
    const groomerId = index % 2 === 0 ? 'mika' : 'tobi';
    const petId = `pet-${Math.floor(random() * 20)}`;
    const day = Math.exp(0.08 * normalDraw(random) + (petId === 'pet-0' ? Math.log(1.3) : 0));
    const steps = plain.steps.map((step) => {
      const slow = groomerId === 'tobi' && step.family === 'scissor' ? 1.2 : 1;
      const noise = Math.exp(0.12 * normalDraw(random));
      return { ...step, actualSeconds: Math.round(step.medianSeconds * slow * day * noise) };
    });
    return {
      visitId: `v${index}`,
      petId,
      groomerId,
      breedId: 'bichon-frise',
      coatStyle: 'curly, teddy',
      styleId: 'teddy',
      day: index,
      forecast: { meanSeconds: plain.meanSeconds, varianceSeconds2: plain.varianceSeconds2 },
      actualSeconds: steps.reduce((sum, step) => sum + step.actualSeconds, 0),
      restSeconds: 0,
      ended: false,
      people: 1,
      steps: steps.map(
        ({ family, medianSeconds, meanSeconds, varianceSeconds2, actualSeconds }) => ({
          family,
          medianSeconds,
          meanSeconds,
          varianceSeconds2,
          actualSeconds: timed ? actualSeconds : null,
        }),
      ),
    };
  });
}

const records = makeRecords(400);
const fit = fitGroomModel(records);
const who = { groomerId: 'mika', petId: 'pet-0', coatStyle: 'curly, teddy' };

describe('what is found', () => {
  it('a slow pet, a groomer slow with scissors only, and the day’s spread', () => {
    const pet = fit.effects['pet pet-0']!;
    expect(Math.abs(pet.value - Math.log(1.3))).toBeLessThan(3 * pet.se);
    const lean = (groomer: string, family: string) =>
      fit.families[`groomer ${groomer} ${family}`]!.value;
    const apart = lean('tobi', 'scissor') - lean('mika', 'scissor');
    const others = lean('tobi', 'wash') - lean('mika', 'wash');
    // One free effect per visit: only the difference between families is known, ln 1.2 = 0.18.
    expect(apart - others).toBeGreaterThan(0.1);
    expect(apart - others).toBeLessThan(0.25);
    const seen = predictMinutes(fit, who, { forecast: plain, steps: plain.steps });
    // Day 0.08 and eleven steps of 0.12: about 0.09 in all.
    expect(seen.sigma).toBeGreaterThan(0.07);
    expect(seen.sigma).toBeLessThan(0.13);
    expect(seen.learnedPermille).toBeGreaterThan(800);
  });

  it('a pet not met borrows from its groups and is less sure', () => {
    const known = predictMinutes(fit, who, { forecast: plain, steps: plain.steps });
    const stranger = { ...who, petId: 'new' };
    const met = predictMinutes(fit, stranger, { forecast: plain, steps: plain.steps });
    expect(met.leanSe).toBeGreaterThan(known.leanSe);
    expect(met.sigma).toBeGreaterThan(known.sigma);
    expect(Math.abs(met.lean)).toBeLessThan(0.1);
  });

  it('five visits weigh less than fifty', () => {
    const few = fitGroomModel(records.filter(({ petId }) => petId === 'pet-0').slice(0, 5));
    const lean = (of: typeof fit) =>
      predictMinutes(of, who, { forecast: plain, steps: plain.steps }).lean;
    expect(lean(few)).toBeGreaterThan(0.02);
    expect(lean(few)).toBeLessThan(lean(fit));
  });

  it('is plain JSON and the same every time, in any order of records', () => {
    expect(JSON.parse(JSON.stringify(fit))).toEqual(fit);
    expect(fitGroomModel(records)).toEqual(fit);
    const turned = fitGroomModel([...records].reverse());
    expect(turned.effects['pet pet-0']!.value).toBeCloseTo(fit.effects['pet pet-0']!.value, 3);
  });

  it('without timed steps the whole visit is still learned', () => {
    const whole = fitGroomModel(makeRecords(400, 1, false));
    expect(whole.timedRecords).toBe(0);
    expect(whole.families).toEqual({});
    const { tobi, mika } = {
      tobi: whole.effects['groomer tobi']!.value,
      mika: whole.effects['groomer mika']!.value,
    };
    expect(tobi).toBeGreaterThan(mika);
  });
});

describe('what must not be learned from', () => {
  const [record] = records as [GroomRecord];

  it('ended visits, two-person shifts and rests', () => {
    expect(goodSeconds({ ...record, ended: true })).toBeNull();
    expect(goodSeconds({ ...record, people: 2 })).toBeNull();
    const rested = { ...record, actualSeconds: record.actualSeconds + 600, restSeconds: 600 };
    expect(goodSeconds(rested)).toBe(record.actualSeconds);
  });

  it('a forgotten timer gives way to timed steps, or is left out', () => {
    const forgotten = { ...record, actualSeconds: 32_400 };
    expect(goodSeconds(forgotten)).toBe(record.actualSeconds);
    const untimed = {
      ...forgotten,
      steps: record.steps.map((s) => ({ ...s, actualSeconds: null })),
    };
    expect(goodSeconds(untimed)).toBeNull();
    expect(goodSeconds({ ...untimed, actualSeconds: 0 })).toBeNull();
  });

  it('one clock in ten at 0 minutes or 9 hours, and one in twenty doubled, poison nothing', () => {
    const bad = records.map((each, index) => {
      if (index % 10 === 3) return { ...each, actualSeconds: index % 20 === 3 ? 0 : 32_400 };
      return index % 20 === 7 ? { ...each, actualSeconds: each.actualSeconds * 2 } : each;
    });
    const hurt = fitGroomModel(bad);
    const see = (of: typeof fit) =>
      predictMinutes(of, who, { forecast: plain, steps: plain.steps }).medianSeconds;
    expect(Math.abs(see(hurt) / see(fit) - 1)).toBeLessThan(0.05);
  });
});

describe('learnForecast', () => {
  const none = fitGroomModel([]);

  it('changes nothing without records, and says so', () => {
    const same = learnForecast(plain, none, who);
    expect({ ...same, learned: undefined }).toEqual({ ...plain, learned: undefined });
    expect(same.learned.words).toEqual(['Not learned yet: no finished visits.']);
    expect(same.learned.learnedPermille).toBe(0);
  });

  it('keeps the forecast’s invariants and tells what it knows', () => {
    const learned = learnForecast(
      plain,
      fit,
      { ...who, groomerId: 'tobi' },
      {
        pet: 'Rook',
        groomer: 'Tobi',
      },
    );
    for (const step of learned.steps) {
      const reasons = step.reasons.reduce((sum, { deltaSeconds }) => sum + deltaSeconds, 0);
      expect(step.baseSeconds + reasons).toBe(step.medianSeconds);
      expect(step.meanSeconds).toBeGreaterThanOrEqual(step.medianSeconds);
      expect(Number.isInteger(step.varianceSeconds2)).toBe(true);
    }
    const sum = learned.steps.reduce((total, step) => total + step.meanSeconds, 0);
    expect(learned.meanSeconds).toBe(sum);
    expect(learned.p10Seconds).toBeLessThan(learned.p50Seconds);
    const whole = predictMinutes(
      fit,
      { ...who, groomerId: 'tobi' },
      { forecast: plain, steps: plain.steps },
    );
    expect(Math.abs(learned.medianSeconds / whole.medianSeconds - 1)).toBeLessThan(0.005);
    expect(learned.learned.petVisits).toBe(fit.effects['pet pet-0']!.records);
    expect(learned.learned.words[0]).toMatch(
      /^Learned from \d+ visits of Rook: \d+ % slower than usual\.$/,
    );
    expect(learned.learned.words.at(-1)).toMatch(/visits with Tobi: .*scissor work \d+ % slower/);
  });
});

describe('keeping a fit', () => {
  it('only when it forecasts unseen visits better', () => {
    const heldOut = makeRecords(60, 9);
    const good = keepsBetter(null, fit, heldOut);
    expect(good.keep).toBe(true);
    expect(good.afterSeconds).toBeLessThan(good.beforeSeconds);
    const wrong = {
      ...fit,
      effects: { ...fit.effects, business: { value: 0.5, se: 0.01, records: 400 } },
    };
    expect(keepsBetter(fit, wrong, heldOut).keep).toBe(false);
    expect(keepsBetter(fit, fit, heldOut).keep).toBe(false);
    expect(keepsBetter(null, fit, heldOut.slice(0, 5)).keep).toBe(false);
  });

  it('the judges are never in the twin that is judged', () => {
    const held = records.filter(({ visitId }) => isHeldOut(visitId));
    expect(held.length).toBeGreaterThan(20);
    expect(held.length).toBeLessThan(70);
    const { pair, trial } = learnFromRecords(records, null);
    expect(pair.fit.records).toBe(400);
    expect(pair.trial.records).toBe(400 - held.length);
    expect(trial.records).toBe(held.filter(({ day }) => 399 - day <= 365).length);
    expect(trial.keep).toBe(true);
    expect(learnFromRecords(records, pair).trial.keep).toBe(false);
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
