/** Dice that always fall the same way for one seed. */
export interface Random {
  /** 0 ≤ x < 1 */
  next(): number;
  between(low: number, high: number): number;
  chance(share: number): boolean;
}

/** mulberry32 (Tommy Ettinger, public domain): 32-bit state, good enough for drawing a town. */
export function seededRandom(seed: number): Random {
  let state = seed >>> 0;
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32;
  };
  return {
    next,
    between: (low, high) => low + (high - low) * next(),
    chance: (share) => next() < share,
  };
}
