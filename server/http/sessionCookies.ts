import type { CookieOptions, Request, RequestHandler, Response } from 'express';
import { clock } from '#server/clock.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { authenticate } from '#server/services/accounts/authenticate.ts';
import {
  accessSeconds,
  refreshSeconds,
  type SessionTokens,
} from '#server/services/accounts/openSession.ts';
import { ownOrigin } from './csrf.ts';

declare module 'express-serve-static-core' {
  interface Request {
    id: string;
    actor: Actor | null;
  }
}

const access = 'furlong_access';
const refresh = 'furlong_refresh';
/** The refresh token travels only where it is used. */
const refreshPath = '/api/session/refresh';

/** Puts the signed-in person on the request, or null. */
export const readActor: RequestHandler = async (req, _res, next) => {
  req.actor = await authenticate(cookieOf(req, access), clock.now());
  next();
};

export function refreshTokenOf(req: Request): string | undefined {
  return cookieOf(req, refresh);
}

export function setSessionCookies(req: Request, res: Response, tokens: SessionTokens): void {
  const options = cookieOptions(req);
  res.cookie(access, tokens.access, { ...options, maxAge: accessSeconds * 1000 });
  if (tokens.refresh !== null)
    res.cookie(refresh, tokens.refresh, {
      ...options,
      path: refreshPath,
      maxAge: refreshSeconds * 1000,
    });
}

export function clearSessionCookies(req: Request, res: Response): void {
  const options = cookieOptions(req);
  res.clearCookie(access, options);
  res.clearCookie(refresh, { ...options, path: refreshPath });
}

function cookieOptions(req: Request): CookieOptions {
  return {
    httpOnly: true,
    sameSite: 'strict',
    secure: ownOrigin(req).startsWith('https:'),
    path: '/',
  };
}

function cookieOf(req: Request, name: string): string | undefined {
  return (req.cookies as Record<string, string> | undefined)?.[name];
}
