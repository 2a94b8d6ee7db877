import { mostPhotoBytes, mostPhotoPixels } from '#shared/api/photos.ts';

/**
 * A photo as the server keeps it, made small before it goes over a phone's network: JPEG, longest
 * side 1600 px, turned upright, nothing of place or camera in it. A kind this browser cannot draw
 * (HEIC) goes as it is, for the server to read.
 * @throws Error in words when it is too large to send so.
 */
export async function shrinkPhoto(file: Blob): Promise<Blob> {
  const small = await redraw(file);
  if (small) return small;
  if (file.size > mostPhotoBytes)
    throw new Error(
      `This photo cannot be made smaller here and has ${megabytes(file.size)} MB; send one under ${megabytes(mostPhotoBytes)} MB.`,
    );
  return file;
}

/** Width and height that fit, never larger than they were. */
export function fitWithin(
  width: number,
  height: number,
  most = mostPhotoPixels,
): { width: number; height: number } {
  const scale = Math.min(1, most / Math.max(width, height));
  return {
    width: Math.max(1, Math.round(width * scale)),
    height: Math.max(1, Math.round(height * scale)),
  };
}

async function redraw(file: Blob): Promise<Blob | null> {
  let picture: ImageBitmap;
  try {
    picture = await createImageBitmap(file, { imageOrientation: 'from-image' });
  } catch {
    return null;
  }
  const canvas = document.createElement('canvas');
  Object.assign(canvas, fitWithin(picture.width, picture.height));
  const pen = canvas.getContext('2d');
  // JPEG has no see-through parts: they would turn black.
  if (pen) {
    pen.fillStyle = '#fff';
    pen.fillRect(0, 0, canvas.width, canvas.height);
    pen.drawImage(picture, 0, 0, canvas.width, canvas.height);
  }
  picture.close();
  if (!pen) return null;
  return new Promise((resolve) => canvas.toBlob(resolve, 'image/jpeg', 0.86));
}

function megabytes(bytes: number): number {
  return Math.round(bytes / 1024 / 1024);
}
