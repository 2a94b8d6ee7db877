import { distribution } from '#shared/grooming/distribution.ts';
import { learnedWords } from '#shared/grooming/learning/learnedWords.ts';
import type { StepFamily } from '#shared/grooming/types.ts';
import { Business } from '#server/models/Business.ts';
import { localDateOf } from '#server/services/days/today.ts';
import { lastVisitDates } from '#server/services/households/getHousehold.ts';
import { needPet } from '#server/services/households/pets.ts';
import { stylesOf } from '#server/services/styles/stylesOf.ts';
import { forecastOf } from '#server/services/visits/forecastOf.ts';
import { learningOf } from '#server/services/visits/learningOf.ts';

export interface PetLearned {
  words: string[];
  petVisits: number;
  medianSeconds: number;
  p10Seconds: number;
  p90Seconds: number;
  /** Quickest first. */
  byGroomer: { groomerName: string; medianSeconds: number; words: string }[];
}

/** The very forecast a booking of this pet alone would store today; null: nothing is learned yet. */
export async function petLearned(
  businessId: string,
  petId: string,
  now: Date,
): Promise<PetLearned | null> {
  const pet = await needPet(petId);
  const learning = await learningOf(businessId);
  if (!learning) return null;
  const business = (await Business.findByPk(businessId))!;
  const { forecast } = forecastOf(
    [pet],
    business,
    localDateOf(now, business.timeZone),
    await lastVisitDates([petId]),
    await stylesOf([pet]),
    learning,
  );
  const { plain, words, petVisits } = forecast.learning!;
  const steps = plain[0]!.steps.map(({ family }) => ({ family: family as StepFamily }));
  const byGroomer = learning.groomers.flatMap(({ id, name }) => {
    const work = forecast.workByGroomer?.[id];
    if (!work) return [];
    const who = { groomerId: id, petId, coatStyle: forecast.coatStyle };
    // Pet and coat are told already; the groomer's sentence comes last.
    const told = learnedWords(learning.fit, who, { pet: pet.name, groomer: name }, steps).at(-1)!;
    return [{ groomerName: name, medianSeconds: distribution(work).p50Seconds, words: told }];
  });
  return {
    words,
    petVisits,
    medianSeconds: distribution(forecast.work).p50Seconds,
    p10Seconds: forecast.p10Seconds,
    p90Seconds: forecast.p90Seconds,
    // By name, not by minutes: people are not ranked.
    byGroomer: byGroomer.sort((a, b) => a.groomerName.localeCompare(b.groomerName)),
  };
}
