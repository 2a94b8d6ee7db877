import { ApiError } from '#src/api/ApiError.ts';

/** Refusals that pass: asking again later (or after signing in, or updating) can succeed. */
const passing = new Set([401, 408, 409, 425, 426, 429]);

/** Why the server will never take a tap, in words; null when sending again can help. */
export function refusalOf(error: unknown): string | null {
  if (!(error instanceof ApiError)) return null;
  const forGood = error.status >= 400 && error.status < 500 && !passing.has(error.status);
  // A forgery token that went stale is renewed by the next call; it says nothing about the tap.
  return forGood && error.code !== 'badOrigin' ? error.message : null;
}
