/** 1e-7 degree is about a centimetre and what OpenStreetMap itself stores. */
export const E7 = 1e7;

/**
 * Coordinates of every node by id in typed arrays (16 bytes a node): extracts are sorted by id, so a
 * binary search stands in for a map. An unsorted file is sorted once, at the first look-up.
 */
export class NodeStore {
  size = 0;
  #ids = new Float64Array(1 << 16);
  #lat = new Int32Array(1 << 16);
  #lon = new Int32Array(1 << 16);
  #sorted = true;

  add(id: number, lat: number, lon: number): void {
    if (this.size === this.#ids.length) this.#grow();
    if (this.size > 0 && id < this.#ids[this.size - 1]!) this.#sorted = false;
    this.#ids[this.size] = id;
    this.#lat[this.size] = Math.round(lat * E7);
    this.#lon[this.size] = Math.round(lon * E7);
    this.size += 1;
  }

  /** Where a node is kept, or −1 when the extract left it out (ways are cut at its border). */
  indexOf(id: number): number {
    if (!this.#sorted) this.#sort();
    let low = 0;
    let high = this.size - 1;
    while (low <= high) {
      const middle = (low + high) >> 1;
      const found = this.#ids[middle]!;
      if (found === id) return middle;
      if (found < id) low = middle + 1;
      else high = middle - 1;
    }
    return -1;
  }

  latE7(index: number): number {
    return this.#lat[index]!;
  }

  lonE7(index: number): number {
    return this.#lon[index]!;
  }

  #grow(): void {
    const room = this.#ids.length * 2;
    const ids = new Float64Array(room);
    ids.set(this.#ids);
    this.#ids = ids;
    const lat = new Int32Array(room);
    lat.set(this.#lat);
    this.#lat = lat;
    const lon = new Int32Array(room);
    lon.set(this.#lon);
    this.#lon = lon;
  }

  #sort(): void {
    const order = Uint32Array.from({ length: this.size }, (_, i) => i);
    order.sort((a, b) => this.#ids[a]! - this.#ids[b]!);
    this.#ids = Float64Array.from(order, (i) => this.#ids[i]!);
    this.#lat = Int32Array.from(order, (i) => this.#lat[i]!);
    this.#lon = Int32Array.from(order, (i) => this.#lon[i]!);
    this.#sorted = true;
  }
}
