import pino from 'pino';
import { env } from '#server/env.ts';

/** What a log line may say of a call and of an error: never a link's token, a header or a row's values. */
export const logSerializers = {
  req: (req: { id: unknown; method: string; url: string }) => ({
    id: req.id,
    method: req.method,
    url: hideTokens(req.url),
  }),
  res: (res: { statusCode: number | null }) => ({ statusCode: res.statusCode }),
  err: (error: Error & { code?: unknown }) => ({
    type: error.name,
    message: withoutSql(error.message),
    code: error.code,
    stack: withoutSql(error.stack ?? ''),
  }),
};

/** Structured log lines on stderr, so that stdout stays free for the ready line. */
export const log = pino(
  {
    level: env.isTest ? 'silent' : (process.env.LOG_LEVEL ?? 'warn'),
    serializers: logSerializers,
  },
  pino.destination(2),
);

/** Links carry 22 letters (see services/secrets/tokens); callbacks a signature in `mark`. */
function hideTokens(url: string): string {
  return url.replace(/\/[\w-]{22}(?=[/?#]|$)/g, '/…').replace(/([?&](?:mark|token)=)[^&]*/g, '$1…');
}

/** The database's messages repeat the statement with its values: names, phones, sealed codes. */
function withoutSql(text: string): string {
  return text.replace(/\nsql: .*?(?=\n {4}at |$)/gs, '');
}
