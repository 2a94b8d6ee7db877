import type { DriveBand } from './types.ts';

/**
 * Seconds a leg of `baseSeconds` takes when it leaves at `departSeconds`: each band scales the part
 * of the leg driven inside it, so leaving later never means arriving earlier.
 */
export function driveTime(
  bands: readonly DriveBand[],
  baseSeconds: number,
  departSeconds: number,
): number {
  if (baseSeconds === 0) return 0;
  const last = bands.length - 1;
  if (last === 0) {
    const permille = bands[0]!.permille;
    return permille === 1000 ? baseSeconds : Math.floor((baseSeconds * permille) / 1000 + 0.5);
  }
  let band = last;
  while (band > 0 && bands[band]!.fromSeconds > departSeconds) band -= 1;
  let at = departSeconds;
  let left = baseSeconds;
  for (; band < last; band += 1) {
    const edge = bands[band + 1]!.fromSeconds;
    const covers = ((edge - at) * 1000) / bands[band]!.permille;
    if (covers >= left) break;
    left -= covers;
    at = edge;
  }
  return Math.floor(at + (left * bands[band]!.permille) / 1000 + 0.5) - departSeconds;
}
