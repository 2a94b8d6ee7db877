import type { ReadyVisit } from './compileDay.ts';
import type { Begin } from './walkState.ts';

/**
 * When a stay of `staySeconds` may begin for an arrival (RULES.md 5): in the window missed by least,
 * then the earliest beginning. Written into `found`, so that the search makes no garbage.
 */
export function findBegin(
  found: Begin,
  visit: ReadyVisit,
  arriveSeconds: number,
  staySeconds: number,
): void {
  const from = arriveSeconds > visit.notBefore ? arriveSeconds : visit.notBefore;
  const windows = visit.windows;
  found.atSeconds = from;
  found.missedBy = 0;
  found.heldUntilSeconds = visit.notBefore;
  if (windows.length === 0) return;
  let missed = Infinity;
  for (let i = 0; i < windows.length; i += 1) {
    const window = windows[i]!;
    const at = from > window.startSeconds ? from : window.startSeconds;
    const late = (window.binds === 'stay' ? at + staySeconds : at) - window.endSeconds;
    const by = late > 0 ? late : 0;
    if (by < missed || (by === missed && at < found.atSeconds)) {
      missed = by;
      found.atSeconds = at;
      found.heldUntilSeconds =
        window.startSeconds > visit.notBefore ? window.startSeconds : visit.notBefore;
    }
  }
  found.missedBy = missed;
}
