import { createHash, createHmac, hkdfSync, randomBytes, timingSafeEqual } from 'node:crypto';
import { keyRing } from '#server/env.ts';

/** 128 random bits as 22 url-safe letters. Only its hash is stored. */
export function makeToken(): string {
  return randomBytes(16).toString('base64url');
}

/** SHA-256, hex: enough for tokens of 128 random bits (passwords go through bcrypt). */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

/** A keyed signature for values that come back to us: CSRF tokens, callback ids. */
export function signValue(purpose: string, value: string): string {
  return signWith(keyRing().keys[0]!.secret, purpose, value);
}

/** True when any key of the ring made the signature. */
export function signatureFits(purpose: string, value: string, signature: string): boolean {
  return keyRing().keys.some(({ secret }) => {
    const wanted = Buffer.from(signWith(secret, purpose, value));
    const given = Buffer.from(signature);
    return wanted.length === given.length && timingSafeEqual(wanted, given);
  });
}

/** A key of the ring for one purpose (HKDF, RFC 5869), so that no two uses share one. */
export function keyFor(secret: Buffer, purpose: string): Buffer {
  return Buffer.from(hkdfSync('sha256', secret, '', purpose, 32));
}

function signWith(secret: Buffer, purpose: string, value: string): string {
  return createHmac('sha256', keyFor(secret, purpose))
    .update(value)
    .digest('base64url')
    .slice(0, 32);
}
