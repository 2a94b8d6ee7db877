import { unsafeAcrossBusinesses } from '#server/db/database.ts';
import { Membership } from '#server/models/Membership.ts';
import { Session } from '#server/models/Session.ts';
import { User } from '#server/models/User.ts';
import type { Actor } from './Actor.ts';
import { readAccess } from './openSession.ts';

/** Who an access token stands for, looked up so that a revoked sign-in ends at once; null when nobody. */
export async function authenticate(token: string | undefined, now: Date): Promise<Actor | null> {
  const claims = readAccess(token, now);
  if (!claims) return null;
  return unsafeAcrossBusinesses(async () => {
    const session = await Session.findByPk(claims.sessionId);
    if (!session || session.revokedAt || session.expiresAt <= now) return null;
    // The first use of a new access token retires the refresh token before it (see refreshSession).
    if (
      session.generation === claims.generation &&
      session.generation > 1 &&
      !session.successorUsedAt
    )
      await session.update({ successorUsedAt: now });
    return findActor(session, claims.endsAt);
  });
}

/** The session's person with today's roles; null when the membership has ended. */
export async function findActor(session: Session, accessEndsAt: Date): Promise<Actor | null> {
  const [user, membership] = await Promise.all([
    User.findByPk(session.userId),
    Membership.findOne({ where: { userId: session.userId, businessId: session.businessId } }),
  ]);
  if (!user || !membership) return null;
  return {
    userId: user.id,
    userName: user.name,
    email: user.email,
    businessId: session.businessId,
    sessionId: session.id,
    roles: membership.roles,
    groomerId: membership.groomerId ?? null,
    accessEndsAt,
  };
}
