import type { Request } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { env } from '#server/env.ts';
import { AppError } from '#server/errors.ts';

const minutes = 15;

/** Guessing a password: ten wrong tries in a quarter of an hour from one address for one e-mail. */
export const limitSignIn = limiter(10, (req) => `${addressOf(req)} ${emailOf(req)}`, 'failures');

/** Trying many e-mails: sixty failures in a quarter of an hour from one address. */
export const limitFailures = limiter(60, addressOf, 'failures');

/** Guessing links: more than many phones behind one network's address ask for when theirs have expired. */
export const limitLinks = limiter(300, addressOf, 'failures');

/** Making businesses, asking for letters: twenty in a quarter of an hour from one address. */
export const limitMaking = limiter(20, addressOf, 'all');

/** Letters nobody asked for: five in a quarter of an hour to one e-mail, whoever asks. */
export const limitLetters = limiter(5, emailOf, 'all');

function limiter(limit: number, keyGenerator: (req: Request) => string, count: 'failures' | 'all') {
  return rateLimit({
    windowMs: minutes * 60_000,
    limit,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    // Tests of everything else sign in hundreds of times; the limiters have tests of their own.
    skip: () => env.isTest && process.env.FURLONG_TEST_LIMITS !== '1',
    skipSuccessfulRequests: count === 'failures',
    keyGenerator,
    handler: (_req, _res, next) =>
      next(new AppError('tooMany', `Too many tries. Wait ${minutes} minutes, then try again.`)),
  });
}

/** The caller's address; of IPv6 the network, because one caller has a whole one. */
function addressOf(req: Request): string {
  return ipKeyGenerator(req.ip ?? '');
}

/** As the contract reads it, so that blanks and capitals are no new subject. */
function emailOf(req: Request): string {
  const { email } = (req.body ?? {}) as { email?: unknown };
  return String(email ?? '')
    .trim()
    .toLowerCase()
    .slice(0, 254);
}
