import { createHash, createHmac, randomBytes, timingSafeEqual } from 'node:crypto';
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
  return createHmac('sha256', keyRing().keys[0]!.secret)
    .update(`${purpose}\n${value}`)
    .digest('base64url')
    .slice(0, 32);
}

/** True when any key of the ring made the signature. */
export function signatureFits(purpose: string, value: string, signature: string): boolean {
  return keyRing().keys.some(({ secret }) => {
    const wanted = createHmac('sha256', secret)
      .update(`${purpose}\n${value}`)
      .digest('base64url')
      .slice(0, 32);
    return (
      wanted.length === signature.length &&
      timingSafeEqual(Buffer.from(wanted), Buffer.from(signature))
    );
  });
}
