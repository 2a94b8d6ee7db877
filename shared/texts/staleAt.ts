import type { TextKind } from './renderText.ts';

const minute = 60_000;
/** Minutes after its due time until a text would confuse more than help. Defaults, not measured. */
const lifeMinutes: { [Kind in TextKind]: number } = {
  booked: 24 * 60,
  reminder: 12 * 60,
  onTheWay: 30,
};

/**
 * The moment (epoch ms) after which a text of this kind must not leave any more. `untilMs` ends it
 * earlier: the late end of the arrival for 'onTheWay', the start of the promise for the others.
 */
export function staleAt(kind: TextKind, dueAtMs: number, untilMs: number | null): number {
  const own = dueAtMs + lifeMinutes[kind] * minute;
  return untilMs === null ? own : Math.min(own, Math.max(untilMs, dueAtMs));
}
