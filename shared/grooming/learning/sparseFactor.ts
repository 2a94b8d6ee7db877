/** A symmetric matrix's pattern in compressed columns, the diagonal first, then rows below it. */
export interface SparsePattern {
  size: number;
  starts: Int32Array;
  rows: Int32Array;
}

/**
 * Adds the entries Cholesky's method will fill in, column by column: a column's pattern is its own
 * rows and those of the columns whose first row below the diagonal it is (the elimination tree; Liu
 * 1990, Davis, Direct Methods for Sparse Linear Systems, 2006, chapter 4).
 */
export function filledPattern({ size, starts, rows }: SparsePattern): SparsePattern {
  const columns: Int32Array[] = [];
  const children: number[][] = Array.from({ length: size }, () => []);
  const seen = new Int32Array(size).fill(-1);
  const filledStarts = new Int32Array(size + 1);
  for (let j = 0; j < size; j += 1) {
    const found: number[] = [];
    const add = (row: number) => {
      if (row <= j || seen[row] === j) return;
      seen[row] = j;
      found.push(row);
    };
    for (let at = starts[j]!; at < starts[j + 1]!; at += 1) add(rows[at]!);
    for (const child of children[j]!) for (const row of columns[child]!) add(row);
    const column = Int32Array.from(found).sort();
    columns.push(column);
    if (column.length > 0) children[column[0]!]!.push(j);
    filledStarts[j + 1] = filledStarts[j]! + 1 + column.length;
  }
  const filledRows = new Int32Array(filledStarts[size]!);
  columns.forEach((column, j) => {
    filledRows[filledStarts[j]!] = j;
    filledRows.set(column, filledStarts[j]! + 1);
  });
  return { size, starts: filledStarts, rows: filledRows };
}

/**
 * Lower Cholesky factor of a positive definite matrix given in its filled pattern (zeros where only
 * fill is), computed column by column from the left. Overwrites and returns `values`.
 * @throws RangeError when the matrix is not positive definite.
 */
export function factorise(pattern: SparsePattern, values: Float64Array): Float64Array {
  const { size, starts, rows } = pattern;
  const work = new Float64Array(size);
  // Columns waiting to be subtracted from column j, as linked lists; `next[k]` is where k reads on.
  const firstOf = new Int32Array(size).fill(-1);
  const following = new Int32Array(size).fill(-1);
  const next = new Int32Array(size);
  for (let j = 0; j < size; j += 1) {
    const start = starts[j]!;
    const end = starts[j + 1]!;
    for (let at = start; at < end; at += 1) work[rows[at]!] = values[at]!;
    for (let k = firstOf[j]!; k >= 0;) {
      const after = following[k]!;
      const from = next[k]!;
      const factor = values[from]!;
      const last = starts[k + 1]!;
      for (let at = from; at < last; at += 1) {
        const row = rows[at]!;
        work[row] = work[row]! - factor * values[at]!;
      }
      queue(k, from + 1);
      k = after;
    }
    const pivot = work[j]!;
    // Rounding leaves a grain where the exact pivot is 0.
    if (!(pivot > 1e-13 * values[start]!)) {
      throw new RangeError(`the equations are singular at unknown ${j}: a column repeats others.`);
    }
    const root = Math.sqrt(pivot);
    values[start] = root;
    for (let at = start + 1; at < end; at += 1) values[at] = work[rows[at]!]! / root;
    queue(j, start + 1);
  }
  return values;

  function queue(column: number, at: number): void {
    if (at >= starts[column + 1]!) return;
    const row = rows[at]!;
    next[column] = at;
    following[column] = firstOf[row]!;
    firstOf[row] = column;
  }
}

/** Solves L·Lᵀ·x = b in place. */
export function solveFactored(pattern: SparsePattern, factor: Float64Array, b: Float64Array): void {
  const { size, starts, rows } = pattern;
  for (let j = 0; j < size; j += 1) {
    const value = b[j]! / factor[starts[j]!]!;
    b[j] = value;
    for (let at = starts[j]! + 1; at < starts[j + 1]!; at += 1) {
      const row = rows[at]!;
      b[row] = b[row]! - factor[at]! * value;
    }
  }
  for (let j = size - 1; j >= 0; j -= 1) {
    let value = b[j]!;
    for (let at = starts[j]! + 1; at < starts[j + 1]!; at += 1)
      value -= factor[at]! * b[rows[at]!]!;
    b[j] = value / factor[starts[j]!]!;
  }
}

/**
 * The inverse's entries inside the filled pattern (Takahashi, Fagan and Chen 1973): enough for its
 * diagonal without ever forming the dense inverse. `size` may be cut to a leading block.
 */
export function inverseInPattern(
  { size: full, starts, rows }: SparsePattern,
  factor: Float64Array,
  size = full,
): Float64Array {
  const inverse = new Float64Array(starts[size]!);
  const place = new Int32Array(full).fill(-1);
  for (let j = size - 1; j >= 0; j -= 1) {
    const start = starts[j]!;
    let end = starts[j + 1]!;
    // Rows past a leading block belong to unknowns held fixed.
    while (end > start + 1 && rows[end - 1]! >= size) end -= 1;
    const count = end - start - 1;
    const sums = new Float64Array(count);
    for (let a = 0; a < count; a += 1) place[rows[start + 1 + a]!] = a;
    for (let a = 0; a < count; a += 1) {
      const column = rows[start + 1 + a]!;
      const mine = factor[start + 1 + a]!;
      for (let at = starts[column]!; at < starts[column + 1]!; at += 1) {
        const row = rows[at]!;
        const b = row < size ? place[row]! : -1;
        if (b < 0) continue;
        sums[b] = sums[b]! + mine * inverse[at]!;
        if (b !== a) sums[a] = sums[a]! + factor[start + 1 + b]! * inverse[at]!;
      }
    }
    const pivot = factor[start]!;
    let own = 1 / pivot;
    for (let a = 0; a < count; a += 1) {
      const value = -sums[a]! / pivot;
      inverse[start + 1 + a] = value;
      own -= factor[start + 1 + a]! * value;
      place[rows[start + 1 + a]!] = -1;
    }
    inverse[start] = own / pivot;
  }
  return inverse;
}
