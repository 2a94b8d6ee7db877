import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { breeds, middleGrams } from './breeds.ts';
import { forecastPet, type ForecastOptions } from './forecastPet.ts';
import { goodCoat, petLike } from './petLike.ts';
import { findStyle, styles } from './styles.ts';
import type { CautionKey, CoatType, PetFacts, PetForecast, Species, StepKey } from './types.ts';

const minutes = (seconds: number) => seconds / 60;

function forecast(known: Partial<PetFacts>, styleId: string, options?: ForecastOptions) {
  return forecastPet(petLike(known), findStyle(styleId), options);
}

function stepMinutes(from: PetForecast, key: StepKey): number {
  return minutes(from.steps.find((step) => step.key === key)?.medianSeconds ?? 0);
}

/** The longest kind of work; scissors at the head are scissor work too. */
function longestStep(from: PetForecast): StepKey {
  const times = new Map<StepKey, number>();
  for (const { key, medianSeconds } of from.steps) {
    const work = key === 'head' ? 'scissor' : key;
    times.set(work, (times.get(work) ?? 0) + medianSeconds);
  }
  return [...times].reduce((a, b) => (b[1] > a[1] ? b : a))[0];
}

describe('medians against published minutes (trade sources, weak evidence, common practice)', () => {
  // Guessed medians of an experienced groomer at 5/15/30/50 kg, coat in good order, no multipliers.
  it.each<[StepKey[], number[]]>([
    [['checkIn'], [3, 4, 4, 5]],
    [
      ['nails', 'ears', 'tidy'],
      [8, 10, 12, 14],
    ],
    [['bath'], [8, 12, 17, 25]],
    [['brush'], [6, 9, 14, 20]],
    [['clip'], [8, 10, 14, 18]],
    [
      ['scissor', 'head'],
      [20, 27, 32, 38],
    ],
    [['blend'], [4, 6, 8, 10]],
  ])('%j come within 1.5 min of %j', (keys, expected) => {
    const kilos = [5, 15, 30, 50];
    kilos.forEach((kg, index) => {
      const it = forecast({ weightGrams: kg * 1000 }, 'lamb-legs');
      const total = keys.reduce((sum, key) => sum + stepMinutes(it, key), 0);
      expect(Math.abs(total - expected[index]!)).toBeLessThanOrEqual(1.5);
    });
  });

  it('dries a curly coat in 1.2 × 8/14/22/32 min', () => {
    [8, 14, 22, 32].forEach((plain, index) => {
      const weightGrams = [5_000, 15_000, 30_000, 50_000][index]!;
      const dry = stepMinutes(forecast({ weightGrams }, 'teddy'), 'dry');
      expect(Math.abs(dry - 1.2 * plain)).toBeLessThanOrEqual(1.5);
    });
  });

  it('strips a jacket in 75/95/120/150 min, six tenths of it when the coat is kept rolled', () => {
    [75, 95, 120, 150].forEach((expected, index) => {
      const weightGrams = [5_000, 15_000, 30_000, 50_000][index]!;
      const wire = { coatType: 'wire', weightGrams } as const;
      const grown = forecast({ ...wire, weeksSinceLast: 8 }, 'terrier-jacket-stripped');
      expect(Math.abs(stepMinutes(grown, 'strip') - expected)).toBeLessThanOrEqual(3);
      const rolled = forecast({ ...wire, weeksSinceLast: 6 }, 'terrier-jacket-stripped');
      expect(stepMinutes(rolled, 'strip') / stepMinutes(grown, 'strip')).toBeCloseTo(0.6, 2);
    });
  });

  it.each([
    [5, 60, 120],
    [15, 90, 150],
    [30, 120, 210],
  ])('a curly full groom of %i kg takes %i–%i min', (kg, least, most) => {
    for (const styleId of ['teddy', 'lamb-legs', 'scissored-curly']) {
      const total = minutes(forecast({ weightGrams: kg * 1000 }, styleId).medianSeconds);
      expect(total).toBeGreaterThanOrEqual(least);
      expect(total).toBeLessThanOrEqual(most);
    }
  });

  it('half an inch all over, cut and finish: small 30–60 min, large 45–75 (salon time chart)', () => {
    const cutting = (kg: number) => {
      const it = forecast({ weightGrams: kg * 1000 }, 'half-inch-all-over');
      const keys: StepKey[] = ['clip', 'comb', 'scissor', 'head', 'blend'];
      return keys.reduce((sum, key) => sum + stepMinutes(it, key), 0);
    };
    expect(cutting(5)).toBeGreaterThanOrEqual(30);
    expect(cutting(5)).toBeLessThanOrEqual(60);
    expect(cutting(30)).toBeGreaterThanOrEqual(45);
    expect(cutting(30)).toBeLessThanOrEqual(75);
  });

  it('a Cairn: about 90 min stripped against 15 clipped (a kennel’s page)', () => {
    const cairn = {
      breedId: 'cairn-terrier',
      weightGrams: null,
      coatType: null,
      weeksSinceLast: 8,
    };
    const strip = stepMinutes(forecast(cairn, 'terrier-jacket-stripped'), 'strip');
    const clip = stepMinutes(forecast(cairn, 'terrier-jacket-clipped'), 'clip');
    expect(strip).toBeGreaterThan(70);
    expect(strip).toBeLessThan(100);
    expect(clip).toBeLessThanOrEqual(15);
  });

  it('a first visit takes 1.17–1.27 times a regular one (a home groomer’s records)', () => {
    const pet = { breedId: 'miniature-schnauzer', weightGrams: null, coatType: null } as const;
    const first = forecast({ ...pet, firstVisit: true }, 'bearded-outline');
    const regular = forecast(pet, 'bearded-outline');
    const ratio = first.medianSeconds / regular.medianSeconds;
    expect(ratio).toBeGreaterThan(1.15);
    expect(ratio).toBeLessThan(1.27);
  });

  it('cats: a bathed long coat 40–60 min, a nail trim a fraction of it (two cat groomers)', () => {
    const cat = { species: 'cat', breedId: 'ragdoll', coatType: null, weightGrams: null } as const;
    for (const styleId of ['cat-bath-and-comb', 'cat-body-clip']) {
      const total = minutes(forecast(cat, styleId).medianSeconds);
      expect(total).toBeGreaterThan(40);
      expect(total).toBeLessThanOrEqual(65);
    }
    expect(minutes(forecast(cat, 'cat-nails').medianSeconds)).toBeLessThan(12);
  });

  it('water: 11–19 l for a small dog, 23–38 l for a large one (van practice, from memory)', () => {
    expect(forecast({ weightGrams: 5_000 }, 'teddy').waterMl).toBeGreaterThan(11_000);
    expect(forecast({ weightGrams: 5_000 }, 'teddy').waterMl).toBeLessThan(19_000);
    expect(forecast({ weightGrams: 30_000 }, 'teddy').waterMl).toBeGreaterThan(23_000);
    expect(forecast({ weightGrams: 30_000 }, 'teddy').waterMl).toBeLessThan(38_000);
    expect(forecast({}, 'nails-and-ears').waterMl).toBe(0);
  });
});

