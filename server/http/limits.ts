import { rateLimit } from 'express-rate-limit';
import { env } from '#server/env.ts';
import { AppError } from '#server/errors.ts';

/** Guessing a password: ten tries in a quarter of an hour from one address for one e-mail. */
export const limitSignIn = limiter(15, 10, (body) =>
  String(body.email ?? '')
    .toLowerCase()
    .slice(0, 254),
);

/** Guessing links, making businesses: sixty in a quarter of an hour from one address. */
export const limitLinks = limiter(15, 60, () => '');

function limiter(
  minutes: number,
  limit: number,
  subject: (body: Record<string, unknown>) => string,
) {
  return rateLimit({
    windowMs: minutes * 60_000,
    limit,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    // Tests of everything else sign in hundreds of times; the limiter has a test of its own.
    skip: () => env.isTest && process.env.FURLONG_TEST_LIMITS !== '1',
    skipSuccessfulRequests: true,
    validate: { keyGeneratorIpFallback: false },
    keyGenerator: (req) =>
      `${req.ip ?? ''} ${subject((req.body ?? {}) as Record<string, unknown>)}`,
    handler: (_req, _res, next) =>
      next(
        new AppError('tooMany', `Too many tries. Wait ${minutes} minutes, or reset the password.`),
      ),
  });
}
