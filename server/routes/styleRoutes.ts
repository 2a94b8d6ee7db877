import { Router } from 'express';
import * as petStyleApi from '#shared/api/petStyles.ts';
import * as photoApi from '#shared/api/photos.ts';
import * as styleApi from '#shared/api/styles.ts';
import { handle } from '#server/http/handle.ts';
import { readUpload } from '#server/http/readUpload.ts';
import { presentPetStyle, presentPhoto, presentStyle } from '#server/presenters/style.ts';
import { addPhoto, getPhoto, removePhoto } from '#server/services/photos/photos.ts';
import { addPetStyle, listPetStyles } from '#server/services/styles/petStyles.ts';
import {
  createStyle,
  listStyles,
  retireStyle,
  updateStyle,
} from '#server/services/styles/styles.ts';

export const styleRoutes = Router();

handle(styleRoutes, styleApi.listStyles, 'households.read', async () =>
  (await listStyles()).map(presentStyle),
);
handle(styleRoutes, styleApi.createStyle, 'households.edit', async ({ body, now }) =>
  presentStyle(await createStyle(body, now)),
);
handle(styleRoutes, styleApi.updateStyle, 'households.edit', async ({ params, body }) =>
  presentStyle(await updateStyle(params.styleId, body)),
);
handle(styleRoutes, styleApi.retireStyle, 'households.edit', async ({ params, body }) =>
  presentStyle(await retireStyle(params.styleId, body.retired)),
);

handle(styleRoutes, petStyleApi.listPetStyles, 'households.read', async ({ params }) =>
  (await listPetStyles(params.petId)).map(presentPetStyle),
);
handle(
  styleRoutes,
  petStyleApi.addPetStyle,
  'households.edit',
  async ({ actor, params, body, now }) =>
    presentPetStyle(await addPetStyle(params.petId, body, now, actor.userName)),
);

handle(
  styleRoutes,
  photoApi.addPhoto,
  'households.edit',
  async ({ actor, params, now, req }) =>
    presentPhoto(
      await addPhoto(actor.businessId, { ...params, file: req.file?.buffer ?? null }, now),
    ),
  { readBody: readUpload('photo', photoApi.mostPhotoBytes) },
);
handle(styleRoutes, photoApi.getPhoto, 'households.read', async ({ actor, params, res }) => {
  const data = await getPhoto(actor.businessId, params.photoId);
  // A photo never changes under its id; only this person's browser may keep it.
  res
    .set('Cache-Control', 'private, max-age=86400, immutable')
    .set('X-Content-Type-Options', 'nosniff')
    .type('image/jpeg')
    .send(data);
  return '';
});
handle(styleRoutes, photoApi.removePhoto, 'households.edit', async ({ actor, params }) => {
  await removePhoto(actor.businessId, params.photoId);
  return { done: true as const };
});
