/** A binary heap of search states ordered by a cost array, with places known so that costs can drop. */
export class StateHeap {
  size = 0;
  readonly #cost: Float64Array;
  readonly #states: Int32Array;
  /** Where a state stands in the heap; −1 when it does not. */
  readonly #place: Int32Array;

  constructor(cost: Float64Array) {
    this.#cost = cost;
    this.#states = new Int32Array(cost.length);
    this.#place = new Int32Array(cost.length).fill(-1);
  }

  /** Puts a state in, or moves it up after its cost dropped. */
  push(state: number): void {
    let at = this.#place[state]!;
    if (at < 0) at = this.size++;
    this.#rise(state, at);
  }

  pop(): number {
    const top = this.#states[0]!;
    this.#place[top] = -1;
    this.size -= 1;
    if (this.size > 0) this.#sink(this.#states[this.size]!, 0);
    return top;
  }

  clear(): void {
    while (this.size > 0) this.#place[this.#states[--this.size]!] = -1;
  }

  #rise(state: number, from: number): void {
    let at = from;
    const cost = this.#cost[state]!;
    while (at > 0) {
      const above = (at - 1) >> 1;
      const other = this.#states[above]!;
      if (this.#cost[other]! <= cost) break;
      this.#set(at, other);
      at = above;
    }
    this.#set(at, state);
  }

  #sink(state: number, from: number): void {
    let at = from;
    const cost = this.#cost[state]!;
    for (let below = 1; below < this.size; below = 2 * at + 1) {
      const right = below + 1;
      if (
        right < this.size &&
        this.#cost[this.#states[right]!]! < this.#cost[this.#states[below]!]!
      )
        below = right;
      const other = this.#states[below]!;
      if (this.#cost[other]! >= cost) break;
      this.#set(at, other);
      at = below;
    }
    this.#set(at, state);
  }

  #set(at: number, state: number): void {
    this.#states[at] = state;
    this.#place[state] = at;
  }
}
