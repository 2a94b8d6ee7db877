import { createHash } from 'node:crypto';
import { fileTypeFromBuffer } from 'file-type';
import sharp from 'sharp';
import { badField } from '#server/errors.ts';

/** A photo as it is kept. */
export interface PlainPhoto {
  data: Buffer;
  width: number;
  height: number;
  sha256: string;
}

const mostPixels = 1600;
/** What a phone's camera makes at most; past it lies only a picture made to fill the memory. */
const mostPixelsIn = 64_000_000;
const taken = ['image/jpeg', 'image/png', 'image/webp', 'image/avif'];

/**
 * A sent file made into a JPEG of at most 1600 pixels a side, upright, without metadata: a photo of a
 * pet must not tell where it lives. The type is told by the content, never by the name.
 */
export async function readPhoto(file: Buffer): Promise<PlainPhoto> {
  const type = await fileTypeFromBuffer(file);
  if (!type || !taken.includes(type.mime))
    throw badField('photo', 'must be a JPEG, PNG, WebP or AVIF picture');
  try {
    // sharp keeps no metadata unless asked; the turn noted in it is made before it goes.
    const { data, info } = await sharp(file, { limitInputPixels: mostPixelsIn, failOn: 'error' })
      .rotate()
      .resize({ width: mostPixels, height: mostPixels, fit: 'inside', withoutEnlargement: true })
      .flatten({ background: '#ffffff' })
      .jpeg({ quality: 82 })
      .toBuffer({ resolveWithObject: true });
    const sha256 = createHash('sha256').update(data).digest('hex');
    return { data, width: info.width, height: info.height, sha256 };
  } catch {
    throw badField('photo', 'could not be read: send the picture again, of at most 64 megapixels');
  }
}
