import { say } from './say.mjs';

/**
 * Prints how a check went; its own words only when it found something.
 * @param {import('./staticChecks.mjs').CheckResult} result
 */
export function sayCheck({ name, passed, seconds, output }) {
  say(`${passed ? '✓' : '✗'} ${name} (${seconds.toFixed(1)} s)`);
  if (!passed) say(output);
}
