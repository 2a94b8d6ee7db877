import { type ArrivalSpread, chanceByPermille, expectedLateSeconds } from './arrivalSpread.ts';

/** An arrival window to offer, and how safe it is. */
export interface SuggestedWindow {
  startSeconds: number;
  endSeconds: number;
  onTimePermille: number;
}

/** How a window is cut. */
export interface WindowShape {
  /** Default two hours, common practice for home visits. */
  lengthSeconds?: number;
  /** Windows start on multiples of this; default a quarter of an hour. */
  gridSeconds?: number;
  /** What a second late weighs against a second of waiting at the door; default 6. */
  lateFactor?: number;
}

/**
 * The window around an arrival that costs least: seconds late past its end weigh `lateFactor`,
 * seconds of waiting before its start weigh one. Ties go to the later window, which is the safer.
 */
export function promiseWindow(arrival: ArrivalSpread, shape: WindowShape = {}): SuggestedWindow {
  const length = shape.lengthSeconds ?? 7200;
  const grid = shape.gridSeconds ?? 900;
  const lateFactor = shape.lateFactor ?? 6;
  if (!(length > 0) || !(grid > 0))
    throw new RangeError('lengthSeconds and gridSeconds: both must be above 0');
  const middle = Math.floor((arrival.meanSeconds - length / 2) / grid) * grid;
  let best = middle;
  let bestCost = Infinity;
  const reach = Math.ceil(length / grid);
  for (let step = -reach; step <= reach; step += 1) {
    const start = middle + step * grid;
    // E[max(0, start − A)] = E[max(0, A − start)] − (E[A] − start).
    const wait = expectedLateSeconds(arrival, start) - (arrival.meanSeconds - start);
    const cost = lateFactor * expectedLateSeconds(arrival, start + length) + wait;
    if (cost <= bestCost) {
      bestCost = cost;
      best = start;
    }
  }
  const endSeconds = best + length;
  return {
    startSeconds: best,
    endSeconds,
    onTimePermille: chanceByPermille(arrival, endSeconds),
  };
}