describe('contest limits as upper bounds for cutting and finishing', () => {
  // Class rules of a Groom Team Canada-sanctioned show (poodles) and a US trade show (the others):
  // dogs come bathed, dried and mat-free, stripped coats kept rolled. Minutes.
  it.each([
    ['poodle-toy', 'scissored-curly', 90],
    ['poodle-miniature', 'scissored-curly', 105],
    ['poodle-medium', 'scissored-curly', 120],
    ['poodle-standard', 'scissored-curly', 135],
    ['bedlington-terrier', 'lamb-legs', 120],
    ['bichon-frise', 'scissored-curly', 120],
    ['kerry-blue-terrier', 'scissored-curly', 120],
    ['portuguese-water-dog', 'scissored-curly', 120],
    ['irish-water-spaniel', 'scissored-curly', 120],
    ['wheaten-terrier', 'teddy', 120],
    ['bouvier-des-flandres', 'scissored-curly', 135],
    ['black-russian-terrier', 'scissored-curly', 135],
    ['affenpinscher', 'terrier-jacket-stripped', 105],
    ['border-terrier', 'terrier-jacket-stripped', 105],
    ['brussels-griffon', 'terrier-jacket-stripped', 105],
    ['norfolk-terrier', 'terrier-jacket-stripped', 105],
    ['dachshund-wire-miniature', 'terrier-jacket-stripped', 105],
    ['west-highland-terrier', 'terrier-jacket-stripped', 120],
    ['scottish-terrier', 'terrier-jacket-stripped', 120],
    ['wire-fox-terrier', 'terrier-jacket-stripped', 120],
    ['standard-schnauzer', 'terrier-jacket-stripped', 120],
    ['giant-schnauzer', 'terrier-jacket-stripped', 135],
    ['airedale-terrier', 'terrier-jacket-stripped', 135],
    ['cavalier', 'spaniel-outline-stripped', 105],
    ['english-cocker', 'spaniel-outline-stripped', 120],
    ['american-cocker', 'spaniel-outline-stripped', 135],
    ['springer-spaniel', 'spaniel-outline-stripped', 135],
    ['irish-setter', 'spaniel-outline-stripped', 150],
  ])('%s in %s stays under %i min', (breedId, styleId, limit) => {
    const it = forecast({ breedId, weightGrams: null, coatType: null, weeksSinceLast: 4 }, styleId);
    const keys: StepKey[] = ['strip', 'clip', 'comb', 'scissor', 'head', 'blend'];
    const finishing = keys.reduce((sum, key) => sum + stepMinutes(it, key), 0);
    expect(finishing).toBeGreaterThan(15);
    expect(finishing).toBeLessThanOrEqual(limit);
  });
});

