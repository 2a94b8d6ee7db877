import { expect, it } from 'vitest';
import { bandEdges } from './bandEdges.ts';

it('takes the middle of the neighbours’ bands, in order of forecast', () => {
  const visit = (forecastSeconds: number, low: number, high: number) => ({
    forecastSeconds,
    p10Seconds: forecastSeconds * low,
    p90Seconds: forecastSeconds * high,
    clockSeconds: 1,
  });
  const edges = bandEdges(
    [visit(3000, 0.8, 1.25), visit(1000, 0.8, 1.25), visit(2000, 0.1, 9), visit(0, 1, 1)],
    3,
  );
  expect(edges).toEqual([
    { forecastSeconds: 1000, lowSeconds: 800, highSeconds: 9000 },
    { forecastSeconds: 2000, lowSeconds: 1600, highSeconds: 2500 },
    { forecastSeconds: 3000, lowSeconds: 2400, highSeconds: 27_000 },
  ]);
});
