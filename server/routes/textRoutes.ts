import { Router } from 'express';
import * as api from '#shared/api/texts.ts';
import { fakesActive } from '#server/env.ts';
import { notFound } from '#server/errors.ts';
import { handle, handlePublic } from '#server/http/handle.ts';
import { presentText } from '#server/presenters/text.ts';
import {
  listFakeLetters,
  listFakePhones,
  replyFromFakePhone,
} from '#server/services/texts/fakePages.ts';
import { listTexts } from '#server/services/texts/listTexts.ts';

export const textRoutes = Router();

handle(textRoutes, api.listTexts, 'texts.read', async ({ query }) =>
  (await listTexts(query)).map(presentText),
);

// Before anything is read from the call, so that a server without fakes looks as if it had none.
textRoutes.use('/api/fake', (_req, _res, next) => {
  next(fakesActive() ? undefined : notFound('page'));
});
handlePublic(textRoutes, api.listFakePhones, async () => listFakePhones());
handlePublic(textRoutes, api.replyFromFakePhone, async ({ body }) => {
  await replyFromFakePhone(body.phone, body.body);
  return { done: true } as const;
});
handlePublic(textRoutes, api.listFakeLetters, async () => listFakeLetters());