describe('the long step comes out of the model', () => {
  const scissored = ['teddy', 'lamb-legs', 'scissored-curly', 'spaniel-outline'];

  it('is scissor work for every curly, drop and feathered breed in a scissored style', () => {
    const growing: CoatType[] = ['curly', 'drop', 'combination'];
    const chosen = breeds.filter((breed) => growing.includes(breed.coatType));
    expect(chosen.length).toBeGreaterThan(60);
    for (const breed of chosen) {
      for (const styleId of scissored) {
        const pet = { breedId: breed.id, weightGrams: null, coatType: null };
        expect([breed.id, styleId, longestStep(forecast(pet, styleId))]).toEqual([
          breed.id,
          styleId,
          'scissor',
        ]);
      }
    }
  });

  it('is drying for every smooth and double breed that comes for a bath', () => {
    const chosen = breeds.filter(({ coatType }) => coatType === 'smooth' || coatType === 'double');
    expect(chosen.length).toBeGreaterThan(40);
    for (const breed of chosen) {
      for (const styleId of ['bath-and-brush', 'bath-and-deshed']) {
        const it = forecast({ breedId: breed.id, weightGrams: null, coatType: null }, styleId);
        expect([breed.id, longestStep(it)]).toEqual([breed.id, 'dry']);
        expect(it.steps.some(({ family }) => family === 'scissor')).toBe(false);
      }
    }
  });

  it('a pug’s bath has no scissor tower; a poodle’s scissor tower is the tallest', () => {
    const pug = forecast({ breedId: 'pug', coatType: null }, 'bath-and-brush');
    expect(Math.max(...pug.steps.map((step) => step.attentionPermille))).toBeLessThan(1000);
    const poodle = forecast({ breedId: 'poodle-miniature', coatType: null }, 'teddy');
    const tallest = poodle.steps.filter((step) => step.attentionPermille === 1000);
    expect(tallest.map(({ key }) => key)).toEqual(['scissor', 'head']);
  });
});

