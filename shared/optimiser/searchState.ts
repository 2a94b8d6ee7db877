import type { ReadyStop } from '#shared/schedule/compileDay.ts';
import type { Dice } from './random.ts';
import type { Insertion, Trial } from './insertion.ts';
import type { SearchRun } from './searchRun.ts';

/** Where the search stands: runs by van, the bank of visits not placed, and what it all costs. */
export interface SearchState {
  trial: Trial;
  dice: Dice;
  runs: SearchRun[];
  /** Visits not placed, by visit index. */
  absent: number[];
  /** Van of each visit, −1 when absent, −2 when it may not be moved. */
  vanOf: Int32Array;
  /** Stops as the plan has them (their ids and pins), by visit index. */
  stopOf: ReadyStop[];
  cost: number;
  /** Visits by nearness to each visit. */
  near: Int32Array[];
  /** Last insertion tried per visit and van, valid while the run's version is the same. */
  cache: { version: Float64Array; found: (Insertion | null)[] };
}

/** What is needed to come back: runs are never changed, so references do. */
export interface Snapshot {
  runs: SearchRun[];
  absent: number[];
  cost: number;
}

export function takeSnapshot(state: SearchState): Snapshot {
  return { runs: [...state.runs], absent: [...state.absent], cost: state.cost };
}

/** Goes back to a snapshot. */
export function restore(state: SearchState, snapshot: Snapshot): void {
  state.absent = [...snapshot.absent];
  state.cost = snapshot.cost;
  for (let van = 0; van < state.runs.length; van += 1) {
    if (state.runs[van] === snapshot.runs[van]) continue;
    state.runs[van] = snapshot.runs[van]!;
    markVan(state, van);
  }
  for (const visit of state.absent) state.vanOf[visit] = -1;
}

/** Puts a new run in the place of a van's old one. Visits that left it are the caller's to place. */
export function replaceRun(state: SearchState, run: SearchRun): void {
  state.cost += run.cost - state.runs[run.vanIndex]!.cost;
  state.runs[run.vanIndex] = run;
  markVan(state, run.vanIndex);
}

/** Puts a visit into the bank. */
export function putAbsent(state: SearchState, visit: number): void {
  state.absent.push(visit);
  state.vanOf[visit] = -1;
  state.cost += state.stopOf[visit]!.visit!.fact.valueSeconds;
}

/** Takes a visit out of the bank. */
export function takeAbsent(state: SearchState, visit: number): void {
  state.absent.splice(state.absent.indexOf(visit), 1);
  state.cost -= state.stopOf[visit]!.visit!.fact.valueSeconds;
}

function markVan(state: SearchState, van: number): void {
  for (const stop of state.runs[van]!.stops)
    if (stop.visit && !stop.pinned) state.vanOf[stop.visit.index] = van;
}
