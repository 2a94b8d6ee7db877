/** For `register(path, { setValueAs: emptyToNull })`: an entry left empty is no value. */
export function emptyToNull(value: unknown): unknown {
  return typeof value === 'string' && value.trim() === '' ? null : value;
}
