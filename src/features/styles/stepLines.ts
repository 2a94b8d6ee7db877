import { cutTenthsMm } from '#shared/grooming/coatLengths.ts';
import { groomModel } from '#shared/grooming/groomModel.ts';
import { regionWords } from '#shared/grooming/regionWords.ts';
import type { PetForecast, Region, Style } from '#shared/grooming/types.ts';
import type { StepLine } from '#src/strips/ForecastSteps.tsx';
import { writeMm } from './cutWords.ts';

/** The steps with what the plan knows about them: what comb passes save, which lengths are blended. */
export function stepLines(forecast: PetForecast, cuts: Style['cuts']): StepLine[] {
  return forecast.steps.map((step) => ({ ...step, about: aboutStep(step.key, forecast, cuts) }));
}

function aboutStep(key: string, forecast: PetForecast, cuts: Style['cuts']): string | undefined {
  if (key === 'comb' && forecast.combPlan) {
    const { passes, byRegion, savedSeconds } = forecast.combPlan;
    const where = regionWords(byRegion.map(({ region }) => region));
    const minutes = Math.round(savedSeconds / 60);
    const saved = minutes > 0 ? `${minutes} min` : 'under a minute';
    return `${where}, ${passes === 1 ? '1 pass saves' : `${passes} passes save`} ${saved} of scissors`;
  }
  if (key === 'blend' && forecast.borders.length > 0) {
    const told = forecast.borders.slice(0, 3).map(({ between: [one, other] }) => {
      const mm = (region: Region) => writeMm(lengthAfter(region, forecast, cuts));
      return `${regionWords([one])} to ${regionWords([other])} ${mm(one)} → ${mm(other)} mm`;
    });
    const more = forecast.borders.length - told.length;
    return [...told, ...(more > 0 ? [`${more} more`] : [])].join(', ');
  }
  return undefined;
}

/** A cut never lengthens the coat. */
function lengthAfter(region: Region, forecast: PetForecast, cuts: Style['cuts']): number {
  return Math.min(forecast.coatTenthsMm[region], cutTenthsMm(cuts, region, groomModel) ?? Infinity);
}
