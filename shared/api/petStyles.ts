import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { photo } from './photos.ts';
import {
  styleCuts,
  styleFinish,
  styleId,
  stylePlanB,
  styleServices,
  styleShape,
} from './styles.ts';
import { id, note } from './values.ts';

/** How a pet was to be groomed from `madeAt` on. Versions are never changed, only added. */
export const petStyle = z.object({
  petId: id,
  /** From 1; the highest is the one that counts. */
  version: z.int(),
  styleId,
  styleName: z.string(),
  /** Regions that differ from the style; null when none does. */
  ownCuts: styleCuts.nullable(),
  /** null: as the style. */
  ownFinish: styleFinish.nullable(),
  ownServices: styleServices.nullable(),
  ownPlanB: stylePlanB.nullable(),
  /** The style with this pet's changes: what `forecastPet` takes. */
  style: styleShape,
  notes: z.string(),
  /** null: there before versions were kept. */
  madeAt: z.string().nullable(),
  madeBy: z.string(),
  photos: z.array(photo),
});
export type PetStyle = z.infer<typeof petStyle>;

export const listPetStyles = endpoint({
  method: 'GET',
  path: '/api/pets/:petId/styles',
  summary: 'A pet’s style, version by version, newest first',
  params: z.object({ petId: id }),
  response: z.array(petStyle).min(1),
});
/** The pet's `styleId` and `styleNotes` follow. Forecasts from now on use it; booked visits stay. */
export const addPetStyle = endpoint({
  method: 'POST',
  path: '/api/pets/:petId/styles',
  summary: 'Give a pet a new version of its style',
  params: z.object({ petId: id }),
  body: z.object({
    styleId,
    ownCuts: styleCuts.nullable().default(null),
    ownFinish: styleFinish.nullable().default(null),
    ownServices: styleServices.nullable().default(null),
    ownPlanB: stylePlanB.nullable().default(null),
    notes: note.default(''),
  }),
  response: petStyle,
});
