/**
 * Why a text did not go, or may not have.
 * 'refused': the carrier said no to this text; trying the same again is useless.
 * 'notTaken': the carrier took nothing (busy, unreachable, sign-in wrong); try later.
 * 'unknown': the answer was lost, so the text may be on its way; look it up before trying again.
 */
export class CarrierError extends Error {
  readonly outcome: 'refused' | 'notTaken' | 'unknown';
  /** The carrier's own code, such as 21610, when it gave one. */
  readonly code: number | null;

  constructor(outcome: CarrierError['outcome'], code: number | null, message: string) {
    super(message);
    this.name = 'CarrierError';
    this.outcome = outcome;
    this.code = code;
  }
}

/** Reads what the SDK threw. */
export function carrierErrorOf(error: unknown): CarrierError {
  const { status, code, message } = error as { status?: number; code?: unknown; message?: string };
  const words = message ?? String(error);
  if (typeof status === 'number') {
    const known = typeof code === 'number' ? code : null;
    if (status === 429 || status === 401) return new CarrierError('notTaken', known, words);
    if (status >= 400 && status < 500) return new CarrierError('refused', known, words);
    return new CarrierError('unknown', known, words);
  }
  // Without a connection no text can have been taken; any later break leaves it open.
  const neverReached = ['ECONNREFUSED', 'ENOTFOUND', 'EAI_AGAIN', 'EHOSTUNREACH', 'ENETUNREACH'];
  const outcome = neverReached.includes(String(code)) ? 'notTaken' : 'unknown';
  return new CarrierError(outcome, null, words);
}
