/** Points of a day in order of first mention; one place or household is one row of the matrix. */
export class PointList {
  readonly list: { id: string; lat: number; lon: number }[] = [];
  private readonly index = new Map<string, number>();

  /** The point's row, added when new. */
  add(id: string, lat: number, lon: number): number {
    const known = this.index.get(id);
    if (known !== undefined) return known;
    this.list.push({ id, lat, lon });
    this.index.set(id, this.list.length - 1);
    return this.list.length - 1;
  }
}
