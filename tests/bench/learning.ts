/**
 * What learning gains, and what it costs: `npx tsx tests/bench/learning.ts`. Twenty simulated
 * businesses of 2,000 visits (`businessSettings`, fixed before the learning), the middle one told; then
 * the time to fit 20,000 visits, CPU time of the process.
 */
import { businessSettings } from '#shared/grooming/learning/businessSettings.ts';
import { fitGroomModel } from '#shared/grooming/learning/fitGroomModel.ts';
import { fitMixedModel } from '#shared/grooming/learning/fitMixedModel.ts';
import { coverageBand, judgeBusiness } from '#shared/grooming/learning/judgeBusiness.ts';
import { simulateBusiness } from '#shared/grooming/learning/simulateBusiness.ts';
import { normalDraw } from '#shared/grooming/normalDraw.ts';
import { seededRandom } from '../support/random.ts';

const judged = businessSettings.seeds.map((seed) =>
  judgeBusiness(businessSettings, seededRandom(seed), 50),
);
const [low, high] = coverageBand(businessSettings.heldOutVisits);
print(
  'held-out visits',
  `${businessSettings.heldOutVisits} of ${businessSettings.visits}, 20 seeds`,
);
for (const [name, of] of [
  ['learned', 'learnedSeconds'],
  ['plain model', 'plainSeconds'],
  ['breed mean', 'breedMeanSeconds'],
  ['last visit', 'lastVisitSeconds'],
] as const) {
  print(`mean pinball, ${name}`, `${(middle(judged.map((each) => each[of])) / 60).toFixed(2)} min`);
}
for (const [name, of, most] of [
  ['breed mean', 'breedMeanSeconds', 75],
  ['last visit', 'lastVisitSeconds', 90],
] as const) {
  const ratios = judged.map((each) => (100 * each.learnedSeconds) / each[of]);
  const range = `${Math.min(...ratios).toFixed(0)}–${Math.max(...ratios).toFixed(0)} %`;
  print(`learned ÷ ${name}`, `${middle(ratios).toFixed(1)} % (all ${range}), wanted ≤ ${most} %`);
}
const covered = judged.map((each) => each.covered);
print(
  '80 % intervals cover',
  `${middle(covered)} of ${businessSettings.heldOutVisits} (all ${Math.min(...covered)}–${Math.max(...covered)}), band ${low}–${high}; ` +
    `${covered.filter((each) => each >= low && each <= high).length} of 20 seeds inside`,
);

// Enough pets for 20,000 visits in the same weeks.
const large = { ...businessSettings, visits: 20_000, pets: 3_000, groomers: 30 };
const records = simulateBusiness(large, seededRandom(1)).map(({ record }) => record);
for (const [name, timed] of [
  ['as simulated', records],
  [
    'no step timed',
    records.map((r) => ({ ...r, steps: r.steps.map((s) => ({ ...s, actualSeconds: null })) })),
  ],
] as const) {
  const started = process.cpuUsage();
  const fit = fitGroomModel(timed);
  const { user, system } = process.cpuUsage(started);
  print(
    `fit of ${timed.length} visits, ${name}`,
    `${((user + system) / 1e6).toFixed(2)} s, ${Object.keys(fit.effects).length} effects, ` +
      `${fit.timedRecords} timed, JSON ${(JSON.stringify(fit).length / 1024).toFixed(0)} kB`,
  );
}

// Crossed at random, which fills in most: 5,500 × 400 × 100 levels; and with nothing to find.
for (const sds of [
  [0.15, 0.07, 0.1],
  [0, 0, 0],
]) {
  const random = seededRandom(4);
  const groups = [5_500, 400, 100].map((count, k) => {
    const effects = Array.from({ length: count }, () => sds[k]! * normalDraw(random));
    const of = Array.from({ length: 20_000 }, () => Math.floor(random() * count));
    return { name: `g${k}`, effects, of, levels: of.map(String) };
  });
  const y = groups[0]!.of.map((_, i) =>
    groups.reduce((sum, { effects, of }) => sum + effects[of[i]!]!, 0.2 * normalDraw(random)),
  );
  const began = process.cpuUsage();
  const fit = fitMixedModel({ y, fixed: [y.map(() => 1)], groups });
  const { user, system } = process.cpuUsage(began);
  print(
    `mixed model, 20,000 × 6,000, SDs ${sds.join(', ')}`,
    `${((user + system) / 1e6).toFixed(2)} s, ${fit.steps} steps, found ${fit.groups.map(({ sd }) => sd.toFixed(3)).join(', ')}`,
  );
}

function middle(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return (
    (sorted[Math.floor((sorted.length - 1) / 2)]! + sorted[Math.ceil((sorted.length - 1) / 2)]!) / 2
  );
}

function print(what: string, value: string): void {
  process.stdout.write(`${what.padEnd(44)} ${value}\n`);
}
