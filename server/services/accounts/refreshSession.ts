import { validate } from 'uuid';
import { unsafeAcrossBusinesses } from '#server/db/database.ts';
import { log } from '#server/log.ts';
import { Session } from '#server/models/Session.ts';
import { AppError } from '#server/errors.ts';
import { hashToken } from '#server/services/secrets/tokens.ts';
import type { Actor } from './Actor.ts';
import { findActor } from './authenticate.ts';
import { makeRefreshToken, refreshSeconds, type SessionTokens, signAccess } from './openSession.ts';

const graceMs = 60_000;

/**
 * Rotates the refresh token. The one before stays valid for 60 s and until its successor is used:
 * two tabs may race and an answer may be lost on the road. Reuse outside that is theft and ends
 * the sign-in.
 */
export async function refreshSession(
  refresh: string | undefined,
  now: Date,
): Promise<{ actor: Actor; tokens: SessionTokens }> {
  const [sessionId = ''] = (refresh ?? '').split('.');
  const outcome = await unsafeAcrossBusinesses(async () => {
    const session = validate(sessionId) ? await Session.findByPk(sessionId, { lock: true }) : null;
    if (!session || session.revokedAt || session.expiresAt <= now) return null;
    const tokens = await rotate(session, hashToken(refresh!), now);
    if (!tokens) return null;
    const actor = await findActor(session, tokens.accessEndsAt);
    return actor && { actor, tokens };
  });
  if (!outcome) throw new AppError('signInNeeded', 'Please sign in again.');
  return outcome;
}

async function rotate(session: Session, hash: string, now: Date): Promise<SessionTokens | null> {
  const isPrevious = session.previousHash === hash;
  const isOlder = !isPrevious && session.refreshHash !== hash;
  if (isOlder || (isPrevious && session.successorUsedAt)) {
    if (isPrevious && now.getTime() - session.rotatedAt.getTime() <= graceMs)
      return {
        ...signAccess({ sessionId: session.id, generation: session.generation }, now),
        refresh: null,
      };
    log.warn({ sessionId: session.id }, 'an old refresh token came back: sign-in ended');
    await session.update({ revokedAt: now });
    return null;
  }
  const refresh = makeRefreshToken(session.id);
  const generation = session.generation + 1;
  await session.update({
    refreshHash: hashToken(refresh),
    previousHash: hash,
    generation,
    successorUsedAt: null,
    rotatedAt: now,
    expiresAt: new Date(now.getTime() + refreshSeconds * 1000),
  });
  return { ...signAccess({ sessionId: session.id, generation }, now), refresh };
}
