import { z } from 'zod';

/** Every error code and the HTTP status it travels with. */
export const errorStatus = {
  badInput: 400,
  signInNeeded: 401,
  wrongSignIn: 401,
  notAllowed: 403,
  badOrigin: 403,
  notFound: 404,
  versionMoved: 409,
  alreadyThere: 409,
  refusedMove: 409,
  linkUsedUp: 410,
  tooLarge: 413,
  updateNeeded: 426,
  tooMany: 429,
  broken: 500,
  notReady: 503,
} as const;

export type ErrorCode = keyof typeof errorStatus;

/** The one shape an error has on the wire. `fields` is keyed by the input's dotted path. */
export const errorBody = z.object({
  error: z.object({
    code: z.enum(Object.keys(errorStatus) as [ErrorCode, ...ErrorCode[]]),
    message: z.string(),
    fields: z.record(z.string(), z.string()).optional(),
    requestId: z.string(),
  }),
});

export type ErrorBody = z.infer<typeof errorBody>;
