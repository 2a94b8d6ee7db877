import { isMovable, thinRun } from './searchRun.ts';
import { putAbsent, replaceRun, type SearchState } from './searchState.ts';

const mostRemoved = 10;
const longestString = 10;
const splitChance = 0.5;
const splitGrowth = 0.01;

/**
 * Cuts strings of neighbouring visits out of runs near a random visit and puts them into the bank
 * (Christiaens & Vanden Berghe, Slack Induction by String Removals, 2020).
 * Half the time the visit is one of the bank, if there are any. Returns how many it cut; the seed
 * from the bank then lies at the bank's end, among those cut.
 */
export function ruin(state: SearchState): number {
  const { dice, near, vanOf, runs } = state;
  const count = near.length;
  const placed = count - state.absent.length;
  if (placed <= 0) return 0;
  const used = runs.filter((run) => run.stops.length > 0).length || 1;
  const average = placed / used;
  const longest = Math.max(1, Math.min(longestString, average));
  const removed = Math.min(mostRemoved, Math.max(2, placed / 3));
  const mostStrings = (4 * removed) / (1 + longest) - 1;
  const strings = Math.max(1, Math.floor(1 + dice.next() * Math.max(0, mostStrings)));
  const touched = new Set<number>();
  const seed = chooseSeed(state);
  for (const visit of near[seed]!) {
    const van = vanOf[visit]!;
    if (van < 0 || touched.has(van)) continue;
    if (!cutString(state, van, visit, longest)) continue;
    touched.add(van);
    if (touched.size >= strings) break;
  }
  return state.absent.length - (count - placed) + (vanOf[seed] === -1 ? 1 : 0);
}

function chooseSeed(state: SearchState): number {
  const { dice, absent, near } = state;
  if (absent.length === 0 || dice.chance(0.5)) return dice.below(near.length);
  const at = dice.below(absent.length);
  const seed = absent[at]!;
  absent.splice(at, 1);
  absent.push(seed);
  return seed;
}

function cutString(state: SearchState, van: number, seed: number, longest: number): boolean {
  const { dice } = state;
  const run = state.runs[van]!;
  const movable: number[] = [];
  let seedAt = -1;
  for (const stop of run.stops)
    if (isMovable(stop)) {
      if (stop.visit!.index === seed) seedAt = movable.length;
      movable.push(stop.visit!.index);
    }
  if (seedAt < 0) return false;
  const most = Math.min(movable.length, longest);
  const length = Math.max(1, Math.floor(1 + dice.next() * most - 1e-9));
  const cut = new Set(chooseString(state, movable, seedAt, Math.min(length, movable.length)));
  const rebuilt = thinRun(
    state.trial.day,
    run,
    (stop) => !stop.visit || !cut.has(stop.visit.index),
  );
  if (!rebuilt) return false;
  for (const visit of cut) putAbsent(state, visit);
  replaceRun(state, rebuilt);
  return true;
}

/** `length` visits around the seed; with a split, some inside the string are spared. */
function chooseString(
  state: SearchState,
  movable: number[],
  seedAt: number,
  length: number,
): number[] {
  const { dice } = state;
  let spared = 0;
  if (length > 1 && length < movable.length && dice.chance(splitChance)) {
    spared = 1;
    while (length + spared < movable.length && !dice.chance(splitGrowth)) spared += 1;
    if (!dice.chance(0.5)) spared = 1;
  }
  const span = length + spared;
  const least = Math.max(0, seedAt - span + 1);
  const latest = Math.min(seedAt, movable.length - span);
  const from = least + dice.below(latest - least + 1);
  const string = movable.slice(from, from + span);
  if (spared > 0) string.splice(1 + dice.below(length - 1), spared);
  return string;
}
