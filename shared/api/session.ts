import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { currency, distanceUnit, timeZone, weightUnit } from './business.ts';
import { done, email, id, name, password, role } from './values.ts';

export const session = z.object({
  user: z.object({ id, name: z.string(), email: z.string() }),
  business: z.object({
    id,
    name: z.string(),
    timeZone: z.string(),
    currency: z.string(),
    distanceUnit,
    weightUnit,
    areaName: z.string(),
    areaVersion: z.string().nullable(),
    /** [minLon, minLat, maxLon, maxLat] of the area, null before one is imported. */
    areaBounds: z.tuple([z.number(), z.number(), z.number(), z.number()]).nullable(),
    attribution: z.string().nullable(),
  }),
  roles: z.array(role),
  groomerId: id.nullable(),
  abilities: z.array(z.string()),
  otherBusinesses: z.array(z.object({ id, name: z.string() })),
  /** Sent back in the X-Furlong-Csrf header with every change. */
  csrfToken: z.string(),
  accessEndsAt: z.string(),
  serverNow: z.string(),
  fakesActive: z.boolean(),
});
export type Session = z.infer<typeof session>;

export const signUp = endpoint({
  method: 'POST',
  path: '/api/sign-up',
  summary: 'Create a business and its operator',
  body: z.object({
    name,
    email,
    password,
    businessName: name,
    timeZone,
    currency,
    distanceUnit,
    weightUnit,
  }),
  response: session,
});

export const signIn = endpoint({
  method: 'POST',
  path: '/api/sign-in',
  summary: 'Sign in with e-mail and password',
  body: z.object({ email, password: z.string().min(1, 'must not be empty').max(200) }),
  response: session,
});

export const signOut = endpoint({
  method: 'POST',
  path: '/api/sign-out',
  summary: 'End this sign-in on this device',
  response: done,
});

export const refreshSession = endpoint({
  method: 'POST',
  path: '/api/session/refresh',
  summary: 'Rotate the refresh token and renew access',
  response: session,
});

export const getSession = endpoint({
  method: 'GET',
  path: '/api/session',
  summary: 'Who is signed in, with abilities',
  response: session,
});

export const switchBusiness = endpoint({
  method: 'POST',
  path: '/api/session/business',
  summary: 'Work in another business of the same person',
  body: z.object({ businessId: id }),
  response: session,
});

export const requestPasswordReset = endpoint({
  method: 'POST',
  path: '/api/password-reset',
  summary: 'Send a reset letter; the answer is the same whether or not the address is known',
  body: z.object({ email }),
  response: done,
});

export const resetPassword = endpoint({
  method: 'POST',
  path: '/api/password-reset/:token',
  summary: 'Set a new password with the link from the letter',
  params: z.object({ token: z.string().min(10).max(64) }),
  body: z.object({ password }),
  response: done,
});
