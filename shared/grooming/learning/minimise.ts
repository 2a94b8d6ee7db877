/** A function of a few numbers with its slope at a point. */
export type Sloped = (x: Float64Array) => { value: number; slope: Float64Array };

export interface MinimiseOptions {
  /** Least fall that is worth another step. */
  tolerance?: number;
  most?: number;
  /** No unknown goes below; there it rests while the function rises from it. */
  low?: number;
}

/**
 * Finds a minimum from `start` by projected BFGS with halving steps (Nocedal and Wright, Numerical
 * Optimization, 2006, chapter 6). `curvature` is a guess at each second derivative. The unknowns are
 * logarithms of things that may be nothing: one that heads for −∞ is tried at `low` at once, because
 * the way there is long and flat. The same input gives the same answer.
 */
export function minimise(
  f: Sloped,
  start: Float64Array,
  curvature: Float64Array,
  { tolerance = 1e-8, most = 60, low = -7 }: MinimiseOptions = {},
): { x: Float64Array; value: number; steps: number } {
  let x = Float64Array.from(start, (value) => Math.max(low, value));
  let here = f(x);
  let inverse = diagonal(curvature);
  // Below this an unknown is asked whether it is nothing; asked in vain, not soon again.
  const askBelow = x.map(() => -1.5);
  let steps = 0;
  while (x.length > 0 && steps < most) {
    steps += 1;
    const jumped = tryLow(f, x, here, low, askBelow);
    if (jumped) {
      [x, here] = [jumped.x, jumped.there];
      inverse = diagonal(curvature);
    }
    const slope = here.slope.map((value, i) => (x[i] === low && value >= 0 ? 0 : value));
    const head = () => inverse.map((row, i) => (slope[i] === 0 ? 0 : -dot(row, slope)));
    let direction = head();
    if (!(dot(direction, slope) < 0)) {
      inverse = diagonal(curvature);
      direction = head();
    }
    const down = dot(direction, slope);
    if (!(down < 0)) break;
    // Unknowns are logarithms: a step of more than 1.5 is a leap in the dark.
    const longest = Math.max(...direction.map(Math.abs));
    let length = longest > 1.5 ? 1.5 / longest : 1;
    let there = here;
    let moved = x;
    for (let tries = 0; tries < 30; tries += 1, length /= 2) {
      moved = x.map((value, i) => Math.max(low, value + length * direction[i]!));
      there = f(moved);
      if (there.value <= here.value + 1e-4 * length * down) break;
    }
    if (!(there.value <= here.value)) break;
    const step = moved.map((value, i) => value - x[i]!);
    const change = there.slope.map((value, i) => value - here.slope[i]!);
    const gain = here.value - there.value;
    x = moved;
    here = there;
    if (gain < tolerance) break;
    update(inverse, step, change);
  }
  return { x, value: here.value, steps };
}

function tryLow(
  f: Sloped,
  x: Float64Array,
  here: ReturnType<Sloped>,
  low: number,
  askBelow: Float64Array,
) {
  const falling = x.map((value, i) =>
    Number(value > low && value < askBelow[i]! && here.slope[i]! > 0),
  );
  if (!falling.includes(1)) return null;
  falling.forEach((is, i) => {
    if (is === 1) askBelow[i] = x[i]! - 2;
  });
  const tried = x.map((value, i) => (falling[i] === 1 ? low : value));
  const there = f(tried);
  // Better than here is not enough: the least may lie between.
  const rests = there.slope.every((value, i) => falling[i] === 0 || value >= 0);
  return there.value < here.value && rests ? { x: tried, there } : null;
}

function diagonal(curvature: Float64Array): Float64Array[] {
  return Array.from(curvature, (own, i) => curvature.map((_, j) => (i === j ? 1 / own : 0)));
}

function update(inverse: Float64Array[], step: Float64Array, change: Float64Array): void {
  const along = dot(step, change);
  if (!(along > 1e-12)) return;
  const pushed = inverse.map((row) => dot(row, change));
  const grow = (1 + dot(pushed, change) / along) / along;
  inverse.forEach((row, i) => {
    for (let j = 0; j < row.length; j += 1) {
      row[j] =
        row[j]! +
        grow * step[i]! * step[j]! -
        (pushed[i]! * step[j]! + step[i]! * pushed[j]!) / along;
    }
  });
}

function dot(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let sum = 0;
  for (let i = 0; i < a.length; i += 1) sum += a[i]! * b[i]!;
  return sum;
}
