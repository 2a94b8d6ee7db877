import { distribution } from '../distribution.ts';
import type { VisitForecast } from '../forecastVisit.ts';
import type { GroomFit } from './groomFit.ts';
import { learnForecast, type LearnedNote } from './learnForecast.ts';
import type { LearnedNames } from './learnedWords.ts';

/** A stop's forecast with learning in it. */
export interface LearnedVisit extends VisitForecast {
  pets: (VisitForecast['pets'][number] & { learned: LearnedNote })[];
}

/**
 * Puts what was learned into a whole stop's forecast, pet by pet, for one groomer or for nobody in
 * particular (`groomerId` null). Work around the pets stays as it is.
 * @param coatStyles one per pet, in the visit's order.
 */
export function learnVisit(
  visit: VisitForecast,
  fit: GroomFit,
  who: { groomerId: string | null; coatStyles: readonly string[] },
  groomerName?: string,
): LearnedVisit {
  const pets = visit.pets.map(({ petId, name, forecast }, index) => {
    const names: LearnedNames = groomerName ? { pet: name, groomer: groomerName } : { pet: name };
    const coatStyle = who.coatStyles[index] ?? '';
    const { learned, ...rest } = learnForecast(
      forecast,
      fit,
      { groomerId: who.groomerId, petId, coatStyle },
      names,
    );
    return { petId, name, forecast: rest, learned };
  });
  if (fit.records === 0) return { ...visit, pets };
  const moments = {
    meanSeconds: pets.reduce((sum, { forecast }) => sum + forecast.meanSeconds, 0),
    varianceSeconds2: pets.reduce((sum, { forecast }) => sum + forecast.varianceSeconds2, 0),
  };
  const between = visit.disinfectSeconds - visit.overlapSeconds;
  return {
    ...visit,
    pets,
    work: distribution(moments, between),
    stop: distribution(moments, between + visit.setUpSeconds + visit.cleanDownSeconds),
    modelVersion: `${visit.modelVersion}+${fit.version}`,
  };
}
