/** A function of a few numbers with its slope at a point. */
export type Sloped = (x: Float64Array) => { value: number; slope: Float64Array };

/**
 * Finds a minimum from `start` by BFGS with halving steps (Nocedal and Wright, Numerical
 * Optimization, 2006, chapter 6). `curvature` is a guess at each second derivative. Ends when a step
 * gains less than `tolerance` or after `most` steps; the same input gives the same answer.
 */
export function minimise(
  f: Sloped,
  start: Float64Array,
  curvature: Float64Array,
  { tolerance = 1e-8, most = 60, bound = 10 } = {},
): { x: Float64Array; value: number; steps: number } {
  const n = start.length;
  let x = Float64Array.from(start);
  let here = f(x);
  const fresh = () =>
    Array.from({ length: n }, (_, i) =>
      Float64Array.from({ length: n }, (_unused, j) => (i === j ? 1 / curvature[i]! : 0)),
    );
  let inverse = fresh();
  let steps = 0;
  while (n > 0 && steps < most) {
    steps += 1;
    let direction = inverse.map((row) => -dot(row, here.slope));
    if (!(dot(direction, here.slope) < 0)) {
      inverse = fresh();
      direction = inverse.map((row) => -dot(row, here.slope));
    }
    // The unknowns are logarithms: a step of more than 1.5 is a leap in the dark.
    const longest = Math.max(...direction.map(Math.abs));
    let length = longest > 1.5 ? 1.5 / longest : 1;
    const down = dot(direction, here.slope);
    let there = here;
    let moved = x;
    for (let tries = 0; tries < 30; tries += 1, length /= 2) {
      moved = x.map((value, i) =>
        Math.max(-bound, Math.min(bound, value + length * direction[i]!)),
      );
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
