import type { z } from 'zod';
import type { createHousehold, Household } from '#shared/api/households.ts';
import type { Where } from '#src/api/useWhere.ts';

/**
 * What a household's form begins with. The spot is null until one is picked; `where` is one already
 * told, for a new household.
 */
export function householdStart(
  household: Household | null,
  where: Where | null = null,
): z.input<typeof createHousehold.body> {
  return {
    name: household?.name ?? '',
    addressLabel: household?.addressLabel ?? where?.addressLabel ?? '',
    lat: household?.lat ?? where?.lat ?? (null as unknown as number),
    lon: household?.lon ?? where?.lon ?? (null as unknown as number),
    siteId: household?.siteId ?? null,
    accessNotes: household?.accessNotes ?? '',
    handoverNotes: household?.handoverNotes ?? '',
    contactName: household?.contactName ?? '',
    phone: household?.phone ?? null,
    textsConsent: household?.textsConsent ?? false,
    secondContactName: household?.secondContactName ?? '',
    secondContactPhone: household?.secondContactPhone ?? null,
  };
}
