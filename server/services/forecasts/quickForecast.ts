import { distribution } from '#shared/grooming/distribution.ts';
import { forecastPet } from '#shared/grooming/forecastPet.ts';
import type { CautionNote } from '#shared/grooming/types.ts';
import { Business } from '#server/models/Business.ts';
import { Pet } from '#server/models/Pet.ts';
import type { VisitForecast } from '#server/models/Visit.ts';
import { petFactsOf } from '#server/services/households/petFactsOf.ts';
import { checkPet } from '#server/services/households/pets.ts';
import { stylesOf } from '#server/services/styles/stylesOf.ts';
import { localDateOf } from '#server/services/days/today.ts';
import { forecastOf } from '#server/services/visits/forecastOf.ts';
import { learningOf } from '#server/services/visits/learningOf.ts';
import { type DatedOffer, offersAhead } from './offersAhead.ts';

export interface QuickInput extends Pick<
  Pet,
  'species' | 'breedId' | 'weightGrams' | 'coatType' | 'matting' | 'mattingByRegion' | 'undercoatLoad' | 'soil' | 'temperament' | 'cautions' | 'styleId'
> {
  ageYears: number | null;
  lat: number | null;
  lon: number | null;
} // prettier-ignore

export interface QuickAnswer {
  forecast: VisitForecast;
  p50Seconds: number;
  priceCents: { low: number; usual: number; high: number } | null;
  currency: string;
  cautions: CautionNote[];
  planChangeWords: string | null;
  offers: DatedOffer[];
  noOfferWords: string | null;
}

/** Minutes, price and offers for a pet told over the phone: the very way a booking goes, unsaved. */
export async function quickForecast(
  businessId: string,
  input: QuickInput,
  now: Date,
  mostOffers: number,
): Promise<QuickAnswer> {
  const business = (await Business.findByPk(businessId))!;
  const { ageYears, lat, lon, ...told } = input;
  const pet = Pet.build({
    ...told,
    householdId: businessId,
    name: 'Pet',
    birthYear: ageYears === null ? null : now.getUTCFullYear() - ageYears,
    cautionNote: '',
    vetName: '',
    styleNotes: '',
    intervalWeeks: 6,
  });
  await checkPet(pet, now, true);
  const styleOf = await stylesOf([pet]);
  const date = localDateOf(now, business.timeZone);
  const learning = await learningOf(businessId);
  const { forecast } = forecastOf([pet], business, date, new Map(), styleOf, learning);
  const plain = forecastPet(petFactsOf(pet, now, null), styleOf(pet));
  const { p50Seconds } = distribution(forecast.work);
  const found =
    lat === null || lon === null
      ? { offers: [], noOfferWords: 'Add an address to see when a van could come.' }
      : await offersAhead(business, { lat, lon }, forecast, now, mostOffers);
  return {
    forecast,
    p50Seconds,
    priceCents: priceOf(business, forecast, p50Seconds),
    currency: business.currency,
    cautions: plain.cautions,
    planChangeWords: plain.planChange?.words ?? null,
    ...found,
  };
}

/** Call-out and the pet's time by the hour, to whole units of the currency; null until a price is set. */
function priceOf(
  business: Business,
  { p10Seconds, p90Seconds }: VisitForecast,
  p50Seconds: number,
): QuickAnswer['priceCents'] {
  const { calloutCents, priceCentsPerHour } = business;
  if (calloutCents + priceCentsPerHour === 0) return null;
  const price = (seconds: number) =>
    Math.round((calloutCents + (priceCentsPerHour * seconds) / 3600) / 100) * 100;
  return { low: price(p10Seconds), usual: price(p50Seconds), high: price(p90Seconds) };
}
