import { findBreed } from '#shared/grooming/breeds.ts';
import { forecastVisit } from '#shared/grooming/forecastVisit.ts';
import type { Style } from '#shared/grooming/types.ts';
import type { Business } from '#server/models/Business.ts';
import type { Pet } from '#server/models/Pet.ts';
import type { VisitForecast } from '#server/models/Visit.ts';
import { petFactsOf } from '#server/services/households/petFactsOf.ts';
import type { StyleOf } from '#server/services/styles/stylesOf.ts';

/** The forecast booking stores: what today's model says of these pets on that date. */
export function forecastOf(
  pets: Pet[],
  business: Business,
  date: string,
  lastVisits: ReadonlyMap<string, string>,
  styleOf: StyleOf,
): { forecast: VisitForecast; modelVersion: string } {
  const on = new Date(`${date}T12:00:00Z`);
  const result = forecastVisit(
    pets.map((pet) => ({
      petId: pet.id,
      name: pet.name,
      pet: petFactsOf(pet, on, lastVisits.get(pet.id) ?? null),
      style: styleOf(pet),
    })),
    {
      setUpSeconds: business.setUpMinutes * 60,
      cleanDownSeconds: business.cleanDownMinutes * 60,
    },
  );
  const { work } = result;
  return {
    modelVersion: result.modelVersion,
    forecast: {
      steps: result.pets.flatMap(({ petId, forecast }) =>
        forecast.steps.map(
          ({
            key,
            family,
            label,
            medianSeconds,
            meanSeconds,
            varianceSeconds2,
            attentionPermille,
            reasons,
          }) => ({
            petId,
            key,
            family,
            label,
            medianSeconds,
            meanSeconds,
            varianceSeconds2,
            attentionPermille,
            reasons,
          }),
        ),
      ),
      work: { meanSeconds: work.meanSeconds, varianceSeconds2: work.varianceSeconds2 },
      p10Seconds: work.p10Seconds,
      p90Seconds: work.p90Seconds,
      setUpSeconds: result.setUpSeconds,
      cleanDownSeconds: result.cleanDownSeconds,
      tankUse: result.tankUse,
      needs: result.needs,
      heaviestGrams: result.heaviestGrams,
      coatStyle: coatStyleOf(pets[0]!, styleOf(pets[0]!)),
    },
  };
}

/** "curly, teddy": the group a lean is told for. */
function coatStyleOf(pet: Pet, style: Style): string {
  const coat = pet.coatType ?? (pet.breedId ? findBreed(pet.breedId).coatType : 'unknown');
  const words: Record<string, string> = {
    catShort: 'short-haired cat',
    catLong: 'long-haired cat',
  };
  return `${words[coat] ?? coat}, ${style.name.toLowerCase()}`;
}
