import { type Request, type Response, Router } from 'express';
import * as api from '#shared/api/session.ts';
import { clock } from '#server/clock.ts';
import { AppError } from '#server/errors.ts';
import { needCsrf, ownOrigin } from '#server/http/csrf.ts';
import { handle, handlePublic } from '#server/http/handle.ts';
import { limitFailures, limitLetters, limitMaking, limitSignIn } from '#server/http/limits.ts';
import {
  clearSessionCookies,
  refreshTokenOf,
  setSessionCookies,
} from '#server/http/sessionCookies.ts';
import { presentSession } from '#server/presenters/session.ts';
import { authenticate } from '#server/services/accounts/authenticate.ts';
import { describeSession } from '#server/services/accounts/describeSession.ts';
import type { SessionTokens } from '#server/services/accounts/openSession.ts';
import { refreshSession } from '#server/services/accounts/refreshSession.ts';
import { requestPasswordReset, resetPassword } from '#server/services/accounts/resetPassword.ts';
import { signIn, signOut, switchBusiness } from '#server/services/accounts/signIn.ts';
import { signUp } from '#server/services/accounts/signUp.ts';

export const sessionRoutes = Router();
const done = { done: true } as const;

// Signing up checks the password of an address that is known, so it is a way to guess one too.
sessionRoutes.post([api.signIn.path, api.signUp.path], limitFailures, limitSignIn);
sessionRoutes.post(api.signUp.path, limitMaking);
sessionRoutes.post(api.requestPasswordReset.path, limitMaking, limitLetters);
sessionRoutes.post(api.resetPassword.path, limitFailures);

handlePublic(sessionRoutes, api.signUp, async ({ body, now, req, res }) =>
  enter(req, res, await signUp(body, now)),
);
handlePublic(sessionRoutes, api.signIn, async ({ body, now, req, res }) =>
  enter(req, res, await signIn(body.email, body.password, now)),
);
handlePublic(sessionRoutes, api.refreshSession, async ({ now, req, res }) => {
  const { actor, tokens } = await refreshSession(refreshTokenOf(req), now);
  setSessionCookies(req, res, tokens);
  return presentSession(await describeSession(actor, now));
});
handlePublic(sessionRoutes, api.requestPasswordReset, async ({ body, now, req }) => {
  await requestPasswordReset(body.email, ownOrigin(req), now);
  return done;
});
handlePublic(sessionRoutes, api.resetPassword, async ({ params, body, now }) => {
  await resetPassword(params.token, body.password, now);
  return done;
});
handle(sessionRoutes, api.getSession, 'signedIn', async ({ actor, now }) =>
  presentSession(await describeSession(actor, now)),
);
handle(sessionRoutes, api.signOut, 'signedIn', async ({ actor, now, req, res }) => {
  await signOut(actor, now);
  clearSessionCookies(req, res);
  return done;
});
handlePublic(sessionRoutes, api.switchBusiness, async ({ body, now, req, res }) => {
  if (!req.actor) throw new AppError('signInNeeded', 'Please sign in.');
  needCsrf(req, req.actor.sessionId);
  return enter(req, res, await switchBusiness(req.actor, body.businessId, now));
});

/** Sets the cookies of a new sign-in and answers with its session. */
export async function enter(req: Request, res: Response, tokens: SessionTokens) {
  setSessionCookies(req, res, tokens);
  const now = clock.now();
  const actor = await authenticate(tokens.access, now);
  if (!actor) throw new AppError('signInNeeded', 'Please sign in again.');
  return presentSession(await describeSession(actor, now));
}
