import { describe, expect, it } from 'vitest';
import { fitMixedModel } from './fitMixedModel.ts';
import { publishedFits } from './publishedFits.ts';

describe('against published fits', () => {
  // Davies & Goldsmith 1972, Box & Tiao 1973; fits: Bates et al. 2015 and lme4 1.1-31 (publishedFits).
  it.each(publishedFits)('$name', (published) => {
    const fit = fitMixedModel({
      y: published.y,
      fixed: [published.y.map(() => 1)],
      groups: published.groups,
    });
    expect(fit.fixed[0]!.value / published.intercept).toBeCloseTo(1, 6);
    expect(fit.fixed[0]!.se / published.interceptSe).toBeCloseTo(1, 4);
    for (const group of fit.groups) {
      const sd = published.sdByGroup[group.name]!;
      expect(Math.abs(group.sd - sd)).toBeLessThan(1e-4 * Math.max(1, sd));
    }
    expect(fit.residualSd / published.residualSd).toBeCloseTo(1, 4);
    expect(Math.abs(fit.remlCriterion - published.remlCriterion)).toBeLessThan(1e-5);
    for (const { group, level, value, se } of published.effects) {
      const effect = fit.groups
        .find(({ name }) => name === group)!
        .effects.find((each) => each.level === level)!;
      expect(Math.abs(effect.value - value)).toBeLessThan(1e-3 * Math.max(1, Math.abs(value)));
      expect(Math.abs(effect.se - se)).toBeLessThan(1e-3 * Math.max(1, se));
    }
  });

  it('penicillin to the printed three digits', () => {
    // Issue figures, as printed in Bates et al. 2015: 22.972, 0.847, 1.932, 0.550.
    const { y, groups } = publishedFits[0]!;
    const fit = fitMixedModel({ y, fixed: [y.map(() => 1)], groups });
    const three = (value: number) => value.toFixed(3);
    expect(three(fit.fixed[0]!.value)).toBe('22.972');
    expect(fit.groups.map(({ name, sd }) => [name, three(sd)])).toEqual([
      ['plate', '0.847'],
      ['sample', '1.932'],
    ]);
    expect(three(fit.residualSd)).toBe('0.550');
  });
});

describe('against dense algebra', () => {
  // A slope, unequal weights and gaps in the crossing, checked by V = Σ σ²ZZᵀ + σ²W⁻¹ inverted whole.
  const rows = Array.from({ length: 40 }, (_, i) => ({
    a: `a${(i * 7) % 5}`,
    b: `b${(i * i + 3 * i) % 9}`,
    x: ((i * 13) % 11) - 5,
    weight: 1 + (i % 3),
  }));
  const wobble = (text: string) => Math.sin(text.charCodeAt(1) * 12.9898) * 2;
  const y = rows.map(({ a, b, x }, i) => 3 + 0.4 * x + wobble(a) + wobble(b) + Math.cos(i * 5.3));
  const data = {
    y,
    fixed: [rows.map(() => 1), rows.map(({ x }) => x)],
    groups: [
      { name: 'a', levels: rows.map(({ a }) => a) },
      { name: 'b', levels: rows.map(({ b }) => b) },
    ],
    weights: rows.map(({ weight }) => weight),
  };
  const fit = fitMixedModel(data);

  it('the criterion, the slope and the effects are those of the full covariance', () => {
    const [a, b] = fit.groups.map(({ sd }) => sd ** 2) as [number, number];
    const dense = denseFit(a, b, fit.residualSd ** 2);
    expect(fit.remlCriterion).toBeCloseTo(dense.criterion, 8);
    expect(fit.fixed[0]!.value).toBeCloseTo(dense.beta[0]!, 8);
    expect(fit.fixed[1]!.value).toBeCloseTo(dense.beta[1]!, 8);
    const effect = fit.groups[0]!.effects.find(({ level }) => level === 'a1')!;
    expect(effect.value).toBeCloseTo(a * dense.blupSum((i) => rows[i]!.a === 'a1'), 8);
  });

  it('no variance near the fit does better', () => {
    const [a, b] = fit.groups.map(({ sd }) => sd ** 2) as [number, number];
    const r = fit.residualSd ** 2;
    for (const factor of [0.9, 1.1]) {
      for (const [va, vb, vr] of [
        [a * factor, b, r],
        [a, b * factor, r],
        [a, b, r * factor],
      ]) {
        expect(denseFit(va!, vb!, vr!).criterion).toBeGreaterThan(fit.remlCriterion);
      }
    }
  });

  it('the order of rows changes nothing, and neither does running again', () => {
    const order = rows.map((_, i) => (i * 17) % 40);
    const pick = <T>(values: readonly T[]) => order.map((i) => values[i]!);
    const other = fitMixedModel({
      y: pick(y),
      fixed: data.fixed.map(pick),
      groups: data.groups.map(({ name, levels }) => ({ name, levels: pick(levels) })),
      weights: pick(data.weights),
    });
    expect(other.remlCriterion).toBeCloseTo(fit.remlCriterion, 8);
    expect(fitMixedModel(data).groups).toEqual(fit.groups);
  });

  function denseFit(va: number, vb: number, vr: number) {
    const n = rows.length;
    const V = rows.map((p, i) =>
      rows.map((q, j) => {
        const shared = (p.a === q.a ? va : 0) + (p.b === q.b ? vb : 0);
        return shared + (i === j ? vr / p.weight : 0);
      }),
    );
    const columns = [...data.fixed, y];
    const { solved, logDet } = eliminate(V, columns);
    const inner = (u: readonly number[], v: readonly number[]) =>
      u.reduce((sum, value, i) => sum + value * v[i]!, 0);
    const XVX = data.fixed.map((x) => data.fixed.map((_, c) => inner(x, solved[c]!)));
    const XVy = data.fixed.map((x) => inner(x, solved[2]!));
    const { solved: beta, logDet: logDetX } = eliminate(XVX, [XVy]);
    const Py = y.map(
      (_, i) => solved[2]![i]! - beta[0]!.reduce((s, v, c) => s + v * solved[c]![i]!, 0),
    );
    const criterion = (n - 2) * Math.log(2 * Math.PI) + logDet + logDetX + inner(y, Py);
    const blupSum = (of: (i: number) => boolean) =>
      Py.reduce((sum, value, i) => sum + (of(i) ? value : 0), 0);
    return { criterion, beta: beta[0]!, blupSum };
  }
});

