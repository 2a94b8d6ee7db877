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
  const known = knownError(error);
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

/** The error as one of ours, with its words for people; null for what nobody foresaw. */
export function knownError(error: unknown): AppError | null {
  return error instanceof AppError ? error : fromParser(error);
}

/**
 * Express's body parser, router and file server throw their own errors for bad JSON, size, odd
 * escapes and files that are not there. Whatever they blame on the caller is no fault of ours.
 */
function fromParser(error: unknown): AppError | null {
  if (error instanceof URIError)
    return new AppError('badInput', 'The call could not be read: its address is not well formed.');
  const { status, expose } = (error ?? {}) as { status?: number; expose?: boolean };
  if (expose === undefined || status === undefined || status >= 500) return null;
  if (status === 413) return new AppError('tooLarge', 'This is more than one call may carry.');
  if (status === 403 || status === 404 || status === 405)
    return new AppError('notFound', 'There is no such page or thing here.');
  return new AppError('badInput', 'The call could not be read: the body must be JSON.');
}
