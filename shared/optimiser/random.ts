/** Seeded dice: the same seed throws the same numbers in [0, 1) on every machine (mulberry32). */
export class Dice {
  #state: number;

  constructor(seed: number) {
    this.#state = (seed ^ 0x9e3779b9) | 0;
  }

  next(): number {
    this.#state = (this.#state + 0x6d2b79f5) | 0;
    let t = Math.imul(this.#state ^ (this.#state >>> 15), 1 | this.#state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  }

  /** A whole number from 0 up to, not including, `below`. */
  below(below: number): number {
    return Math.floor(this.next() * below);
  }

  chance(probability: number): boolean {
    return this.next() < probability;
  }
}
