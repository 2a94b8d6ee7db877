import type { z } from 'zod';
import type { business } from '#shared/api/business.ts';
import type { groomer, shift } from '#shared/api/groomers.ts';
import type { place } from '#shared/api/places.ts';
import type { van } from '#shared/api/vans.ts';
import type { Business } from '#server/models/Business.ts';
import type { Groomer } from '#server/models/Groomer.ts';
import type { Place } from '#server/models/Place.ts';
import type { Shift } from '#server/models/Shift.ts';
import type { Van } from '#server/models/Van.ts';

export function presentBusiness(row: Business): z.input<typeof business> {
  return {
    name: row.name,
    timeZone: row.timeZone,
    currency: row.currency,
    distanceUnit: row.distanceUnit as 'km' | 'mi',
    weightUnit: row.weightUnit as 'kg' | 'lb',
    areaName: row.areaName,
    senderPhone: row.senderPhone ?? null,
    deskPhone: row.deskPhone ?? null,
    setUpMinutes: row.setUpMinutes,
    cleanDownMinutes: row.cleanDownMinutes,
    priceCentsPerHour: row.priceCentsPerHour,
    calloutCents: row.calloutCents,
  };
}

export function presentPlace(row: Place): z.input<typeof place> {
  return {
    id: row.id,
    kind: row.kind,
    name: row.name,
    addressLabel: row.addressLabel,
    lat: row.lat,
    lon: row.lon,
    phone: row.phone ?? null,
    opensMinutes: row.opensMinutes,
    closesMinutes: row.closesMinutes,
    lengthMinutes: row.lengthMinutes,
  };
}

export function presentVan(row: Van): z.input<typeof van> {
  return {
    id: row.id,
    name: row.name,
    shape: row.shape,
    startPlaceId: row.startPlaceId,
    endPlaceId: row.endPlaceId,
    tanks: row.tanks,
    tableLimitGrams: row.tableLimitGrams,
    active: row.active,
  };
}

export function presentGroomer(facts: {
  groomer: Groomer;
  userId: string | null;
}): z.input<typeof groomer> {
  const { groomer: row, userId } = facts;
  return { id: row.id, name: row.name, skills: row.skills, userId, active: row.active };
}

export function presentShift(row: Shift): z.input<typeof shift> {
  return {
    id: row.id,
    date: row.date,
    vanId: row.vanId,
    groomerId: row.groomerId,
    startMinutes: row.startMinutes,
    endMinutes: row.endMinutes,
    mostOvertimeMinutes: row.mostOvertimeMinutes,
    meal: row.meal ?? null,
  };
}
