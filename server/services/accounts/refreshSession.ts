import { unsafeAcrossBusinesses } from '#server/db/database.ts';
import { log } from '#server/log.ts';
import { Session } from '#server/models/Session.ts';
import { AppError } from '#server/errors.ts';
import { hashToken, makeToken } from '#server/services/secrets/tokens.ts';
import type { Actor } from './Actor.ts';
import { findActor } from './authenticate.ts';
import { refreshSeconds, type SessionTokens, signAccess } from './openSession.ts';

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
  const hash = hashToken(refresh ?? '');
  const outcome = await unsafeAcrossBusinesses(async () => {
    const session =
      (await Session.findOne({ where: { refreshHash: hash }, lock: true })) ??
      (await Session.findOne({ where: { previousHash: hash }, lock: true }));
    if (!session || session.revokedAt || session.expiresAt <= now) return null;
    const tokens = await rotate(session, hash, now);
    if (!tokens) return null;
    const actor = await findActor(session, tokens.accessEndsAt);
    return actor && { actor, tokens };
  });
  if (!outcome) throw new AppError('signInNeeded', 'Please sign in again.');
  return outcome;
}

async function rotate(session: Session, hash: string, now: Date): Promise<SessionTokens | null> {
  const isPrevious = session.refreshHash !== hash;
  if (isPrevious && session.successorUsedAt) {
    if (now.getTime() - session.rotatedAt.getTime() <= graceMs)
      return {
        ...signAccess({ sessionId: session.id, generation: session.generation }, now),
        refresh: null,
      };
    log.warn({ sessionId: session.id }, 'an old refresh token came back: sign-in ended');
    await session.update({ revokedAt: now });
    return null;
  }
  const refresh = makeToken();
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
