import { unsafeAcrossBusinesses } from '#server/db/database.ts';
import { areaFor } from '#server/area/openAreas.ts';
import { fakesActive } from '#server/env.ts';
import { Business } from '#server/models/Business.ts';
import { Membership } from '#server/models/Membership.ts';
import { boxOf } from '#server/services/area/areas.ts';
import { signValue } from '#server/services/secrets/tokens.ts';
import type { Actor } from './Actor.ts';

/** Everything the screen needs to know about who is signed in and where. */
export async function describeSession(actor: Actor, now: Date) {
  return unsafeAcrossBusinesses(async () => {
    const memberships = await Membership.findAll({ where: { userId: actor.userId } });
    const businesses = await Business.findAll({
      where: { id: memberships.map((m) => m.businessId) },
    });
    const business = businesses.find((one) => one.id === actor.businessId)!;
    const area = areaFor(business.areaName);
    return {
      actor,
      business,
      area: area && {
        version: area.version,
        bounds: boxOf(area.bounds),
        attribution: area.attribution,
      },
      otherBusinesses: businesses.filter((one) => one.id !== business.id),
      csrfToken: signValue('csrf', actor.sessionId),
      fakesActive: fakesActive(),
      now,
    };
  });
}

export type SessionFacts = Awaited<ReturnType<typeof describeSession>>;
