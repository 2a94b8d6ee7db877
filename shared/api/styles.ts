import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { patchOf } from './patchOf.ts';
import { name } from './values.ts';

export const region = z.enum([
  'head', 'ears', 'neck', 'back', 'belly', 'foreLegs', 'hindLegs', 'feet', 'tail', 'sanitary',
]); // prettier-ignore
export const styleService = z.enum([
  'bath', 'deshed', 'nails', 'ears', 'sanitary', 'pads', 'teeth',
]); // prettier-ignore
const coat = z.enum([
  'smooth', 'double', 'curly', 'drop', 'wire', 'combination', 'corded', 'hairless', 'catShort', 'catLong',
]); // prettier-ignore

const lengthTenthsMm = z
  .int('must be tenths of a millimetre')
  .min(2, 'must be 0.2 mm or more')
  .max(1500, 'must be 150 mm or less');

/** Blade and comb lengths are what is left against growth, as makers print them. */
export const regionCut = z.discriminatedUnion(
  'tool',
  [
    z.object({ tool: z.literal('leave') }),
    z.object({
      tool: z.enum(['blade', 'comb']),
      lengthTenthsMm: lengthTenthsMm.max(400, 'must be 40 mm or less for a clipper'),
      direction: z.enum(['with', 'against']),
    }),
    /** null: by eye. */
    z.object({ tool: z.literal('scissor'), lengthTenthsMm: lengthTenthsMm.nullable() }),
    z.object({ tool: z.literal('strip') }),
  ],
  'must be leave, a blade or comb with a length and direction, scissor or strip',
);
/** Regions not named are not touched. */
export const styleCuts = z.partialRecord(
  region,
  regionCut,
  `must be cuts by region: ${region.options.join(', ')}`,
);
export const styleServices = z
  .array(styleService)
  .max(7)
  .refine((list) => new Set(list).size === list.length, 'must name each service once');
const planBWord = z.enum(['must', 'ifAllowed', 'leave']);
export const stylePlanB = z.object({
  services: z.partialRecord(styleService, planBWord, 'must be words by service'),
  regions: z.partialRecord(region, planBWord, 'must be words by region'),
});
export const styleFinish = z.enum(['tidy', 'pet', 'full']);

/** A starting style has a word for an id ("teddy"), the business's own a UUID. */
export const styleId = z.string().trim().min(1, 'must be chosen').max(60);

/** The `Style` of shared/grooming: hand it to `forecastPet` as it is. */
export const styleShape = z.object({
  id: styleId,
  name: z.string(),
  species: z.enum(['dog', 'cat']),
  coats: z.array(coat),
  cuts: styleCuts,
  finish: styleFinish,
  services: z.array(styleService),
  /** Complete: every service and region the style works on. */
  planB: stylePlanB,
});
export type StyleShape = z.infer<typeof styleShape>;

export const style = styleShape.extend({
  source: z.enum(['starting', 'own']),
  /** The style it was copied from; null for starting styles and for those begun empty. */
  basedOn: z.string().nullable(),
  /** Retired: kept for the pets that have it, not offered to others. */
  retired: z.boolean(),
});
export type Style = z.infer<typeof style>;

const styleFields = z.object({
  name,
  coats: z.array(coat).min(1, 'must name at least one coat').max(10),
  cuts: styleCuts,
  finish: styleFinish,
  services: styleServices,
  /** Words left out follow the usual order. */
  planB: stylePlanB.default({ services: {}, regions: {} }),
});

/** Starting library first, then the business's own by name, retired ones last. */
export const listStyles = endpoint({
  method: 'GET',
  path: '/api/styles',
  summary: 'Styles: the starting library and the business’s own',
  response: z.array(style),
});
export const createStyle = endpoint({
  method: 'POST',
  path: '/api/styles',
  summary: 'Add a style of the business’s own, new or as a copy',
  body: styleFields.extend({
    species: z.enum(['dog', 'cat'], 'must be dog or cat'),
    basedOn: styleId.nullable().default(null),
  }),
  response: style,
});
/** Pets that have it follow, unless their own version changes those regions. Booked visits stay. */
export const updateStyle = endpoint({
  method: 'PATCH',
  path: '/api/styles/:styleId',
  summary: 'Change a style of the business’s own',
  params: z.object({ styleId }),
  body: patchOf(styleFields),
  response: style,
});
export const retireStyle = endpoint({
  method: 'POST',
  path: '/api/styles/:styleId/retire',
  summary: 'Stop offering a style; pets that have it keep it',
  params: z.object({ styleId }),
  body: z.object({ retired: z.boolean().default(true) }),
  response: style,
});