describe('what the pet changes', () => {
  it('a heavier dog of the same coat never takes less', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...styles.filter(({ species }) => species === 'dog')),
        fc.integer({ min: 1_000, max: 80_000 }),
        fc.integer({ min: 1, max: 30_000 }),
        (style, weightGrams, more) => {
          const coatType = style.coats[0]!;
          const light = forecastPet(petLike({ weightGrams, coatType }), style);
          const heavy = forecastPet(petLike({ weightGrams: weightGrams + more, coatType }), style);
          expect(heavy.medianSeconds).toBeGreaterThanOrEqual(light.medianSeconds);
          expect(heavy.waterMl).toBeGreaterThanOrEqual(light.waterMl);
        },
      ),
    );
  });

  it('restless costs most in scissor work, anxious in drying, nippy in prep', () => {
    const calm = forecast({}, 'teddy');
    const worst = (temperament: PetFacts['temperament']) => {
      const it = forecast({ temperament }, 'teddy');
      const ratio = (key: StepKey) => stepMinutes(it, key) / stepMinutes(calm, key);
      return (['nails', 'bath', 'dry', 'clip', 'scissor'] as const).reduce((a, b) =>
        ratio(b) > ratio(a) ? b : a,
      );
    };
    expect(worst('restless')).toBe('scissor');
    expect(worst('anxious')).toBe('dry');
    expect(worst('nippy')).toBe('nails');
  });

  it('a groomer’s pace touches its own family only', () => {
    const usual = forecast({}, 'teddy');
    const fast = forecast({}, 'teddy', { paceByFamilyPermille: { scissor: 900 } });
    for (const step of fast.steps) {
      const before = stepMinutes(usual, step.key);
      expect(minutes(step.medianSeconds) / before).toBeCloseTo(
        step.family === 'scissor' ? 0.9 : 1,
        2,
      );
    }
    expect(() => forecast({}, 'teddy', { paceByFamilyPermille: { dry: 0 } })).toThrow(/dry/);
  });

  it('asks for the skills it needs', () => {
    expect(forecast({ weightGrams: 40_000 }, 'teddy').needs).toEqual(['large']);
    expect(forecast({ coatType: 'wire' }, 'terrier-jacket-stripped').needs).toEqual([
      'hand-stripping',
    ]);
    const cat = { species: 'cat', breedId: 'persian', coatType: null, weightGrams: null } as const;
    expect(forecast(cat, 'cat-comb-out').needs).toEqual(['cats']);
  });

  it('names the field of bad input', () => {
    expect(() => forecast({}, 'cat-nails')).toThrow(/style "cat-nails" is for a cat/);
    expect(() => forecast({ ageYears: 1.5 }, 'teddy')).toThrow(/ageYears must be whole years/);
    const soil = 3 as unknown as 2;
    expect(() => forecast({ coatState: { ...goodCoat, soil } }, 'teddy')).toThrow(/coatState.soil/);
    expect(() => forecast({ weeksSinceLast: -1 }, 'teddy')).toThrow(/weeksSinceLast/);
  });

  it('a first visit costs most in getting to know each other', () => {
    const ratio = (key: StepKey) =>
      stepMinutes(forecast({ firstVisit: true }, 'teddy'), key) /
      stepMinutes(forecast({}, 'teddy'), key);
    expect(ratio('checkIn')).toBeGreaterThan(2);
    expect(ratio('nails')).toBeGreaterThan(ratio('bath'));
    expect(ratio('bath')).toBeGreaterThan(1);
  });

  it('never brushes cords, strips before the bath, takes mats out before the bath', () => {
    const keys = (it: PetForecast) => it.steps.map(({ key }) => key);
    expect(keys(forecast({ coatType: 'corded' }, 'corded-bath'))).not.toContain('brush');
    const strip = keys(forecast({ coatType: 'wire' }, 'terrier-jacket-stripped'));
    expect(strip.indexOf('strip')).toBeLessThan(strip.indexOf('bath'));
    const matted = keys(forecast({ coatState: { ...goodCoat, matting: 2 } }, 'teddy'));
    expect(matted.indexOf('mats')).toBeLessThan(matted.indexOf('bath'));
    expect(matted).toContain('mats');
  });
});

