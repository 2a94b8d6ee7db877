import pino from 'pino';
import { env } from '#server/env.ts';

/** Structured log lines on stderr, so that stdout stays free for the ready line. */
export const log = pino(
  {
    level: env.isTest ? 'silent' : (process.env.LOG_LEVEL ?? 'warn'),
    redact: ['req.headers.cookie', 'req.headers.authorization', 'res.headers["set-cookie"]'],
  },
  pino.destination(2),
);
