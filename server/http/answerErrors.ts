import type { ErrorRequestHandler, RequestHandler } from 'express';
import { AppError } from '#server/errors.ts';
import { log } from '#server/log.ts';

/** Anything under /api nobody answered. */
export const answerUnknown: RequestHandler = (_req, _res, next) => {
  next(new AppError('notFound', 'There is no such page or thing here.'));
};

/** The one place an error becomes an answer; what nobody foresaw becomes a bland 500 with a request id. */
export const answerErrors: ErrorRequestHandler = (error: unknown, req, res, next) => {
  if (res.headersSent) return next(error);
  const known = error instanceof AppError ? error : fromParser(error);
  if (!known) log.error({ err: error, requestId: req.id }, 'request failed');
  res
    .status(known?.status ?? 500)
    .setHeader('Cache-Control', 'no-store')
    .json({
      error: {
        code: known?.code ?? 'broken',
        message:
          known?.message ?? 'Something broke on our side. Nothing was saved. Please try again.',
        ...(known?.fields && { fields: known.fields }),
        requestId: req.id,
      },
      ...known?.extra,
    });
};

/** Express's body parser and router throw their own errors for bad JSON, size and odd escapes. */
function fromParser(error: unknown): AppError | null {
  const { type, status } = (error ?? {}) as { type?: string; status?: number };
  if (type === 'entity.too.large')
    return new AppError('tooLarge', 'This is more than one call may carry.');
  if (
    type?.startsWith('entity.') ||
    type?.startsWith('encoding.') ||
    error instanceof URIError ||
    status === 400
  )
    return new AppError('badInput', 'The call could not be read: the body must be JSON.');
  return null;
}
