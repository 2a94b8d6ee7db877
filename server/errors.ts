import { type ErrorCode, errorStatus } from '#shared/api/errors.ts';

/** The one error services throw. `message` is for people and says what to do next. */
export class AppError extends Error {
  readonly code: ErrorCode;
  /** Keyed by the input's dotted path. */
  readonly fields: Record<string, string> | undefined;
  /** Extra answer parts, such as the day as it is now beside a 409. */
  readonly extra: Record<string, unknown> | undefined;

  constructor(
    code: ErrorCode,
    message: string,
    details: { fields?: Record<string, string>; extra?: Record<string, unknown> } = {},
  ) {
    super(message);
    this.name = 'AppError';
    this.code = code;
    this.fields = details.fields;
    this.extra = details.extra;
  }

  get status(): number {
    return errorStatus[this.code];
  }
}

/** Another business's thing looks exactly like a thing that does not exist. */
export function notFound(what: string): AppError {
  return new AppError('notFound', `There is no such ${what} here.`);
}

/** One bad field, named, with what would be right. */
export function badField(field: string, message: string): AppError {
  return new AppError('badInput', `Please look at ${field}: ${message}.`, {
    fields: { [field]: message },
  });
}
