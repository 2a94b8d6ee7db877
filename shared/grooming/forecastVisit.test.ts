import { describe, expect, it } from 'vitest';
import { forecastPet } from './forecastPet.ts';
import { forecastVisit, visitDefaults, type VisitPet } from './forecastVisit.ts';
import { petLike } from './petLike.ts';
import { findStyle } from './styles.ts';
import type { PetFacts } from './types.ts';

function visitPet(name: string, known: Partial<PetFacts> = {}, styleId = 'teddy'): VisitPet {
  return { petId: name.toLowerCase(), name, pet: petLike(known), style: findStyle(styleId) };
}

describe('forecastVisit', () => {
  it('one pet: work is the pet’s forecast, the stop adds set-up and clean-down', () => {
    const rook = visitPet('Rook');
    const visit = forecastVisit([rook]);
    const alone = forecastPet(rook.pet, rook.style);
    expect(visit.work.meanSeconds).toBe(alone.meanSeconds);
    expect(visit.work.varianceSeconds2).toBe(alone.varianceSeconds2);
    expect(visit.work.p90Seconds).toBe(alone.p90Seconds);
    // 7 min before, 8 min after
    expect(visit.stop.meanSeconds).toBe(alone.meanSeconds + 900);
    expect(visit.stop.p10Seconds).toBe(alone.p10Seconds + 900);
    expect(visit.disinfectSeconds).toBe(0);
    expect(visit.tankUse).toEqual([
      { kind: 'fresh', ml: alone.waterMl },
      { kind: 'grey', ml: alone.waterMl },
    ]);
  });

  it('two pets: means and variances add, cleaning between them once, one set-up', () => {
    const rook = visitPet('Rook');
    const wren = visitPet('Wren', { weightGrams: 33_000, coatType: 'double' }, 'bath-and-deshed');
    const visit = forecastVisit([rook, wren]);
    const [a, b] = [rook, wren].map(({ pet, style }) => forecastPet(pet, style));
    expect(visit.disinfectSeconds).toBe(visitDefaults.betweenPetsSeconds);
    expect(visit.work.meanSeconds).toBe(a!.meanSeconds + b!.meanSeconds + 240);
    expect(visit.work.varianceSeconds2).toBe(a!.varianceSeconds2 + b!.varianceSeconds2);
    expect(visit.setUpSeconds).toBe(visitDefaults.setUpSeconds);
    expect(visit.waterMl).toBe(a!.waterMl + b!.waterMl);
    expect(visit.heaviestGrams).toBe(33_000);
    expect(visit.needs).toEqual(['large']);
    // Adding the two 90th percentiles would be too wide: the pets do not run late together.
    expect(visit.work.p90Seconds).toBeLessThan(a!.p90Seconds + b!.p90Seconds + 240);
  });

  it('fleas: ten minutes of contact before the next pet, or at the end', () => {
    const flea = visitPet('Flea', { cautions: ['fleas'] });
    const next = visitPet('Next');
    expect(forecastVisit([flea, next]).disinfectSeconds).toBe(240 + 600);
    expect(forecastVisit([next, flea]).cleanDownSeconds).toBe(480 + 600);
  });

  it('lists the minutes around the pets in order; hand-back is part of the clean-down', () => {
    const visit = forecastVisit([visitPet('Rook'), visitPet('Wren')]);
    expect(visit.around.map(({ key, seconds }) => [key, seconds])).toEqual([
      ['hookUp', 420],
      ['disinfect', 240],
      ['handBack', 180],
      ['cleanDown', 300],
    ]);
    const total = visit.around.reduce((sum, { seconds }) => sum + seconds, 0);
    expect(visit.stop.meanSeconds - visit.work.meanSeconds + visit.disinfectSeconds).toBe(total);
  });

  it('door minutes of the household scale set-up and clean-down, never the pets', () => {
    const usual = forecastVisit([visitPet('Rook')]);
    const gated = forecastVisit([visitPet('Rook')], { doorPermille: 1500 });
    expect(gated.setUpSeconds).toBe(630);
    expect(gated.cleanDownSeconds).toBe(720);
    expect(gated.work).toEqual(usual.work);
    expect(() => forecastVisit([visitPet('Rook')], { doorPermille: 0 })).toThrow(/doorPermille/);
  });

  it('contact time of the disinfectant is told apart, for it may pass while driving', () => {
    const flea = forecastVisit([visitPet('Flea', { cautions: ['fleas'] })], { doorPermille: 2000 });
    expect(flea.contactSeconds).toBe(600);
    expect(flea.cleanDownSeconds).toBe(2 * 480 + 600);
  });

  it('carries a stop sign up to the visit', () => {
    expect(forecastVisit([visitPet('Rook')]).stopped).toBe(false);
    expect(forecastVisit([visitPet('Rook', { cautions: ['sedated'] })]).stopped).toBe(true);
  });

  it('says whose field is wrong', () => {
    expect(() => forecastVisit([])).toThrow(/at least one pet/);
    expect(() => forecastVisit([visitPet('Wren', { weightGrams: 12 })])).toThrow(
      /^Wren: weightGrams must be whole grams/,
    );
    expect(() => forecastVisit([visitPet('Wren')], { setUpSeconds: -5 })).toThrow(/setUpSeconds/);
  });
});
