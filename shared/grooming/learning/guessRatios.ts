/**
 * A rough SD ÷ residual SD per group, from each group's spread of level means alone (one-way analysis
 * of variance by moments). Only a place to start a search: fixed effects and the other groups are
 * left in. Between 0.05 and 3.
 */
export function guessRatios(
  y: ArrayLike<number>,
  groups: readonly { levels: ArrayLike<string> }[],
): number[] {
  const n = y.length;
  let mean = 0;
  for (let i = 0; i < n; i += 1) mean += y[i]! / n;
  let total = 0;
  for (let i = 0; i < n; i += 1) total += (y[i]! - mean) ** 2 / Math.max(1, n - 1);
  const variances = groups.map(({ levels }) => {
    const sums = new Map<string, { count: number; sum: number }>();
    for (let i = 0; i < n; i += 1) {
      const level = sums.get(levels[i]!);
      if (level) {
        level.count += 1;
        level.sum += y[i]! - mean;
      } else sums.set(levels[i]!, { count: 1, sum: y[i]! - mean });
    }
    let between = 0;
    let squares = 0;
    for (const { count, sum } of sums.values()) {
      between += (sum * sum) / count;
      squares += count * count;
    }
    // E[between] = (n − Σcount²/n)·σ² + (levels − 1)·(total − σ²).
    const freedom = sums.size - 1;
    const share = n - squares / n - freedom;
    return share > 0 ? Math.max(0, (between - freedom * total) / share) : 0;
  });
  const explained = variances.reduce((sum, variance) => sum + variance, 0);
  const residual = Math.max(total - explained, total / 10);
  return variances.map((variance) =>
    residual > 0 ? Math.min(3, Math.max(0.05, Math.sqrt(variance / residual))) : 1,
  );
}
