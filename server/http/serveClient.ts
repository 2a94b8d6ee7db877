import { existsSync } from 'node:fs';
import { join } from 'node:path';
import express, { Router } from 'express';
import { env } from '#server/env.ts';
import { AppError } from '#server/errors.ts';

/** The built client: hashed assets for ever, the page itself never from a cache. */
export function serveClient(): Router {
  const router = Router();
  const dist = join(env.rootFolder, 'dist');
  router.use(
    '/assets',
    express.static(join(dist, 'assets'), {
      immutable: true,
      maxAge: '1y',
      index: false,
      fallthrough: false,
    }),
  );
  // The arrival page is served filled, by its link only.
  router.get('/src/arrival.html', (_req, _res, next) =>
    next(new AppError('notFound', 'There is no such page here.')),
  );
  router.use(express.static(dist, { index: false, maxAge: '1h' }));
  router.get(/.*/, (_req, res, next) => {
    const page = join(dist, 'index.html');
    if (!existsSync(page))
      return next(
        new AppError('notReady', 'The client is not built yet. Run npm start, or npm run dev.'),
      );
    res.setHeader('Cache-Control', 'no-cache');
    res.sendFile(page);
  });
  return router;
}
