import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { mattingByRegion, undercoatLoad } from './pets.ts';
import { styleId } from './styles.ts';
import { latitude, longitude } from './values.ts';
import { stepFamily } from './visits.ts';

const tableKey = z.string().trim().min(1, 'must be chosen').max(60);

/** A bookable window found by trial insertion, with what it costs. */
export const offer = z.object({
  date: z.string(),
  /** The window to promise, wall minutes of the business's zone. */
  startMinutes: z.int(),
  endMinutes: z.int(),
  vanId: z.string(),
  vanName: z.string(),
  groomerName: z.string(),
  /** Added driving of that van. */
  driveSecondsMore: z.int(),
  /** Some of the added driving is a straight-line estimate. */
  rough: z.boolean(),
  /** Chance to arrive before the window ends. */
  onTimePermille: z.int(),
  /** The least chance among the promises of that van after it; null when it has none. */
  othersOnTimePermille: z.int().nullable(),
});
export type Offer = z.infer<typeof offer>;

/** For a phone call: nothing is stored. Without an address there are minutes and price, no offers. */
export const quickForecast = endpoint({
  method: 'POST',
  path: '/api/forecasts/quick',
  summary: 'Minutes, price range and earliest offers for a pet told over the phone',
  body: z
    .object({
      species: z.enum(['dog', 'cat'], 'must be dog or cat'),
      breedId: tableKey.nullable().default(null),
      weightGrams: z
        .int()
        .min(300, 'must be 0.3 kg or more')
        .max(120_000, 'must be 120 kg or less')
        .nullable()
        .default(null),
      coatType: tableKey.nullable().default(null),
      matting: z.int().min(0).max(4).default(0),
      mattingByRegion: mattingByRegion.nullable().default(null),
      undercoatLoad: undercoatLoad.default(0),
      soil: z.int().min(0).max(2).default(0),
      temperament: tableKey.default('calm'),
      ageYears: z.int().min(0).max(40).nullable().default(null),
      cautions: z.array(tableKey).max(20).default([]),
      styleId,
      lat: latitude.nullable().default(null),
      lon: longitude.nullable().default(null),
    })
    .refine(({ lat, lon }) => (lat === null) === (lon === null), {
      path: ['lon'],
      message: 'must come with lat, or both be left out',
    }),
  response: z.object({
    steps: z.array(
      z.object({
        key: z.string(),
        family: stepFamily,
        label: z.string(),
        medianSeconds: z.int(),
        attentionPermille: z.int(),
        reasons: z.array(z.object({ text: z.string(), deltaSeconds: z.int() })),
      }),
    ),
    /** Work on the pet. */
    p10Seconds: z.int(),
    p50Seconds: z.int(),
    p90Seconds: z.int(),
    /** Around it: park and hook up, hand back and clean down. */
    setUpSeconds: z.int(),
    cleanDownSeconds: z.int(),
    /** null until the business has set a price. Call-out plus the pet's time at P10, P50 and P90. */
    priceCents: z.object({ low: z.int(), usual: z.int(), high: z.int() }).nullable(),
    currency: z.string(),
    cautions: z.array(z.object({ key: z.string(), words: z.string(), stop: z.boolean() })),
    /** The coat does not allow the style: the household must agree first. */
    planChangeWords: z.string().nullable(),
    /** Earliest first, at most `mostOffers`. */
    offers: z.array(offer),
    /** Why there is no offer; null when there is one. */
    noOfferWords: z.string().nullable(),
  }),
});

export const mostOffers = 6;
