/** A set-up problem a person can act on: printed as its message alone, without a stack. */
export class SetupError extends Error {
  /** @override */
  name = 'SetupError';
}
