/**
 * Milliseconds until a text the carrier did not take is tried again: 5 s doubling to 5 min, with
 * half of it drawn, so that texts held back together do not come back together.
 * `attempts` counts from 1; `dice` is uniform in [0, 1).
 */
export function nextTryMs(attempts: number, dice: () => number): number {
  const full = Math.min(300_000, 5000 * 2 ** Math.min(attempts - 1, 10));
  return Math.round(full / 2 + (full / 2) * dice());
}
