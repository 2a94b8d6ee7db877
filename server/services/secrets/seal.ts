import { createCipheriv, createDecipheriv, randomBytes } from 'node:crypto';
import { keyRing } from '#server/env.ts';

/** Where a sealed text lives; bound to it as associated data, so it opens nowhere else. */
export interface SealPlace {
  businessId: string;
  rowId: string;
  field: string;
}

const algorithm = 'aes-256-gcm';
/** Said aloud: Node would also open with a tag cut to four bytes, which is quickly guessed. */
const authTagLength = 16;

/** AES-256-GCM (NIST SP 800-38D): `keyId.nonce.tag.text`, base64url. */
export function seal(text: string, place: SealPlace): string {
  const key = keyRing().keys[0]!;
  const nonce = randomBytes(12);
  const cipher = createCipheriv(algorithm, key.secret, nonce, { authTagLength });
  cipher.setAAD(associated(place));
  const sealed = Buffer.concat([cipher.update(text, 'utf8'), cipher.final()]);
  return [
    key.id,
    ...[nonce, cipher.getAuthTag(), sealed].map((part) => part.toString('base64url')),
  ].join('.');
}

/** Throws when the text was changed, moved to another row, or its key is no longer in the ring. */
export function openSeal(sealed: string, place: SealPlace): string {
  const [keyId, nonce, tag, text] = sealed.split('.');
  const key = keyRing().keys.find((one) => one.id === keyId);
  if (!key || nonce === undefined || tag === undefined || text === undefined)
    throw new Error(`A sealed ${place.field} cannot be opened: its key is not in FURLONG_KEYS.`);
  const decipher = createDecipheriv(algorithm, key.secret, Buffer.from(nonce, 'base64url'), {
    authTagLength,
  });
  decipher.setAAD(associated(place));
  decipher.setAuthTag(Buffer.from(tag, 'base64url'));
  return Buffer.concat([
    decipher.update(Buffer.from(text, 'base64url')),
    decipher.final(),
  ]).toString('utf8');
}

function associated(place: SealPlace): Buffer {
  return Buffer.from(`${place.businessId}/${place.rowId}/${place.field}`, 'utf8');
}
