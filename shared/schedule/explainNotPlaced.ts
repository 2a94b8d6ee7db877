import { applyMove } from './applyMove.ts';
import { compileDay } from './compileDay.ts';
import { evaluateRun } from './evaluateDay.ts';
import { reasonWords } from './reasonWords.ts';
import type { VanReason } from './vanReason.ts';
import type { BrokenRule, DayProblem, Plan, VanShift, VisitFact } from './types.ts';

export type { VanReason } from './vanReason.ts';

/** A visit that is not placed: every van's reason, and the smallest single thing that would place it. */
export interface NotPlacedReason {
  visitId: string;
  label: string;
  vans: VanReason[];
  /** Null when no single relaxation places it. */
  smallest: VanReason | null;
  words: string;
}

/** Why each visit is not placed, found by trying every place in every run (settled, evaluated in full). */
export function explainNotPlaced(problem: DayProblem, plan: Plan): NotPlacedReason[] {
  const placed = new Set(
    plan.runs.flatMap((run) =>
      run.stops.map((stop) => (stop.kind === 'visit' ? stop.visitId : '')),
    ),
  );
  const facts = compileDay(problem).facts;
  return problem.visits
    .filter((visit) => !placed.has(visit.id) && !facts.has(visit.id))
    .map((visit) => explainVisit(problem, plan, visit));
}

/** Why one visit is not placed. */
export function explainVisit(problem: DayProblem, plan: Plan, visit: VisitFact): NotPlacedReason {
  const vans = problem.vans.map((van) => explainVan(problem, plan, visit, van));
  const single = vans.filter((van) => van.otherRules === 0 && canGive(van));
  const smallest = single.sort(smallerFirst)[0] ?? null;
  const nobodyWorks = vans.every((van) => van.rule === 'notWorking');
  const words =
    nobodyWorks || vans.length === 0
      ? 'no van works then'
      : (smallest?.words ?? [...new Set(vans.map((van) => van.words))].join('; '));
  return { visitId: visit.id, label: visit.label, vans, smallest, words };
}

function explainVan(problem: DayProblem, plan: Plan, visit: VisitFact, van: VanShift): VanReason {
  const never = neverRule(problem, visit, van);
  if (never) return withWords(problem, visit, van, never);
  const run = plan.runs.find((each) => each.vanId === van.vanId) ?? {
    vanId: van.vanId,
    stops: [],
  };
  const before = evaluateRun(problem, run);
  const already = before.times.broken;
  const visits = run.stops.filter((stop) => stop.kind === 'visit').length;
  let best: Omit<VanReason, 'words'> | null = null;
  let bestRank = Infinity;
  for (let index = 0; index <= visits; index += 1) {
    const tried = applyMove(problem, plan, {
      kind: 'placeVisit',
      visitId: visit.id,
      vanId: van.vanId,
      index,
    });
    if (!tried.moved) continue;
    const after = evaluateRun(
      problem,
      tried.plan.runs.find((each) => each.vanId === van.vanId)!,
    );
    const broken = after.times.broken.filter((now) => isNew(now, already));
    const added = costOf(problem, after) - costOf(problem, before);
    const rules = new Set(broken.map((each) => each.rule));
    const worst = [...broken].sort((a, b) => b.byAmount - a.byAmount)[0];
    const total = broken.reduce((sum, each) => sum + each.byAmount, 0);
    const rank = rules.size * 1e12 + total * 1e3 + added / 1e6;
    if (rank >= bestRank) continue;
    bestRank = rank;
    best = {
      vanId: van.vanId,
      rule: worst?.rule ?? 'fits',
      byAmount: worst?.byAmount ?? 0,
      stopId: worst?.stopId ?? null,
      otherRules: Math.max(0, rules.size - 1),
      index,
      addedCost: added,
    };
  }
  return withWords(problem, visit, van, best ?? blocked(van.vanId, 'notWorking', 0));
}

/** A rule no place in the run can mend. */
function neverRule(
  problem: DayProblem,
  visit: VisitFact,
  van: VanShift,
): Omit<VanReason, 'words'> | null {
  const missing = visit.needs.filter((skill) => !van.skills.includes(skill));
  if (missing.length > 0) return blocked(van.vanId, 'skill', 0);
  if (visit.heaviestGrams > van.tableLimitGrams)
    return blocked(van.vanId, 'tableLimit', visit.heaviestGrams - van.tableLimitGrams);
  if (visit.barredGroomerIds.includes(van.groomerId)) return blocked(van.vanId, 'barredGroomer', 0);
  if (visit.pin?.vanId !== undefined && visit.pin.vanId !== van.vanId)
    return blocked(van.vanId, 'pin', 0);
  const from = Math.max(van.startSeconds, problem.nowSeconds ?? 0);
  const to = van.endSeconds + van.mostOvertimeSeconds;
  const works =
    from < to &&
    (visit.allowed.length === 0 ||
      visit.allowed.some((window) => window.startSeconds < to && window.endSeconds > from));
  return works ? null : blocked(van.vanId, 'notWorking', 0);
}

function blocked(
  vanId: string,
  rule: VanReason['rule'],
  byAmount: number,
): Omit<VanReason, 'words'> {
  return { vanId, rule, byAmount, stopId: null, otherRules: 0, index: null, addedCost: 0 };
}

function withWords(
  problem: DayProblem,
  visit: VisitFact,
  van: VanShift,
  reason: Omit<VanReason, 'words'>,
): VanReason {
  return { ...reason, words: reasonWords(problem, visit, van, reason) };
}

function isNew(now: BrokenRule, already: BrokenRule[]): boolean {
  if (!now.hard || now.inherited) return false;
  return !already.some(
    (old) => old.rule === now.rule && old.stopId === now.stopId && old.byAmount >= now.byAmount,
  );
}

function costOf(problem: DayProblem, run: ReturnType<typeof evaluateRun>): number {
  const { times, state } = run;
  const weights = problem.weights;
  return (
    times.driveSeconds +
    weights.lateFactor * state.lateSeconds +
    Math.floor((weights.waitFactorPermille * times.waitSeconds + 500) / 1000) +
    weights.overtimeFactor * times.overtimeSeconds +
    weights.otherGroomerSeconds * state.otherGroomers +
    weights.disturbSeconds * state.disturbed
  );
}

/** Rules a person can let give way by an amount (or that do not stand in the way at all). */
function canGive(reason: VanReason): boolean {
  return (
    reason.rule === 'fits' ||
    (reason.index !== null && reason.byAmount > 0) ||
    reason.rule === 'skill' ||
    reason.rule === 'tableLimit' ||
    reason.rule === 'barredGroomer' ||
    reason.rule === 'pin'
  );
}

/** Fits first, then seconds to give, then what no minutes can mend. */
function smallerFirst(one: VanReason, other: VanReason): number {
  const rank = (reason: VanReason) => {
    if (reason.rule === 'fits') return 0;
    if (reason.index === null) return 3;
    return reason.rule === 'tank' ? 2 : 1;
  };
  return (
    rank(one) - rank(other) || one.byAmount - other.byAmount || one.addedCost - other.addedCost
  );
}
