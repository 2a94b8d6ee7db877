import { env } from '#server/env.ts';

/** The server's only clock. Services take `now` as an argument; doors (http, jobs) read it here. */
export const clock = {
  offsetMs: env.clockOffsetMs,
  now(): Date {
    return new Date(Date.now() + this.offsetMs);
  },
};
