import type { StepFamily } from '../types.ts';
import type { MixedModelFit } from './fitMixedModel.ts';
import { fitRobustly } from './fitRobustly.ts';
import { goodSeconds, goodStep, logVarianceOf, medianOf } from './goodSeconds.ts';
import {
  effectKey,
  type GroomFit,
  groomPrior,
  type GroomPrior,
  type LearnedEffect,
  type LearnedGroup,
  mixLean,
} from './groomFit.ts';
import type { GroomRecord } from './groomRecord.ts';

export const learningVersion = 'learned-1';

/**
 * Learns from finished visits, in two steps. First, where steps were timed, how each family of steps
 * leans for the business, a groomer and a coat and style, with one free effect per visit so that a
 * bad day is not blamed on a family. Then log(actual ÷ forecast median so leaned) with crossed effects
 * of business, groomer, coat × style and pet. SDs are estimated from the records, held by the prior
 * while there are few. Outliers: see `goodSeconds` and `fitRobustly`.
 */
export function fitGroomModel(
  records: readonly GroomRecord[],
  prior: GroomPrior = groomPrior,
): GroomFit {
  const good: GoodRecord[] = [];
  for (const record of records) {
    const seconds = goodSeconds(record);
    if (seconds !== null) good.push({ record, seconds });
  }
  const lastDay = good.reduce((last, { record }) => Math.max(last, record.day), -Infinity);
  const fit: GroomFit = {
    version: learningVersion,
    records: good.length,
    leftOut: records.length - good.length,
    timedRecords: 0,
    lastDay: good.length > 0 ? lastDay : null,
    sd: { ...prior.sd },
    spread: prior.spread,
    effects: {},
    families: {},
  };
  if (good.length === 0) return fit;
  learnFamilies(fit, good, lastDay, prior);
  learnWhole(fit, good, lastDay, prior);
  return fit;
}

interface GoodRecord {
  record: GroomRecord;
  seconds: number;
}

/** Families change slowly; the newest timed visits say it and keep the fit quick. */
const MOST_TIMED = 4_000;

function learnFamilies(
  fit: GroomFit,
  good: readonly GoodRecord[],
  lastDay: number,
  prior: GroomPrior,
): void {
  const timed = good
    .map(({ record }) => ({ record, families: familyClocks(record) }))
    .filter(({ families }) => families.length >= 2)
    .sort((a, b) => a.record.day - b.record.day || (a.record.visitId < b.record.visitId ? -1 : 1))
    .slice(-MOST_TIMED);
  fit.timedRecords = timed.length;
  if (timed.length === 0) return;
  const rows = timed.flatMap(({ record, families }, visit) =>
    families.map((clock) => ({ ...clock, record, visit })),
  );
  const weights = Float64Array.from(rows, ({ logVariance }) => 1 / logVariance);
  const { familySd, familySpread } = prior;
  const { fit: found } = fitRobustly(
    {
      y: rows.map(({ lean }) => lean),
      fixed: [],
      weights,
      groups: [
        { name: 'visit', levels: rows.map(({ visit }) => String(visit)) },
        { name: 'family', levels: rows.map(({ family }) => family) },
        {
          name: 'groomerFamily',
          levels: rows.map(({ family, record }) => `groomer ${record.groomerId} ${family}`),
        },
        {
          name: 'coatStyleFamily',
          levels: rows.map(({ family, record }) => `coatStyle ${record.coatStyle} ${family}`),
        },
      ],
    },
    Float64Array.from(rows, ({ record }) => recency(record, lastDay, prior)),
    {
      prior: {
        residualSd: familySpread,
        residualRows: prior.spreadRows,
        sdByGroup: { ...familySd },
        logSdSpread: prior.logSdSpread,
      },
    },
    prior.huber,
  );
  for (const { name, effects } of found.groups) {
    if (name === 'visit') continue;
    for (const { level, value, se, rows: count } of effects)
      fit.families[level] = { value: short(value), se: short(se), records: count };
  }
}

