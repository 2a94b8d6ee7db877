import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { forecastPet } from './forecastPet.ts';
import { petLike } from './petLike.ts';
import { planBOf } from './planB.ts';
import { findStyle, styles } from './styles.ts';
import type { PetFacts, Region } from './types.ts';

function forecast(known: Partial<PetFacts>, styleId = 'teddy') {
  return forecastPet(petLike(known), findStyle(styleId));
}

describe('most minutes on the table', () => {
  it('by species and age, the least that health allows, and what is noted on the pet beats all', () => {
    expect(forecast({}).tableLimitSeconds / 60).toBe(180);
    expect(forecast({ ageYears: 12 }).tableLimitSeconds / 60).toBe(120);
    expect(forecast({ ageYears: 0 }).tableLimitSeconds / 60).toBe(75);
    expect(forecast({ ageYears: 12, cautions: ['heart'] }).tableLimitSeconds / 60).toBe(60);
    expect(forecast({ ageYears: 12, tableLimitSeconds: 5_400 }).tableLimitSeconds / 60).toBe(90);
    const cat = { species: 'cat', breedId: 'ragdoll', coatType: null, weightGrams: null } as const;
    expect(forecast(cat, 'cat-comb-out').tableLimitSeconds / 60).toBe(60);
    expect(() => forecast({ tableLimitSeconds: 30 })).toThrow(
      /tableLimitSeconds must be whole seconds/,
    );
  });

  it('time on the table leaves out check-in, rests and wrap-up', () => {
    const it = forecast({ ageYears: 12 });
    const off = ['checkIn', 'rest', 'wrap'];
    const table = it.steps.filter(({ key }) => !off.includes(key));
    expect(it.tableSeconds).toBe(table.reduce((sum, { medianSeconds }) => sum + medianSeconds, 0));
  });
});

describe('plan B', () => {
  it('a calm grown pet in an everyday style needs none', () => {
    expect(forecast({}).overTable).toBeNull();
  });

  it('a puppy in a full teddy keeps nails, face and body; legs and tail go', () => {
    const over = forecast({ ageYears: 0, weightGrams: 8_000 }).overTable!;
    expect(over.leftRegions).toContain('tail');
    for (const region of ['head', 'feet', 'back'] as const)
      expect(over.leftRegions).not.toContain(region);
    expect(over.leftServices).not.toContain('nails');
    expect(over.fits).toBe(true);
    expect(over.words).toMatch(/^Plan B: .*tail.* uncut; .* on the table of 1 h 15\.$/);
  });

  it('what must be done stays though it does not fit: split over two visits', () => {
    const over = forecast({ weightGrams: 40_000, tableLimitSeconds: 1_200 }).overTable!;
    expect(over.fits).toBe(false);
    expect(over.words).toMatch(/split over two visits/);
    expect(over.leftServices).not.toContain('nails');
  });

  it('goes no further than it must, and never leaves out what must be done', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...styles.filter(({ species }) => species === 'dog')),
        fc.integer({ min: 2_000, max: 60_000 }),
        fc.integer({ min: 300, max: 12_000 }),
        (style, weightGrams, tableLimitSeconds) => {
          const pet = petLike({ coatType: style.coats[0]!, weightGrams, tableLimitSeconds });
          const { overTable, tableSeconds } = forecastPet(pet, style);
          if (overTable === null) {
            expect(tableSeconds).toBeLessThanOrEqual(tableLimitSeconds);
            return;
          }
          expect(overTable.overSeconds).toBe(tableSeconds - tableLimitSeconds);
          expect(overTable.fits).toBe(overTable.tableSeconds <= tableLimitSeconds);
          const planB = planBOf(style);
          const back = overTable.leftServices.filter(
            (each) => planB.services[each] === 'ifAllowed',
          );
          for (const service of overTable.fits ? back : []) {
            const left = overTable.leftServices.filter((each) => each !== service);
            const cuts = Object.entries(style.cuts).filter(
              ([region]) => !overTable.leftRegions.includes(region as Region),
            );
            const more = {
              ...style,
              cuts: Object.fromEntries(cuts),
              services: style.services.filter((each) => !left.includes(each)),
            };
            const asGrown = { ...pet, lastCuts: style.cuts };
            expect(forecastPet(asGrown, more).tableSeconds).toBeGreaterThan(tableLimitSeconds);
          }
          for (const service of overTable.leftServices)
            expect(planB.services[service]).not.toBe('must');
          for (const region of overTable.leftRegions)
            expect(planB.regions[region]).not.toBe('must');
        },
      ),
    );
  });
});
