import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { patchOf } from './patchOf.ts';
import { region, styleCuts, styleShape } from './styles.ts';
import { id, name, note, phone } from './values.ts';

/** Keys of the tables in shared/grooming; a service refuses unknown ones by name. */
const tableKey = z.string().trim().min(1, 'must be chosen').max(60);

/** 0 none to 4 pelted. */
const mattingLevel = z.literal([0, 1, 2, 3, 4], 'must be 0 to 4');
/** 0 usual · 1 shedding · 2 blowing coat. */
export const undercoatLoad = z.int().min(0, 'must be 0 to 2').max(2, 'must be 0 to 2');
/** Where the mats are known; they beat `matting`, and regions not named are then clear. */
export const mattingByRegion = z.partialRecord(
  region,
  mattingLevel,
  `must be levels 0 to 4 by region: ${region.options.join(', ')}`,
);

const petFields = z.object({
  name,
  species: z.enum(['dog', 'cat'], 'must be dog or cat'),
  breedId: tableKey.nullable(),
  weightGrams: z
    .int()
    .min(300, 'must be 0.3 kg or more')
    .max(120_000, 'must be 120 kg or less')
    .nullable(),
  /** Only when it differs from the breed's. */
  coatType: tableKey.nullable().default(null),
  matting: z.int().min(0).max(4).default(0),
  mattingByRegion: mattingByRegion.nullable().default(null),
  undercoatLoad: undercoatLoad.default(0),
  soil: z.int().min(0).max(2).default(0),
  temperament: tableKey.default('calm'),
  /** Most minutes it bears in tub and on table; null: by age and health. */
  tableLimitMinutes: z
    .int('must be whole minutes')
    .min(10, 'must be 10 minutes or more')
    .max(240, 'must be 240 minutes or less')
    .nullable()
    .default(null),
  birthYear: z.int().min(1990).max(2100).nullable().default(null),
  cautions: z.array(tableKey).max(20).default([]),
  cautionNote: note.default(''),
  vetName: z.string().trim().max(80).default(''),
  vetPhone: phone.nullable().default(null),
  styleId: tableKey,
  styleNotes: note.default(''),
  intervalWeeks: z.int().min(1).max(52).default(6),
});

export const pet = petFields.extend({
  id,
  householdId: id,
  active: z.boolean(),
  breedName: z.string(),
  styleName: z.string(),
  /** The style that counts, with this pet's own changes: what `forecastPet` takes. */
  style: styleShape,
  /** Of the last finished visit, null for a first visit. */
  lastVisitDate: z.string().nullable(),
  /** Cut plan of that visit, which the coat has grown from; null: taken to be the style it has now. */
  lastCuts: styleCuts.nullable(),
});
export type Pet = z.infer<typeof pet>;

export const getPet = endpoint({
  method: 'GET',
  path: '/api/pets/:petId',
  summary: 'A pet with its past visits, forecast against clock',
  params: z.object({ petId: id }),
  response: z.object({
    pet,
    householdName: z.string(),
    past: z.array(
      z.object({
        visitId: id,
        date: z.string(),
        groomerName: z.string(),
        forecastSeconds: z.int(),
        clockSeconds: z.int(),
      }),
    ),
  }),
});
export const createPet = endpoint({
  method: 'POST',
  path: '/api/households/:householdId/pets',
  summary: 'Add a pet to a household',
  params: z.object({ householdId: id }),
  body: petFields,
  response: pet,
});
export const updatePet = endpoint({
  method: 'PATCH',
  path: '/api/pets/:petId',
  summary: 'Change a pet',
  params: z.object({ petId: id }),
  body: patchOf(petFields.extend({ active: z.boolean() })),
  response: pet,
});
