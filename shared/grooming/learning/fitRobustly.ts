import { fitMixedModel, type MixedModelFit, type MixedModelOptions } from './fitMixedModel.ts';
import type { MixedModelData } from './mixedEquations.ts';

/**
 * A mixed model whose far residuals are pulled in: rows beyond `huber` SDs get weight huber/|r|
 * (Huber, Robust Estimation of a Location Parameter, Ann Math Stat 1964), three rounds of it.
 * `spread` is the residual SD read off the middle 80 % instead, so that an 80 % interval covers 80 %
 * even when tails are heavy; the freedom the effects use up is given back. `recency` (0–1 per row)
 * makes old rows say less about the effects; for the spread an old day was a day like any other.
 */
export function fitRobustly(
  plain: MixedModelData & { weights: Float64Array },
  recency: Float64Array,
  options: MixedModelOptions,
  huber: number,
): { fit: MixedModelFit; spread: number } {
  const data = { ...plain, weights: plain.weights.map((weight, i) => weight * recency[i]!) };
  let fit = fitMixedModel(data, { tolerance: 1e-4, ...options });
  for (let round = 0; round < 2; round += 1) {
    const { residuals, residualSd, ratios } = fit;
    const weights = data.weights.map((weight, i) => {
      const size = Math.abs(residuals[i]! * Math.sqrt(weight)) / residualSd;
      return size > huber ? (weight * huber) / size : weight;
    });
    fit = fitMixedModel({ ...data, weights }, { tolerance: 1e-3, ...options, startRatios: ratios });
  }
  return { fit, spread: middleSpread(fit, plain.weights, options) };
}

function middleSpread(
  fit: MixedModelFit,
  weights: Float64Array,
  { prior }: MixedModelOptions,
): number {
  const sizes = fit.residuals.map((residual, i) => Math.abs(residual) * Math.sqrt(weights[i]!));
  sizes.sort();
  const n = sizes.length;
  const used = fit.groups.reduce(
    (sum, { sd, effects }) =>
      sum + effects.reduce((inner, { se }) => inner + (sd > 0 ? 1 - (se / sd) ** 2 : 0), 0),
    0,
  );
  // 1.2816 SDs hold 80 % of a normal.
  const middle = sizes[Math.min(n - 1, Math.floor(0.8 * n))]! / 1.2815515655;
  const variance = middle ** 2 * (n / Math.max(1, n - used));
  if (!prior) return Math.sqrt(variance);
  const { residualRows, residualSd } = prior;
  return Math.sqrt((n * variance + residualRows * residualSd ** 2) / (n + residualRows));
}
