import { filledPattern, type SparsePattern } from './sparseFactor.ts';

/** Rows to fit: y = X·β + Σ effect of each group's level + error of variance σ²/weight. */
export interface MixedModelData {
  y: ArrayLike<number>;
  /** Columns of X, a column of ones for an intercept; may be empty. */
  fixed: readonly ArrayLike<number>[];
  groups: readonly { name: string; levels: ArrayLike<string> }[];
  /** Above 0; all 1 when left out. */
  weights?: ArrayLike<number>;
}

/** Where each unknown of the equations stands, and which cells a row of data adds to. */
export interface EquationLayout {
  rows: number;
  size: number;
  /** Random effects come first, the fixed ones last. */
  randomSize: number;
  groups: { name: string; levels: string[]; counts: number[]; start: number }[];
  pattern: SparsePattern;
  /** Unknowns touched by row i: `touched[i * width … ]`, increasing; −1 where a column of X is 0. */
  width: number;
  touched: Int32Array;
  factors: Float64Array;
}

/**
 * Lays out the normal equations sparsely. Groups with most levels go first: their levels meet only
 * few others, so they are eliminated at little cost and the fill stays in the small groups.
 * @throws RangeError naming a column of another length, or an empty set of rows.
 */
export function layOutEquations(data: MixedModelData): EquationLayout {
  const rows = data.y.length;
  if (rows === 0) throw new RangeError('y is empty: a fit needs at least one row.');
  data.fixed.forEach((column, index) => sameLength(`fixed[${index}]`, column, rows));
  if (data.weights) sameLength('weights', data.weights, rows);
  const indexed = data.groups.map((group) => {
    sameLength(`groups.${group.name}`, group.levels, rows);
    return indexLevels(group.name, group.levels);
  });
  const order = indexed
    .map((_, index) => index)
    .sort((a, b) => indexed[b]!.levels.length - indexed[a]!.levels.length || a - b);
  let randomSize = 0;
  for (const index of order) {
    indexed[index]!.start = randomSize;
    randomSize += indexed[index]!.levels.length;
  }
  const size = randomSize + data.fixed.length;
  const width = data.groups.length + data.fixed.length;
  const touched = new Int32Array(rows * width);
  const factors = new Float64Array(rows * width).fill(1);
  for (let i = 0; i < rows; i += 1) {
    order.forEach((index, column) => {
      touched[i * width + column] = indexed[index]!.start + indexed[index]!.of[i]!;
    });
    data.fixed.forEach((values, column) => {
      const cell = i * width + order.length + column;
      touched[cell] = values[i] === 0 ? -1 : randomSize + column;
      factors[cell] = values[i]!;
    });
  }
  const groups = indexed.map(({ name, levels, counts, start }) => ({
    name,
    levels,
    counts,
    start,
  }));
  const pattern = filledPattern(patternOf(size, rows, width, touched));
  return { rows, size, randomSize, groups, pattern, width, touched, factors };
}

/** [Z X]ᵀ·W·[Z X] in the filled pattern, [Z X]ᵀ·W·y, yᵀ·W·y and Σ log w. */
export function sumEquations(layout: EquationLayout, data: MixedModelData) {
  const { pattern, width, touched, factors } = layout;
  const matrix = new Float64Array(pattern.starts[layout.size]!);
  const right = new Float64Array(layout.size);
  let square = 0;
  let logWeights = 0;
  for (let i = 0; i < layout.rows; i += 1) {
    const weight = data.weights?.[i] ?? 1;
    const y = data.y[i]!;
    if (!(weight > 0) || !Number.isFinite(y)) {
      throw new RangeError(
        `row ${i}: y must be finite and its weight above 0, got ${y}, ${weight}.`,
      );
    }
    square += weight * y * y;
    logWeights += Math.log(weight);
    for (let a = i * width; a < (i + 1) * width; a += 1) {
      const column = touched[a]!;
      if (column < 0) continue;
      const scaled = weight * factors[a]!;
      right[column] = right[column]! + scaled * y;
      for (let b = a; b < (i + 1) * width; b += 1) {
        const row = touched[b]!;
        if (row < 0) continue;
        const at = findCell(pattern, row, column);
        matrix[at] = matrix[at]! + scaled * factors[b]!;
      }
    }
  }
  return { matrix, right, square, logWeights };
}

/** Index of an entry in the pattern, −1 when it is not there. `row` ≥ `column`. */
export function findCell({ starts, rows }: SparsePattern, row: number, column: number): number {
  let low = starts[column]!;
  let high = starts[column + 1]! - 1;
  while (low <= high) {
    const middle = (low + high) >> 1;
    const found = rows[middle]!;
    if (found === row) return middle;
    if (found < row) low = middle + 1;
    else high = middle - 1;
  }
  return -1;
}

function indexLevels(name: string, levels: ArrayLike<string>) {
  const index = new Map<string, number>();
  const counts: number[] = [];
  const of = new Int32Array(levels.length);
  for (let i = 0; i < levels.length; i += 1) {
    let at = index.get(levels[i]!);
    if (at === undefined) {
      at = index.size;
      index.set(levels[i]!, at);
      counts.push(0);
    }
    counts[at] = counts[at]! + 1;
    of[i] = at;
  }
  return { name, levels: [...index.keys()], counts, of, start: 0 };
}

function patternOf(size: number, rows: number, width: number, touched: Int32Array): SparsePattern {
  const below: Set<number>[] = Array.from({ length: size }, (_, j) => new Set([j]));
  for (let i = 0; i < rows; i += 1) {
    for (let a = i * width; a < (i + 1) * width; a += 1) {
      if (touched[a]! < 0) continue;
      const column = below[touched[a]!]!;
      for (let b = a + 1; b < (i + 1) * width; b += 1) {
        if (touched[b]! >= 0) column.add(touched[b]!);
      }
    }
  }
  const starts = new Int32Array(size + 1);
  below.forEach((column, j) => (starts[j + 1] = starts[j]! + column.size));
  const all = new Int32Array(starts[size]!);
  below.forEach((column, j) => all.set(Int32Array.from(column).sort(), starts[j]!));
  return { size, starts, rows: all };
}

function sameLength(name: string, values: ArrayLike<unknown>, rows: number): void {
  if (values.length !== rows) {
    throw new RangeError(`${name} has ${values.length} rows, y has ${rows}: give one per row.`);
  }
}
