/** The next round number of hours or minutes at or above `most`, with a step for its ticks. */
export function niceTop(most: number): { top: number; step: number } {
  const target = Math.max(most, 1) / 4;
  const size = 10 ** Math.floor(Math.log10(target));
  const step = [1, 2, 2.5, 5, 10].map((part) => part * size).find((one) => one >= target)!;
  return { top: Math.ceil(Math.max(most, 1) / step) * step, step };
}
