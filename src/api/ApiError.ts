import type { ErrorCode } from '#shared/api/errors.ts';

/** `offline`: no answer came. `badAnswer`: the answer does not fit the contract. */
export type ApiErrorCode = ErrorCode | 'offline' | 'badAnswer';

/**
 * Why a call failed, in words for the screen. `fields` is keyed by the input's dotted path; `body`
 * is the whole answer (409 `versionMoved` carries the day as it is now); `status` is 0 offline.
 */
export class ApiError extends Error {
  readonly code: ApiErrorCode;
  readonly status: number;
  readonly fields: Record<string, string>;
  readonly body: unknown;
  readonly requestId: string | null;

  constructor(about: {
    code: ApiErrorCode;
    message: string;
    status: number;
    fields?: Record<string, string> | undefined;
    body?: unknown;
    requestId?: string | null;
  }) {
    super(about.message);
    this.name = 'ApiError';
    this.code = about.code;
    this.status = about.status;
    this.fields = about.fields ?? {};
    this.body = about.body;
    this.requestId = about.requestId ?? null;
  }
}
