import type { Request, RequestHandler } from 'express';
import { env } from '#server/env.ts';
import { AppError } from '#server/errors.ts';
import { signatureFits } from '#server/services/secrets/tokens.ts';

const reading = ['GET', 'HEAD', 'OPTIONS'];

/**
 * A change must carry the token the session endpoint gave out. The cookie is SameSite=Strict
 * already; this also stops a sister subdomain.
 */
export function needCsrf(req: Request, sessionId: string): void {
  if (reading.includes(req.method)) return;
  const token = req.get('X-Furlong-Csrf') ?? '';
  if (!signatureFits('csrf', sessionId, token))
    throw new AppError(
      'badOrigin',
      'This page is out of date. Load it again and repeat the change.',
    );
}

/** Refuses changes that a page of another origin asks for, signed in or not. */
export const refuseOtherOrigins: RequestHandler = (req, _res, next) => {
  const origin = req.get('Origin');
  if (reading.includes(req.method) || origin === undefined || origin === ownOrigin(req))
    return next();
  next(new AppError('badOrigin', 'Changes are taken from Furlong’s own pages only.'));
};

/** The origin people see: PUBLIC_URL behind a proxy, else as called. */
export function ownOrigin(req: Request): string {
  return env.publicUrl ?? `${req.protocol}://${req.get('Host')}`;
}
