/**
 * Small data sets with published mixed-model fits, for the test of `fitMixedModel`.
 *
 * The figures are measurements printed in: O. L. Davies and P. L. Goldsmith (eds), Statistical Methods
 * in Research and Production, 4th edition, 1972, tables 6.6 (penicillin), 6.3 (dyestuff) and 6.5
 * (pastes); G. E. P. Box and G. C. Tiao, Bayesian Inference in Statistical Analysis, 1973, table 5.1.4
 * (dyestuff2, simulated so that batches do not differ). Facts; no file of any program is copied.
 *
 * Fits as printed in D. Bates, M. Mächler, B. Bolker and S. Walker, Fitting Linear Mixed-Effects Models
 * Using lme4, J Stat Softw 67(1), 2015, and D. Bates, lme4: Mixed-effects modeling with R, 2010,
 * chapters 1 and 2; further digits from lme4 1.1-31 (Debian r-cran-lme4) run on the same figures.
 */
export interface PublishedFit {
  name: string;
  y: number[];
  groups: { name: string; levels: string[] }[];
  intercept: number;
  interceptSe: number;
  sdByGroup: Record<string, number>;
  residualSd: number;
  remlCriterion: number;
  /** A few predicted effects, with their conditional SD. */
  effects: { group: string; level: string; value: number; se: number }[];
}

const byRow = (rows: readonly string[], each: number) =>
  rows.flatMap((row) => Array.from({ length: each }, () => row));
const digits = (text: string) => [...text].map((digit) => 18 + Number(digit));

/** Diameters in mm, 24 plates (a–x) by 6 samples (A–F). Each digit is one diameter less 18. */
const plates = [
  '958553', '958553', '737662', '857552', '748452', '647541', '625341', '848663', '636442', '636541',
  '858663', '748662', '868674', '858552', '857664', '747552', '736552', '746551', '635331', '858663',
  '736440', '747442', '636461', '636430',
]; // prettier-ignore
const plateNames = [...'abcdefghijklmnopqrstuvwx'];

const batches = [...'ABCDEFGHIJ'];

export const publishedFits: readonly PublishedFit[] = [
  {
    name: 'penicillin',
    y: plates.flatMap(digits),
    groups: [
      { name: 'plate', levels: byRow(plateNames, 6) },
      { name: 'sample', levels: plateNames.flatMap(() => [...'ABCDEF']) },
    ],
    intercept: 22.9722222,
    interceptSe: 0.80859536,
    sdByGroup: { plate: 0.84670251, sample: 1.93161379 },
    residualSd: 0.54992268,
    remlCriterion: 330.860589,
    effects: [
      { group: 'plate', level: 'a', value: 0.804546906, se: 0.2713593 },
      { group: 'plate', level: 'm', value: 1.42742193, se: 0.2713593 },
      { group: 'sample', level: 'A', value: 2.187058402, se: 0.20217069 },
      { group: 'sample', level: 'F', value: -3.003744767, se: 0.20217069 },
    ],
  },
  {
    name: 'dyestuff',
    y: [
      1545, 1440, 1440, 1520, 1580, 1540, 1555, 1490, 1560, 1495, 1595, 1550, 1605, 1510, 1560,
      1445, 1440, 1595, 1465, 1545, 1595, 1630, 1515, 1635, 1625, 1520, 1455, 1450, 1480, 1445,
    ],
    groups: [{ name: 'batch', levels: byRow(batches.slice(0, 6), 5) }],
    intercept: 1527.5,
    interceptSe: 19.383412,
    sdByGroup: { batch: 42.000595 },
    residualSd: 49.5101,
    remlCriterion: 319.6542768,
    effects: [
      { group: 'batch', level: 'A', value: -17.60685137, se: 19.58657 },
      { group: 'batch', level: 'E', value: 56.73318774, se: 19.58657 },
    ],
  },
  {
    name: 'dyestuff2, where batches do not differ',
    y: [
      7.298, 3.846, 2.434, 9.566, 7.99, 5.22, 6.556, 0.608, 11.788, -0.892, 0.11, 10.386, 13.434,
      5.51, 8.166, 2.212, 4.852, 7.092, 9.288, 4.98, 0.282, 9.014, 4.458, 9.446, 7.198, 1.722,
      4.782, 8.106, 0.758, 3.758,
    ],
    groups: [{ name: 'batch', levels: byRow(batches.slice(0, 6), 5) }],
    intercept: 5.6656,
    interceptSe: 0.67838803,
    sdByGroup: { batch: 0 },
    residualSd: 3.71568427,
    remlCriterion: 161.8282778,
    effects: [{ group: 'batch', level: 'A', value: 0, se: 0 }],
  },
  {
    name: 'pastes, samples nested in batches',
    y: [
      62.8, 62.6, 60.1, 62.3, 62.7, 63.1, 60, 61.4, 57.5, 56.9, 61.1, 58.9, 58.7, 57.5, 63.9, 63.1,
      65.4, 63.7, 57.1, 56.4, 56.9, 58.6, 64.7, 64.5, 55.1, 55.1, 54.7, 54.2, 58.8, 57.5, 63.4,
      64.9, 59.3, 58.1, 60.5, 60, 62.5, 62.6, 61, 58.7, 56.9, 57.7, 59.2, 59.4, 65.2, 66, 64.8,
      64.1, 54.8, 54.8, 64, 64, 57.7, 56.8, 58.3, 59.3, 59.2, 59.2, 58.9, 56.6,
    ],
    groups: [
      { name: 'batch', levels: byRow(batches, 6) },
      {
        name: 'sample',
        levels: byRow(
          batches.flatMap((batch) => [...'abc'].map((cask) => batch + cask)),
          2,
        ),
      },
    ],
    intercept: 60.0533333,
    interceptSe: 0.67687005,
    sdByGroup: { batch: 1.287364735, sample: 2.90407781 },
    residualSd: 0.823407523,
    remlCriterion: 246.9907459,
    effects: [
      { group: 'batch', level: 'A', value: 0.800643994, se: 1.0284934 },
      { group: 'batch', level: 'H', value: 1.108120226, se: 1.0284934 },
      { group: 'sample', level: 'Aa', value: 1.77468729, se: 1.1417206 },
      { group: 'sample', level: 'Ia', value: -4.57390132, se: 1.1417206 },
    ],
  },
];
