import type { z } from 'zod';
import { abilitiesOf } from '#shared/api/abilities.ts';
import type { session } from '#shared/api/session.ts';
import type { Business } from '#server/models/Business.ts';

interface SessionFacts {
  actor: {
    userId: string;
    userName: string;
    email: string;
    roles: ('operator' | 'dispatcher' | 'groomer')[];
    groomerId: string | null;
    accessEndsAt: Date;
  };
  business: Business;
  area: {
    version: string;
    bounds: [number, number, number, number];
    attribution: string;
  } | null;
  otherBusinesses: Business[];
  csrfToken: string;
  fakesActive: boolean;
  now: Date;
}

export function presentSession(facts: SessionFacts): z.input<typeof session> {
  const { actor, business, area } = facts;
  return {
    user: { id: actor.userId, name: actor.userName, email: actor.email },
    business: {
      id: business.id,
      name: business.name,
      timeZone: business.timeZone,
      currency: business.currency,
      distanceUnit: business.distanceUnit as 'km' | 'mi',
      weightUnit: business.weightUnit as 'kg' | 'lb',
      areaName: business.areaName,
      areaVersion: area?.version ?? null,
      areaBounds: area?.bounds ?? null,
      attribution: area?.attribution ?? null,
    },
    roles: actor.roles,
    groomerId: actor.groomerId,
    abilities: abilitiesOf(actor.roles),
    otherBusinesses: facts.otherBusinesses.map(({ id, name }) => ({ id, name })),
    csrfToken: facts.csrfToken,
    accessEndsAt: actor.accessEndsAt.toISOString(),
    serverNow: facts.now.toISOString(),
    fakesActive: facts.fakesActive,
  };
}
