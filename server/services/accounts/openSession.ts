import jwt from 'jsonwebtoken';
import { newId } from '#server/db/newId.ts';
import { keyRing } from '#server/env.ts';
import { Session } from '#server/models/Session.ts';
import { hashToken, keyFor, makeToken } from '#server/services/secrets/tokens.ts';

export const accessSeconds = 15 * 60;
/** "Sign-in lasts the shift", and then some: a month without use ends it. */
export const refreshSeconds = 30 * 24 * 3600;

/** What goes into the two cookies. */
export interface SessionTokens {
  access: string;
  accessEndsAt: Date;
  /** null: the cookie already set stays. */
  refresh: string | null;
}

export interface AccessClaims {
  sessionId: string;
  generation: number;
}

/** Starts a sign-in of a person in one business. */
export async function openSession(
  userId: string,
  businessId: string,
  now: Date,
): Promise<SessionTokens> {
  const id = newId();
  const refresh = makeRefreshToken(id);
  const session = await Session.create({
    id,
    userId,
    businessId,
    refreshHash: hashToken(refresh),
    rotatedAt: now,
    expiresAt: new Date(now.getTime() + refreshSeconds * 1000),
    createdAt: now,
  });
  return { ...signAccess({ sessionId: session.id, generation: 1 }, now), refresh };
}

/** It names its sign-in, so that any token of it that was ever rotated away is known as such. */
export function makeRefreshToken(sessionId: string): string {
  return `${sessionId}.${makeToken()}`;
}

export function signAccess(
  claims: AccessClaims,
  now: Date,
): { access: string; accessEndsAt: Date } {
  const key = keyRing().keys[0]!;
  const iat = Math.floor(now.getTime() / 1000);
  const access = jwt.sign(
    { sid: claims.sessionId, gen: claims.generation, iat, exp: iat + accessSeconds },
    keyFor(key.secret, 'access'),
    { algorithm: 'HS256', keyid: key.id },
  );
  return { access, accessEndsAt: new Date((iat + accessSeconds) * 1000) };
}

/** null when the token is missing, forged, or over. */
export function readAccess(
  token: string | undefined,
  now: Date,
): (AccessClaims & { endsAt: Date }) | null {
  if (!token) return null;
  try {
    const header = jwt.decode(token, { complete: true })?.header;
    const key = keyRing().keys.find((one) => one.id === header?.kid);
    if (!key) return null;
    const claims = jwt.verify(token, keyFor(key.secret, 'access'), {
      algorithms: ['HS256'],
      clockTimestamp: Math.floor(now.getTime() / 1000),
    }) as { sid: string; gen: number; exp: number };
    return { sessionId: claims.sid, generation: claims.gen, endsAt: new Date(claims.exp * 1000) };
  } catch {
    return null;
  }
}
