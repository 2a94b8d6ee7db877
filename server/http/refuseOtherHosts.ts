import type { RequestHandler } from 'express';
import { env, isLoopbackHost } from '#server/env.ts';
import { AppError } from '#server/errors.ts';

/**
 * Without PUBLIC_URL the server answers to the names of this machine only: links in letters carry
 * the name a call came by, so a name somebody else chose (a forged Host, a rebound DNS name) is refused.
 */
export const refuseOtherHosts: RequestHandler = (req, _res, next) => {
  if (env.publicUrl !== null || isLoopbackHost(nameOf(req.get('Host') ?? ''))) return next();
  next(
    new AppError(
      'badOrigin',
      'Furlong is not known by this name. Set PUBLIC_URL to the address people use.',
    ),
  );
};

function nameOf(host: string): string {
  try {
    return new URL(`http://${host}`).hostname;
  } catch {
    return '';
  }
}
