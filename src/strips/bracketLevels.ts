/** A promised window, seconds of the day. */
export interface Bracket {
  startSeconds: number;
  endSeconds: number;
}

/**
 * The row each bracket hangs in: 0 lowest. Windows that only touch share a row; where three or more
 * overlap the rest share the top row, since two rows are all a strip has room for.
 */
export function bracketLevels(brackets: readonly Bracket[], mostLevels = 2): number[] {
  const levels = brackets.map(() => 0);
  const endOfLevel: number[] = [];
  const order = brackets
    .map((_, index) => index)
    .sort(
      (a, b) =>
        brackets[a]!.startSeconds - brackets[b]!.startSeconds ||
        brackets[a]!.endSeconds - brackets[b]!.endSeconds,
    );
  for (const index of order) {
    const { startSeconds, endSeconds } = brackets[index]!;
    let level = 0;
    while (level < mostLevels - 1 && (endOfLevel[level] ?? -Infinity) > startSeconds) level += 1;
    levels[index] = level;
    endOfLevel[level] = Math.max(endOfLevel[level] ?? -Infinity, endSeconds);
  }
  return levels;
}