describe('few rows and large ones', () => {
  it('a prior keeps three rows from running away', () => {
    const prior = { residualSd: 0.2, residualRows: 20, sdByGroup: { pet: 0.15 }, logSdSpread: 0.4 };
    const fit = fitMixedModel(
      { y: [0.5, 0.4, 0.45], fixed: [], groups: [{ name: 'pet', levels: ['a', 'b', 'b'] }] },
      { prior },
    );
    expect(fit.groups[0]!.sd).toBeGreaterThan(0.1);
    expect(fit.groups[0]!.sd).toBeLessThan(0.4);
    expect(fit.groups[0]!.effects[0]!.value).toBeLessThan(0.4);
    expect(fit.groups[0]!.effects[1]!.value).toBeGreaterThan(
      fit.groups[0]!.effects[0]!.value * 0.9,
    );
  });

  it('finds what 20,000 rows over 6,000 levels were drawn with', () => {
    const random = seeded(4);
    const normal = () => Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
    const draws = (count: number, sd: number) => Array.from({ length: count }, () => sd * normal());
    const effects = [draws(5_500, 0.15), draws(400, 0.07), draws(100, 0.1)];
    const at = effects.map((values) =>
      Array.from({ length: 20_000 }, () => Math.floor(random() * values.length)),
    );
    const y = at[0]!.map((_, i) =>
      effects.reduce((sum, values, k) => sum + values[at[k]![i]!]!, 0.05 + 0.2 * normal()),
    );
    const fit = fitMixedModel({
      y,
      fixed: [y.map(() => 1)],
      groups: at.map((levels, k) => ({ name: `g${k}`, levels: levels.map(String) })),
    });
    expect(fit.groups[0]!.sd).toBeCloseTo(0.15, 2);
    expect(Math.abs(fit.groups[1]!.sd - 0.07)).toBeLessThan(0.01);
    expect(Math.abs(fit.groups[2]!.sd - 0.1)).toBeLessThan(0.025);
    expect(fit.residualSd).toBeCloseTo(0.2, 2);
  });

  it('says what is wrong with the rows', () => {
    const one = { name: 'pet', levels: ['a'] };
    expect(() => fitMixedModel({ y: [], fixed: [], groups: [] })).toThrow(/y is empty/);
    expect(() => fitMixedModel({ y: [1, 2], fixed: [], groups: [one] })).toThrow(
      /groups\.pet has 1/,
    );
    expect(() => fitMixedModel({ y: [NaN, 2], fixed: [], groups: [] })).toThrow(/row 0/);
    const twice = [
      [1, 1, 1],
      [1, 1, 1],
    ];
    expect(() => fitMixedModel({ y: [1, 2, 3], fixed: twice, groups: [] })).toThrow(/singular/);
  });
});

/** Gauss–Jordan: solves A·x = each right side; log |A|. */
function eliminate(matrix: number[][], rights: readonly (readonly number[])[]) {
  const a = matrix.map((row, i) => [...row, ...rights.map((right) => right[i]!)]);
  let logDet = 0;
  a.forEach((pivotRow, i) => {
    const pivot = pivotRow[i]!;
    logDet += Math.log(pivot);
    for (let c = i; c < pivotRow.length; c += 1) pivotRow[c]! /= pivot;
    a.forEach((row, r) => {
      const factor = row[i]!;
      if (r === i || factor === 0) return;
      for (let c = i; c < row.length; c += 1) row[c]! -= factor * pivotRow[c]!;
    });
  });
  return { solved: rights.map((_, k) => a.map((row) => row[matrix.length + k]!)), logDet };
}

/** mulberry32: a small seeded generator, enough for tests. */
function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}
