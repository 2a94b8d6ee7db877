/**
 * @typedef {{ role: string, email: string, password: string }} SignIn
 * @typedef {{ progress: string } | { signIns: SignIn[] } | { text: string }} SeedLine
 */

/**
 * Reads one line of the seed's output: `{"step","done","of"}` while it works, `{"signIns"}` at the
 * end, anything else is for people.
 * @param {string} line
 * @returns {SeedLine}
 */
export function seedLine(line) {
  try {
    const value = JSON.parse(line);
    if (Array.isArray(value?.signIns)) return { signIns: value.signIns };
    if (typeof value?.step === 'string') {
      return { progress: value.of ? `${value.step} ${value.done} of ${value.of}` : value.step };
    }
  } catch {
    // Not JSON: a warning, or a stack.
  }
  return { text: line };
}