function learnWhole(
  fit: GroomFit,
  good: readonly GoodRecord[],
  lastDay: number,
  prior: GroomPrior,
): void {
  const y = good.map(({ record, seconds }) => {
    const mix = mixLean(fit, record.steps, record.groomerId, record.coatStyle);
    return Math.log(seconds / medianOf(record.forecast)) - mix;
  });
  const weights = Float64Array.from(good, ({ record }) => 1 / logVarianceOf(record.forecast));
  const levels: Record<LearnedGroup, string[]> = {
    business: good.map(() => ''),
    groomer: good.map(({ record }) => record.groomerId),
    coatStyle: good.map(({ record }) => record.coatStyle),
    pet: good.map(({ record }) => record.petId),
  };
  const names = Object.keys(levels) as LearnedGroup[];
  const { fit: found, spread } = fitRobustly(
    { y, fixed: [], weights, groups: names.map((name) => ({ name, levels: levels[name] })) },
    Float64Array.from(good, ({ record }) => recency(record, lastDay, prior)),
    {
      prior: {
        residualSd: prior.spread,
        residualRows: prior.spreadRows,
        sdByGroup: prior.sd,
        logSdSpread: prior.logSdSpread,
      },
    },
    prior.huber,
  );
  fit.spread = short(spread);
  for (const { name, sd, effects } of found.groups) {
    const group = name as LearnedGroup;
    fit.sd[group] = short(sd);
    for (const { level, value, se, rows } of effects)
      fit.effects[effectKey(group, level)] = { value: short(value), se: short(se), records: rows };
  }
  addCovariances(fit.effects, found, good);
}

/** Errors of effects that were learned together hang together: a slow groomer or a slow pet? */
function addCovariances(
  effects: Record<string, LearnedEffect>,
  found: MixedModelFit,
  good: readonly GoodRecord[],
): void {
  for (const { record } of good) {
    const own = [
      ['business', ''],
      ['groomer', record.groomerId],
      ['coatStyle', record.coatStyle],
      ['pet', record.petId],
    ] as const;
    own.forEach(([group, level], index) => {
      const effect = effects[effectKey(group, level)]!;
      for (const [otherGroup, otherLevel] of own.slice(0, index)) {
        const key = effectKey(otherGroup, otherLevel);
        if (effect.with?.[key] !== undefined) continue;
        const covariance = found.covariance(group, level, otherGroup, otherLevel);
        if (covariance !== null) (effect.with ??= {})[key] = Number(covariance.toFixed(7));
      }
    });
  }
}

/** Families timed from end to end, as log(clock ÷ forecast) with the forecast's own variance. */
function familyClocks(
  record: GroomRecord,
): { family: StepFamily; lean: number; logVariance: number }[] {
  const byFamily = new Map<StepFamily, GroomRecord['steps']>();
  for (const step of record.steps)
    byFamily.set(step.family, [...(byFamily.get(step.family) ?? []), step]);
  return [...byFamily].flatMap(([family, steps]) => {
    if (!steps.every(goodStep)) return [];
    const sum = (of: (step: GroomRecord['steps'][number]) => number) =>
      steps.reduce((total, step) => total + of(step), 0);
    const lean = Math.log(sum((s) => s.actualSeconds!) / sum((s) => s.medianSeconds));
    const logVariance = logVarianceOf({
      meanSeconds: sum((s) => s.meanSeconds),
      varianceSeconds2: sum((s) => s.varianceSeconds2),
    });
    return [{ family, lean, logVariance }];
  });
}

function recency({ day }: GroomRecord, lastDay: number, { halfLifeDays }: GroomPrior): number {
  return 0.5 ** ((lastDay - day) / halfLifeDays);
}

/** Six figures after the point: a thousandth of a second on an hour. */
function short(value: number): number {
  return Number(value.toFixed(6));
}
