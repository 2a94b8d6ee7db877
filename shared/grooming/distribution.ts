import { logNormal, logNormalQuantile, type Moments } from '#shared/stats/logNormal.ts';
import type { Distribution } from './types.ts';

/**
 * Whole-second moments and quantiles of the log-normal with these moments. `plusSeconds` is work of
 * fixed length around it (set-up, clean-down): it moves everything and spreads nothing.
 */
export function distribution(moments: Moments, plusSeconds = 0): Distribution {
  const shape = logNormal(moments);
  const at = (permille: number) => Math.round(logNormalQuantile(shape, permille)) + plusSeconds;
  const medianSeconds = at(500);
  return {
    medianSeconds,
    meanSeconds: Math.round(moments.meanSeconds) + plusSeconds,
    varianceSeconds2: Math.round(moments.varianceSeconds2),
    p10Seconds: at(100),
    p50Seconds: medianSeconds,
    p80Seconds: at(800),
    p90Seconds: at(900),
  };
}
