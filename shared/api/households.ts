import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { patchOf } from './patchOf.ts';
import { pet } from './pets.ts';
import { done, id, latitude, longitude, name, note, page, phone } from './values.ts';

const siteFields = z.object({
  name,
  lat: latitude,
  lon: longitude,
  parkingNotes: note.default(''),
  gateCode: z.string().trim().max(40).nullable().default(null),
});
export const site = siteFields
  .omit({ gateCode: true })
  .extend({ id, hasGateCode: z.boolean(), householdCount: z.int() });
export type Site = z.infer<typeof site>;

const householdFields = z.object({
  name,
  addressLabel: z.string().trim().min(1, 'must not be empty').max(160),
  lat: latitude,
  lon: longitude,
  siteId: id.nullable().default(null),
  accessNotes: note.default(''),
  handoverNotes: note.default(''),
  /** null clears it, absent leaves it; it is never sent back except by openGate. */
  gateCode: z.string().trim().max(40).nullable().optional(),
  contactName: name,
  phone: phone.nullable().default(null),
  textsConsent: z.boolean().default(false),
  secondContactName: z.string().trim().max(80).default(''),
  secondContactPhone: phone.nullable().default(null),
});

export const household = householdFields.omit({ gateCode: true }).extend({
  id,
  hasGateCode: z.boolean(),
  /** When consent was given or withdrawn, instant. */
  consentChangedAt: z.string().nullable(),
});
export type Household = z.infer<typeof household>;

const one = z.object({ householdId: id });

export const listHouseholds = endpoint({
  method: 'GET',
  path: '/api/households',
  summary: 'Households, 25 a page, searched by name, pet, street or phone',
  query: z.object({ text: z.string().trim().max(80).default(''), page }),
  response: z.object({
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
    households: z.array(
      z.object({
        id,
        name: z.string(),
        addressLabel: z.string(),
        siteName: z.string().nullable(),
        pets: z.array(z.object({ id, name: z.string(), breedName: z.string() })),
        nextVisitDate: z.string().nullable(),
        lastVisitDate: z.string().nullable(),
      }),
    ),
  }),
});

export const householdVisit = z.object({
  id,
  date: z.string(),
  status: z.string(),
  promiseWords: z.string().nullable(),
  petNames: z.array(z.string()),
  vanName: z.string().nullable(),
});

export const getHousehold = endpoint({
  method: 'GET',
  path: '/api/households/:householdId',
  summary: 'A household with its pets and visits',
  params: one,
  response: z.object({ household, pets: z.array(pet), visits: z.array(householdVisit) }),
});
export const createHousehold = endpoint({
  method: 'POST',
  path: '/api/households',
  summary: 'Add a household',
  body: householdFields,
  response: household,
});
export const updateHousehold = endpoint({
  method: 'PATCH',
  path: '/api/households/:householdId',
  summary: 'Change a household',
  params: one,
  body: patchOf(householdFields),
  response: household,
});
/** Every opening is logged with who and when. */
export const openGate = endpoint({
  method: 'POST',
  path: '/api/households/:householdId/gate-code',
  summary: 'Show the gate code of a household or its site; the opening is logged',
  params: one,
  response: z.object({ gateCode: z.string().nullable(), siteGateCode: z.string().nullable() }),
});

export const listSites = endpoint({
  method: 'GET',
  path: '/api/sites',
  summary: 'Sites shared by several households',
  response: z.array(site),
});
export const createSite = endpoint({
  method: 'POST',
  path: '/api/sites',
  summary: 'Add a site',
  body: siteFields,
  response: site,
});
export const updateSite = endpoint({
  method: 'PATCH',
  path: '/api/sites/:siteId',
  summary: 'Change a site',
  params: z.object({ siteId: id }),
  body: patchOf(siteFields),
  response: site,
});
export const removeSite = endpoint({
  method: 'DELETE',
  path: '/api/sites/:siteId',
  summary: 'Remove a site no household is at',
  params: z.object({ siteId: id }),
  response: done,
});
