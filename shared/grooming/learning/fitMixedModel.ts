import { guessRatios } from './guessRatios.ts';
import { minimise } from './minimise.ts';
import {
  type EquationLayout,
  findCell,
  layOutEquations,
  type MixedModelData,
  sumEquations,
} from './mixedEquations.ts';
import { factorise, inverseInPattern, solveFactored } from './sparseFactor.ts';

/** What is believed before the rows are seen, so that few rows do not run away with it. */
export interface MixedModelPrior {
  residualSd: number;
  /** As if so many residuals of that SD had been seen. */
  residualRows: number;
  /** By group name; log SD is taken as normal around it. */
  sdByGroup: Readonly<Record<string, number>>;
  logSdSpread: number;
}

export interface MixedModelOptions {
  prior?: MixedModelPrior;
  /** Start of the search by group name, as SD ÷ residual SD. Speeds up a refit. */
  startRatios?: Readonly<Record<string, number>>;
  /** Least fall of the criterion that is worth another step. */
  tolerance?: number;
}

export interface MixedModelEffect {
  level: string;
  /** Best linear unbiased prediction: the level's mean deviation, shrunk. */
  value: number;
  /** SD of value − truth with the fixed effects taken as known. */
  se: number;
  rows: number;
}

export interface MixedModelFit {
  /** One per column of X. */
  fixed: { value: number; se: number }[];
  groups: { name: string; sd: number; effects: MixedModelEffect[] }[];
  residualSd: number;
  /** −2 log restricted likelihood at the fit, a prior on SDs left out. */
  remlCriterion: number;
  logLik: number;
  steps: number;
  /** y − fit, one per row. */
  residuals: Float64Array;
  /** SD ÷ residual SD by group name, for `startRatios`. */
  ratios: Record<string, number>;
  /** Covariance of two effects' errors; null where the equations do not hold the pair. */
  covariance: (groupA: string, levelA: string, groupB: string, levelB: string) => number | null;
}

/**
 * Fits crossed (or nested) random intercepts by restricted maximum likelihood: penalised least
 * squares on a sparse Cholesky factor, residual variance profiled out, the groups' SDs searched with
 * exact slopes (Bates et al., Fitting Linear Mixed-Effects Models Using lme4, J Stat Softw 67(1),
 * 2015, equations 34–42; slopes from the inverse's diagonal). Deterministic.
 * @throws RangeError when columns differ in length, weights are not above 0, or columns of X repeat.
 */
export function fitMixedModel(
  data: MixedModelData,
  options: MixedModelOptions = {},
): MixedModelFit {
  const layout = layOutEquations(data);
  const equations = sumEquations(layout, data);
  const free = layout.rows - data.fixed.length + (options.prior?.residualRows ?? 0);
  if (free <= 0)
    throw new RangeError(`${layout.rows} rows cannot carry ${data.fixed.length} columns.`);
  const at = (logRatios: Float64Array) =>
    profile(layout, equations, logRatios, free, options.prior);

  const { prior, startRatios } = options;
  const guesses = prior ? [] : guessRatios(data.y, data.groups);
  const start = Float64Array.from(layout.groups, ({ name }, k) => {
    const guess = prior ? prior.sdByGroup[name]! / prior.residualSd : guesses[k]!;
    return Math.log(startRatios?.[name] || guess);
  });
  const curvature = Float64Array.from(layout.groups, ({ levels }) => 2 * levels.length + 1);
  const found = minimise(at, start, curvature, { tolerance: options.tolerance ?? 1e-9 });
  const best = prior ? found : dropNothings(at, found);
  return describe(data, layout, at(best.x), free, best.steps);
}

type Equations = ReturnType<typeof sumEquations>;
type Profile = ReturnType<typeof profile>;

/** Below this share of the residual SD a group is as good as absent. */
const NOTHING = Math.log(1e-3);

