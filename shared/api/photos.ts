import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { done, id } from './values.ts';

/** The largest file taken, and the longest side kept. */
export const mostPhotoBytes = 8 * 1024 * 1024;
export const mostPhotoPixels = 1600;
export const mostPhotosPerVersion = 12;

export const photo = z.object({
  id,
  petId: id,
  /** Which version of the pet's style it shows. */
  version: z.int(),
  /** For an `<img src>`: same-origin, needs the sign-in cookie. */
  url: z.string(),
  width: z.int(),
  height: z.int(),
  bytes: z.int(),
  /** When it was added, instant. */
  takenAt: z.string(),
});
export type Photo = z.infer<typeof photo>;

/**
 * The body is multipart/form-data with one file in the field `photo`: JPEG, PNG, WebP or AVIF,
 * told by its content. Kept as JPEG without any metadata (no place, no camera). Errors: 400 with
 * `fields.photo` for another type, a broken file or too many; 413 when it is too large.
 */
export const addPhoto = endpoint({
  method: 'POST',
  path: '/api/pets/:petId/styles/:version/photos',
  summary: 'Add one photo to a version of a pet’s style (multipart, field "photo")',
  params: z.object({ petId: id, version: z.coerce.number().int().min(1).max(100_000) }),
  response: photo,
});
/** Image/jpeg bytes, not JSON. */
export const getPhoto = endpoint({
  method: 'GET',
  path: '/api/photos/:photoId',
  summary: 'A photo, as JPEG',
  params: z.object({ photoId: id }),
  response: z.string(),
});
export const removePhoto = endpoint({
  method: 'DELETE',
  path: '/api/photos/:photoId',
  summary: 'Remove a photo',
  params: z.object({ photoId: id }),
  response: done,
});
