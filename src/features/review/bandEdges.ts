import type { BandVisit } from './bandShare.ts';

export interface BandEdge {
  forecastSeconds: number;
  lowSeconds: number;
  highSeconds: number;
}

/**
 * The 8-in-10 band as a shape to draw under the dots: at each forecast the middle of its neighbours'
 * own bands, relative to their forecasts. Each visit keeps its own band for counting.
 */
export function bandEdges(visits: readonly BandVisit[], neighbours = 7): BandEdge[] {
  const sorted = visits
    .filter(({ forecastSeconds }) => forecastSeconds > 0)
    .toSorted((a, b) => a.forecastSeconds - b.forecastSeconds);
  const half = Math.floor(neighbours / 2);
  return sorted.map(({ forecastSeconds }, at) => {
    const near = sorted.slice(Math.max(0, at - half), at + half + 1);
    const low = middle(near.map((one) => one.p10Seconds / one.forecastSeconds));
    const high = middle(near.map((one) => one.p90Seconds / one.forecastSeconds));
    return {
      forecastSeconds,
      lowSeconds: Math.round(low * forecastSeconds),
      highSeconds: Math.round(high * forecastSeconds),
    };
  });
}

function middle(values: number[]): number {
  return values.sort((a, b) => a - b)[Math.floor(values.length / 2)]!;
}