describe('every forecast', () => {
  const cases = fc
    .constantFrom<Species>('dog', 'cat')
    .chain((species) => fc.record({ pet: anyPet(species), style: anyStyle(species) }));

  it('is whole, never negative, and its parts add up', () => {
    fc.assert(
      fc.property(cases, ({ pet, style }) => {
        const it = forecastPet(pet, style);
        const numbers = Object.values(it).filter((value) => typeof value === 'number');
        for (const value of numbers) expect(Number.isInteger(value) && value >= 0).toBe(true);
        for (const step of it.steps) {
          expect(Number.isInteger(step.medianSeconds) && step.medianSeconds > 0).toBe(true);
          expect(Number.isInteger(step.varianceSeconds2) && step.varianceSeconds2 >= 0).toBe(true);
          expect(step.meanSeconds).toBeGreaterThanOrEqual(step.medianSeconds);
          const told = step.reasons.reduce((sum, { deltaSeconds }) => sum + deltaSeconds, 0);
          expect(step.baseSeconds + told).toBe(step.medianSeconds);
        }
        const means = it.steps.reduce((sum, step) => sum + step.meanSeconds, 0);
        expect(it.meanSeconds).toBe(means);
        const own = it.steps.reduce((sum, step) => sum + step.varianceSeconds2, 0);
        expect(it.varianceSeconds2).toBeGreaterThanOrEqual(own);
        expect(it.p50Seconds).toBe(it.medianSeconds);
        const ordered = [it.p10Seconds, it.p50Seconds, it.p80Seconds, it.p90Seconds];
        expect(ordered).toEqual([...ordered].sort((a, b) => a - b));
        expect(new Set(it.steps.map(({ key }) => key)).size).toBe(it.steps.length);
        const places = it.steps.map(({ key }) => orderOfWork.indexOf(key));
        expect(places).not.toContain(-1);
        expect(places).toEqual([...places].sort((a, b) => a - b));
        expect(it.tableSeconds).toBeGreaterThan(0);
      }),
      { numRuns: 300 },
    );
  });

  it('is the same for the same pet, and leaves the pet and style untouched', () => {
    fc.assert(
      fc.property(cases, ({ pet, style }) => {
        const before = JSON.stringify([pet, style]);
        expect(forecastPet(pet, style)).toEqual(forecastPet(pet, style));
        expect(JSON.stringify([pet, style])).toBe(before);
      }),
      { numRuns: 50 },
    );
  });

  it('answers for every breed in each of its usual styles', () => {
    for (const breed of breeds) {
      for (const styleId of breed.usualStyleIds) {
        const pet = petLike({
          species: breed.species,
          breedId: breed.id,
          weightGrams: null,
          coatType: null,
        });
        const it = forecastPet(pet, findStyle(styleId));
        expect(it.heaviestGrams).toBe(middleGrams(breed));
        // Nothing a van does for a pet in good order is under 5 min or over half a day.
        expect(minutes(it.medianSeconds)).toBeGreaterThan(5);
        expect(minutes(it.medianSeconds)).toBeLessThan(300);
      }
    }
  });
});

/** Mats and stripping before water, clip before comb before scissors, the head last, then blend. */
const orderOfWork: StepKey[] = [
  'checkIn',
  'nails',
  'ears',
  'tidy',
  'teeth',
  'mats',
  'clipOff',
  'strip',
  'bath',
  'dry',
  'brush',
  'clip',
  'comb',
  'scissor',
  'head',
  'blend',
  'rest',
  'wrap',
];

function anyStyle(species: Species) {
  return fc.constantFrom(...styles.filter((style) => style.species === species));
}

function anyPet(species: Species): fc.Arbitrary<PetFacts> {
  const level = fc.constantFrom(0, 1, 2, 3, 4) as fc.Arbitrary<0 | 1 | 2 | 3 | 4>;
  const three = fc.constantFrom(0, 1, 2) as fc.Arbitrary<0 | 1 | 2>;
  const breedIds = breeds.filter((breed) => breed.species === species).map(({ id }) => id);
  const coats: CoatType[] =
    species === 'cat'
      ? ['catShort', 'catLong', 'hairless']
      : ['smooth', 'double', 'curly', 'drop', 'wire', 'combination', 'corded', 'hairless'];
  return fc.record({
    species: fc.constant(species),
    breedId: fc.option(fc.constantFrom(...breedIds)),
    weightGrams: fc.integer({ min: 500, max: species === 'cat' ? 15_000 : 100_000 }),
    sizeClass: fc.constant(null),
    ageYears: fc.option(fc.integer({ min: 0, max: 20 })),
    coatType: fc.constantFrom(...coats),
    coatState: fc.record({
      matting: level,
      undercoatLoad: three,
      soil: three,
      lengthTenthsMm: fc.constant(null),
    }),
    temperament: fc.constantFrom('calm', 'restless', 'anxious', 'nippy') as fc.Arbitrary<
      PetFacts['temperament']
    >,
    cautions: fc.uniqueArray(
      fc.constantFrom<CautionKey>('bites', 'feetShy', 'dryerShy', 'heart', 'stitches', 'fleas'),
    ),
    firstVisit: fc.boolean(),
    weeksSinceLast: fc.option(fc.integer({ min: 0, max: 60 })),
  });
}
