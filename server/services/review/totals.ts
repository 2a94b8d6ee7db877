/** Where the hours went; whole seconds and metres. */
export interface Totals {
  groomSeconds: number;
  scissorSeconds: number;
  driveSeconds: number;
  waitSeconds: number;
  driveMetres: number;
  visits: number;
  promises: number;
  promisesKept: number;
}

export const noTotals: Totals = {
  groomSeconds: 0,
  scissorSeconds: 0,
  driveSeconds: 0,
  waitSeconds: 0,
  driveMetres: 0,
  visits: 0,
  promises: 0,
  promisesKept: 0,
};

export function addTotals(a: Totals, b: Totals): Totals {
  const sum = { ...a };
  for (const key of Object.keys(noTotals) as (keyof Totals)[]) sum[key] += b[key];
  return sum;
}