function profile(
  layout: EquationLayout,
  { matrix, right, square, logWeights }: Equations,
  logRatios: Float64Array,
  free: number,
  prior: MixedModelPrior | undefined,
) {
  const { pattern, size, randomSize, groups } = layout;
  const scale = new Float64Array(size).fill(1);
  groups.forEach(({ start, levels }, k) =>
    scale.fill(Math.exp(logRatios[k]!), start, start + levels.length),
  );
  const factor = new Float64Array(matrix.length);
  for (let j = 0; j < size; j += 1) {
    for (let cell = pattern.starts[j]!; cell < pattern.starts[j + 1]!; cell += 1)
      factor[cell] = matrix[cell]! * scale[j]! * scale[pattern.rows[cell]!]!;
    if (j < randomSize) factor[pattern.starts[j]!]! += 1;
  }
  factorise(pattern, factor);
  const solution = right.map((value, j) => value * scale[j]!);
  const scaledRight = Float64Array.from(solution);
  solveFactored(pattern, factor, solution);

  let logDet = 0;
  let explained = 0;
  for (let j = 0; j < size; j += 1) {
    logDet += 2 * Math.log(factor[pattern.starts[j]!]!);
    explained += solution[j]! * scaledRight[j]!;
  }
  const pseudo = prior ? prior.residualRows * prior.residualSd ** 2 : 0;
  // Rounding must not leave less than nothing where the effects explain everything.
  const penalised = Math.max(square - explained, 1e-12 * square, 1e-300) + pseudo;
  const inverse = inverseInPattern(pattern, factor);
  let value = logDet + free * (1 + Math.log((2 * Math.PI * penalised) / free)) - logWeights;
  const reml = value;
  const slope = Float64Array.from(groups, ({ name, start, levels }, k) => {
    let trace = 0;
    let squares = 0;
    for (let j = start; j < start + levels.length; j += 1) {
      trace += inverse[pattern.starts[j]!]!;
      squares += solution[j]! ** 2;
    }
    let own = 2 * (levels.length - trace) - (2 * free * squares) / penalised;
    if (prior) {
      const off =
        (logRatios[k]! - Math.log(prior.sdByGroup[name]! / prior.residualSd)) / prior.logSdSpread;
      value += off * off;
      own += (2 * off) / prior.logSdSpread;
    }
    return own;
  });
  return { value, slope, reml, scale, solution, factor, inverse, penalised, logRatios };
}

/** A ratio that wandered towards 0 is set to 0 when the criterion does not mind. */
function dropNothings(
  at: (x: Float64Array) => Profile,
  found: { x: Float64Array; value: number; steps: number },
) {
  let best = found;
  found.x.forEach((logRatio, k) => {
    if (logRatio > NOTHING + 3) return;
    const x = best.x.map((value, index) => (index === k ? -Infinity : value));
    const { value } = at(x);
    if (value <= best.value + 1e-6) best = { x, value, steps: best.steps };
  });
  return best;
}

function describe(
  data: MixedModelData,
  layout: EquationLayout,
  best: Profile,
  free: number,
  steps: number,
): MixedModelFit {
  const { pattern, groups, randomSize, width, touched, factors } = layout;
  const variance = best.penalised / free;
  const known = inverseInPattern(pattern, best.factor, randomSize);
  const values = best.solution.map((value, j) => value * best.scale[j]!);
  const se = (inverse: Float64Array, j: number) =>
    Math.sqrt(variance * inverse[pattern.starts[j]!]!) * best.scale[j]!;
  const residuals = new Float64Array(layout.rows);
  for (let i = 0; i < layout.rows; i += 1) {
    let fitted = 0;
    for (let cell = i * width; cell < (i + 1) * width; cell += 1) {
      if (touched[cell]! >= 0) fitted += factors[cell]! * values[touched[cell]!]!;
    }
    residuals[i] = data.y[i]! - fitted;
  }
  const ratios = groups.map(({ name }, k) => [name, Math.exp(best.logRatios[k]!)] as const);
  const places = new Map(
    groups.map(({ name, levels, start }) => [
      name,
      new Map(levels.map((level, index) => [level, start + index])),
    ]),
  );
  return {
    fixed: data.fixed.map((_, column) => ({
      value: values[randomSize + column]!,
      se: se(best.inverse, randomSize + column),
    })),
    groups: groups.map(({ name, levels, counts, start }, k) => ({
      name,
      sd: ratios[k]![1] * Math.sqrt(variance),
      effects: levels.map((level, index) => ({
        level,
        value: values[start + index]!,
        se: se(known, start + index),
        rows: counts[index]!,
      })),
    })),
    residualSd: Math.sqrt(variance),
    remlCriterion: best.reml,
    logLik: -best.reml / 2,
    steps,
    residuals,
    ratios: Object.fromEntries(ratios),
    covariance: (groupA, levelA, groupB, levelB) => {
      const a = places.get(groupA)?.get(levelA);
      const b = places.get(groupB)?.get(levelB);
      if (a === undefined || b === undefined) return null;
      const cell = findCell(pattern, Math.max(a, b), Math.min(a, b));
      return cell < 0 ? null : variance * known[cell]! * best.scale[a]! * best.scale[b]!;
    },
  };
}
