/** The quantiles a forecast tells: P10, P50, P80 and P90. */
export const toldPermille = [100, 500, 800, 900] as const;

/** One forecast's quantiles in the order of `toldPermille`. */
export type ToldSeconds = readonly [number, number, number, number];

/**
 * Pinball loss of one quantile: (y − q)·α when y lies above, (q − y)·(1 − α) below (Koenker and
 * Bassett, Regression Quantiles, Econometrica 1978). Lower is better; the true quantile is best.
 */
export function pinballLoss(actual: number, quantile: number, permille: number): number {
  const alpha = permille / 1000;
  return actual >= quantile ? (actual - quantile) * alpha : (quantile - actual) * (1 - alpha);
}

/** Mean over the told quantiles. */
export function meanPinball(actualSeconds: number, told: ToldSeconds): number {
  const losses = toldPermille.map((permille, index) =>
    pinballLoss(actualSeconds, told[index]!, permille),
  );
  return losses.reduce((sum, loss) => sum + loss, 0) / losses.length;
}
