/**
 * Judges a plan from the rules' text (shared/schedule/RULES.md) alone. Written apart from the
 * evaluator: it imports nothing of it but types, works in doubles, integrates the normal from its
 * density and walks each run in one plain loop.
 */
import type {
  DayProblem,
  MealRule,
  Plan,
  RuleName,
  Run,
  StopFact,
  VanShift,
  VisitFact,
} from '#shared/schedule/types.ts';
import { meanGivenLonger, skewedLoss, truncated, varianceGivenLonger } from './spread.ts';

export interface Verdict {
  /** Arrival, beginning and end by stop id. */
  times: Map<string, [arrive: number, begin: number, end: number]>;
  finish: Map<string, number>;
  /** Hard rules broken and not inherited, as `rule van stop byAmount`. */
  broken: string[];
  cost: {
    driveSeconds: number;
    lateSeconds: number;
    waitSeconds: number;
    overtimeSeconds: number;
    notPlacedSeconds: number;
    otherGroomerSeconds: number;
    disturbSeconds: number;
  };
  totalCost: number;
}

interface Walk {
  breaks: { rule: RuleName; stop: string | null; by: number; inherited: boolean }[];
  times: Map<string, [number, number, number]>;
  finish: number;
  drive: number;
  late: number;
  wait: number;
  other: number;
  disturbed: number;
  /** Time and place once the started stops are over; null when nothing pushed the van. */
  pushedFrom: { time: number; place: number; site: string | null } | null;
}

/** Everything the rules say about a plan. */
export function judge(problem: DayProblem, plan: Plan): Verdict {
  const verdict: Verdict = {
    times: new Map(),
    finish: new Map(),
    broken: [],
    cost: {
      driveSeconds: 0,
      lateSeconds: 0,
      waitSeconds: 0,
      overtimeSeconds: 0,
      notPlacedSeconds: 0,
      otherGroomerSeconds: 0,
      disturbSeconds: 0,
    },
    totalCost: 0,
  };
  const w = problem.weights;
  const placed = new Set<string>();
  for (const run of plan.runs) {
    const van = problem.vans.find((each) => each.vanId === run.vanId)!;
    const started = leadingStarted(problem, run);
    const alone = started.length > 0 ? walk(problem, van, { ...run, stops: started }) : null;
    const whole = walk(problem, van, run);
    for (const [id, times] of whole.times) verdict.times.set(id, times);
    verdict.finish.set(run.vanId, whole.finish);
    for (const { rule, stop, by, inherited } of whole.breaks) {
      const before =
        rule === 'overtime' || rule === 'driveLimit'
          ? (alone?.breaks.find((each) => each.rule === rule)?.by ?? 0)
          : 0;
      if (!inherited && by > 0 && by <= before) continue;
      if (!inherited) verdict.broken.push(`${rule} ${run.vanId} ${stop} ${by}`);
    }
    run.stops.forEach((stop, i) => {
      if (stop.kind === 'visit') placed.add(stop.visitId);
      const fact = factOf(problem, stop.id);
      if (fact && !gaveUp(fact) && (fact.vanId !== run.vanId || i >= started.length))
        verdict.broken.push(`started ${fact.vanId} ${stop.id} 0`);
    });
    verdict.cost.driveSeconds += whole.drive;
    verdict.cost.lateSeconds += w.lateFactor * whole.late;
    verdict.cost.waitSeconds += Math.round((w.waitFactorPermille * whole.wait) / 1000);
    verdict.cost.overtimeSeconds += w.overtimeFactor * Math.max(0, whole.finish - van.endSeconds);
    verdict.cost.otherGroomerSeconds += w.otherGroomerSeconds * whole.other;
    verdict.cost.disturbSeconds += w.disturbSeconds * whole.disturbed;
  }
  for (const fact of problem.facts)
    if (
      isStarted(fact) &&
      !gaveUp(fact) &&
      !plan.runs.some((run) => run.stops.some((stop) => stop.id === fact.stopId))
    )
      verdict.broken.push(`started ${fact.vanId} ${fact.stopId} 0`);
  for (const visit of problem.visits)
    if (!placed.has(visit.id)) verdict.cost.notPlacedSeconds += visit.valueSeconds;
  verdict.broken.sort();
  verdict.totalCost = Object.values(verdict.cost).reduce((sum, part) => sum + part, 0);
  return verdict;
}

function walk(problem: DayProblem, van: VanShift, run: Run): Walk {
  const out: Walk = {
    breaks: [],
    times: new Map(),
    finish: van.startSeconds,
    drive: 0,
    late: 0,
    wait: 0,
    other: 0,
    disturbed: 0,
    pushedFrom: null,
  };
  if (run.stops.length === 0) return out;
  const now = problem.nowSeconds;
  let time = van.startSeconds + van.loadSeconds;
  let place = van.startPoint;
  let site: string | null = null;
  let risk = { mean: time, variance: 0, third: 0 };
  const used = new Map(van.tanks.map((tank) => [tank.kind, tank.usedAtStartMl]));
  let meal: { id: string; begin: number; started: boolean } | null = null;
  let visitsBefore = 0;
  let lastPinned: string | null = null;
  let ahead = false;
  let anyStarted = false;

  const drivePart = (to: number, from: number, siteFree: boolean) =>
    siteFree ? 0 : drivingSeconds(problem, place, to, from);
  const addLeg = (seconds: number) => {
    out.drive += seconds;
    const spread = (problem.drive.cvPermille / 1000) * seconds;
    risk = plus(risk, seconds, Math.round(spread * spread));
  };
  const startAhead = () => {
    if (ahead) return;
    ahead = true;
    if (now === null) return;
    if (anyStarted || time < now) out.pushedFrom = { time: Math.max(time, now), place, site };
    time = Math.max(time, now);
    risk = truncated(risk, now);
  };
  const broke = (rule: RuleName, stop: string | null, by: number, inherited: boolean) =>
    out.breaks.push({ rule, stop, by, inherited });

  for (const [i, stop] of run.stops.entries()) {
    const fact = factOf(problem, stop.id);
    const mine = fact && fact.vanId === van.vanId && isStarted(fact) ? fact : null;
    if (mine && gaveUp(mine)) {
      out.times.set(stop.id, [time, time, time]);
      continue;
    }
    if (mine) anyStarted = true;
    else startAhead();
    const visit =
      stop.kind === 'visit' ? problem.visits.find((each) => each.id === stop.visitId)! : null;
    const refill =
      stop.kind === 'refill' ? problem.refills.find((each) => each.id === stop.placeId)! : null;
    const to: number | null = visit
      ? visit.point
      : refill
        ? refill.point
        : stop.kind === 'errand'
          ? stop.point
          : null;
    const onSite: boolean = visit !== null && visit.siteId !== null && visit.siteId === site;

    // Getting there.
    let arrive: number;
    if (mine) {
      const depart = mine.drivingSinceSeconds ?? time;
      const planned = to === null ? 0 : drivePart(to, depart, onSite);
      const tapped = mine.arrivedSeconds ?? mine.workingSinceSeconds ?? mine.leftSeconds;
      arrive = tapped ?? Math.max(now ?? 0, depart + planned);
      if (tapped === null) {
        risk = { mean: depart, variance: 0, third: 0 };
        addLeg(planned);
        out.drive += arrive - depart - planned;
        risk = truncated(risk, now ?? 0);
      } else {
        out.drive +=
          mine.drivingSinceSeconds === null
            ? planned
            : Math.max(0, arrive - mine.drivingSinceSeconds);
        risk = { mean: arrive, variance: 0, third: 0 };
      }
      if (to !== null) place = to;
    } else if (to !== null) {
      const seconds = drivePart(to, time, onSite);
      addLeg(seconds);
      arrive = time + seconds;
      place = to;
    } else {
      arrive = time;
      if (stop.kind === 'meal' && van.meal && time < van.meal.earliestStartSeconds) {
        const next = run.stops[i + 1];
        const nextVisit =
          next?.kind === 'visit' ? problem.visits.find((each) => each.id === next.visitId)! : null;
        const nextPlace = next
          ? nextVisit
            ? nextVisit.point
            : next.kind === 'refill'
              ? problem.refills.find((each) => each.id === next.placeId)!.point
              : next.kind === 'errand'
                ? next.point
                : null
          : van.endPoint;
        if (nextPlace !== null) {
          const free = nextVisit !== null && nextVisit.siteId !== null && nextVisit.siteId === site;
          const seconds = drivePart(nextPlace, time, free);
          if (
            Math.max(time + seconds, van.meal.earliestStartSeconds) <= van.meal.latestStartSeconds
          ) {
            addLeg(seconds);
            arrive = time + seconds;
            place = nextPlace;
          }
        }
      }
    }

    // Being there.
    const inherited = mine !== null;
    let begin = arrive;
    if (visit) {
      judgeVisit(visit, stop.id, inherited);
      const own = visit.workByGroomer[van.groomerId] ?? visit.work;
      const setUp = onSite ? 0 : visit.setUpSeconds;
      const clean = visit.cleanDownSeconds;
      if (mine && mine.leftSeconds !== null) {
        time = mine.leftSeconds;
        if (mine.failedReason !== null) begin = time;
        else {
          const working = Math.min(time, mine.workingSinceSeconds ?? arrive + setUp);
          begin = Math.max(arrive, working - setUp);
        }
        risk = { mean: time, variance: 0, third: 0 };
      } else if (mine && mine.workingSinceSeconds !== null) {
        const since = mine.workingSinceSeconds;
        begin = Math.max(arrive, since - setUp);
        const passed = Math.max(0, (now ?? 0) - since);
        const mean = meanGivenLonger(own.meanSeconds, own.varianceSeconds2, passed);
        const variance = varianceGivenLonger(own.meanSeconds, own.varianceSeconds2, passed);
        time = since + mean + clean;
        risk = plus({ mean: since + clean, variance: 0, third: 0 }, mean, variance);
      } else {
        const found = beginning(visit, arrive, setUp + own.meanSeconds + clean);
        begin = found.begin;
        if (found.missed > 0) {
          const from = out.pushedFrom;
          let direct = 0;
          if (!inherited && from) {
            const same = visit.siteId !== null && visit.siteId === from.site;
            const there =
              from.time + (same ? 0 : drivingSeconds(problem, from.place, visit.point, from.time));
            direct = beginning(
              visit,
              there,
              (same ? 0 : visit.setUpSeconds) + own.meanSeconds + clean,
            ).missed;
          }
          broke('window', stop.id, found.missed, inherited || found.missed <= direct);
        }
        if (found.heldUntil !== null) risk = truncated(risk, found.heldUntil);
        const ready =
          mine && mine.arrivedSeconds !== null ? Math.max(begin + setUp, now ?? 0) : begin + setUp;
        risk = plus(
          { ...risk, mean: risk.mean + (ready - begin) + clean },
          own.meanSeconds,
          own.varianceSeconds2,
        );
        time = ready + own.meanSeconds + clean;
      }
      site = visit.siteId;
      if (mine?.failedReason == null)
        for (const tank of van.tanks) {
          const ml = visit.tankUse
            .filter((use) => use.kind === tank.kind)
            .reduce((sum, use) => sum + use.ml, 0);
          if (ml === 0) continue;
          const level = used.get(tank.kind)! + ml;
          used.set(tank.kind, level);
          if (level > tank.capacityMl) broke('tank', stop.id, level - tank.capacityMl, inherited);
        }
    } else {
      const held =
        refill?.opensSeconds ??
        (stop.kind === 'meal' && van.meal ? van.meal.earliestStartSeconds : null);
      const length = refill
        ? refill.lengthSeconds
        : stop.kind === 'meal'
          ? (van.meal?.lengthSeconds ?? 0)
          : 'lengthSeconds' in stop
            ? stop.lengthSeconds
            : 0;
      if (mine && mine.leftSeconds !== null) {
        begin = Math.max(arrive, Math.min(mine.leftSeconds, mine.workingSinceSeconds ?? arrive));
        time = mine.leftSeconds;
        risk = { mean: time, variance: 0, third: 0 };
      } else {
        const hold = mine?.workingSinceSeconds ?? held;
        begin = hold === null ? arrive : Math.max(arrive, hold);
        if (hold !== null) risk = truncated(risk, hold);
        risk = { ...risk, mean: risk.mean + length };
        time = begin + length;
        if (mine && mine.arrivedSeconds !== null) {
          risk = truncated(risk, now ?? 0);
          time = Math.max(time, now ?? 0);
        }
      }
      if (mine?.failedReason == null) {
        for (const kind of refill?.kinds ?? []) if (used.has(kind)) used.set(kind, 0);
        if (refill && time > refill.closesSeconds)
          broke('refillHours', stop.id, time - refill.closesSeconds, inherited);
        if (stop.kind === 'meal' && meal === null)
          meal = { id: stop.id, begin, started: mine !== null };
      }
      if (stop.kind === 'refill' || stop.kind === 'errand') site = null;
    }
    out.wait += begin - arrive;
    out.times.set(stop.id, [arrive, begin, time]);
  }

  startAhead();
  const home = drivingSeconds(problem, place, van.endPoint, time);
  out.drive += home;
  out.finish = time + home + van.washDownSeconds;
  const over = out.finish - van.endSeconds - van.mostOvertimeSeconds;
  if (over > 0) broke('overtime', null, over, false);
  if (van.mostDriveSeconds !== null && out.drive > van.mostDriveSeconds)
    broke('driveLimit', null, out.drive - van.mostDriveSeconds, false);
  judgeMeal(van.meal, meal);
  return out;

  function judgeVisit(visit: VisitFact, id: string, inherited: boolean): void {
    if (visit.needs.some((need) => !van.skills.includes(need))) broke('skill', id, 0, inherited);
    if (visit.heaviestGrams > van.tableLimitGrams)
      broke('tableLimit', id, visit.heaviestGrams - van.tableLimitGrams, inherited);
    if (visit.barredGroomerIds.includes(van.groomerId)) broke('barredGroomer', id, 0, inherited);
    if (visit.pin?.vanId !== undefined && visit.pin.vanId !== van.vanId)
      broke('pin', id, 0, inherited);
    if (visit.pin?.position === 'first' && visitsBefore > 0) broke('pin', id, 0, inherited);
    if (lastPinned !== null) broke('pin', lastPinned, 0, inherited);
    if (visit.pin?.position === 'last') lastPinned = id;
    visitsBefore += 1;
    if (visit.preferredGroomerIds.length > 0 && !visit.preferredGroomerIds.includes(van.groomerId))
      out.other += 1;
    const sentTo = problem.sent?.runs.find((each) =>
      each.stops.some((stop) => stop.id === visit.id),
    );
    if (sentTo && sentTo.vanId !== van.vanId) out.disturbed += 1;
    if (visit.promise) out.late += Math.round(skewedLoss(risk, visit.promise.endSeconds));
  }

  function judgeMeal(rule: MealRule | null, eaten: typeof meal): void {
    if (!rule) return;
    const span = out.finish - van.startSeconds;
    if (
      span <= rule.dueAfterSeconds ||
      out.finish <= rule.earliestStartSeconds ||
      van.startSeconds > rule.latestStartSeconds
    )
      return;
    const past =
      out.pushedFrom !== null &&
      (eaten?.started === true ||
        out.pushedFrom.time > rule.latestStartSeconds ||
        leadingStarted(problem, run).length === run.stops.length);
    if (!eaten) broke('meal', null, span - rule.dueAfterSeconds, past);
    else if (eaten.begin > rule.latestStartSeconds)
      broke('meal', eaten.id, eaten.begin - rule.latestStartSeconds, past);
  }
}

/** Minute-free driving: walk the bands with what is left of the base seconds. */
function drivingSeconds(problem: DayProblem, from: number, to: number, depart: number): number {
  const base = problem.drive.baseSeconds[from * problem.points.length + to]!;
  const bands = problem.drive.bands;
  let at = depart;
  let left = base;
  while (left > 0) {
    const band = bands.findLast((each) => each.fromSeconds <= at) ?? bands[0]!;
    const edge = bands.find((each) => each.fromSeconds > at)?.fromSeconds ?? Infinity;
    const pace = band.permille / 1000;
    if (at + left * pace <= edge) {
      at += left * pace;
      break;
    }
    left -= (edge - at) / pace;
    at = edge;
  }
  return Math.round(at) - depart;
}

function beginning(visit: VisitFact, arrive: number, stay: number) {
  const firm = [visit.promise?.startSeconds, visit.pin?.startSeconds].filter(
    (each) => each !== undefined,
  );
  const free = Math.max(arrive, ...firm);
  const choices = visit.allowed.map((window) => {
    const begin = Math.max(free, window.startSeconds);
    const past = (window.binds === 'stay' ? begin + stay : begin) - window.endSeconds;
    return { begin, missed: Math.max(0, past), opens: window.startSeconds };
  });
  choices.sort((a, b) => a.missed - b.missed || a.begin - b.begin || a.opens - b.opens);
  const [best] = choices;
  const held = best ? [...firm, best.opens] : firm;
  return {
    begin: best?.begin ?? free,
    missed: best?.missed ?? 0,
    heldUntil: held.length > 0 ? Math.max(...held) : null,
  };
}

function plus(
  risk: { mean: number; variance: number; third: number },
  mean: number,
  variance: number,
) {
  if (variance <= 0 || mean <= 0) return { ...risk, mean: risk.mean + mean };
  const c = Math.sqrt(variance) / mean;
  const skew = 3 * c + c ** 3;
  return {
    mean: risk.mean + mean,
    variance: risk.variance + variance,
    third: risk.third + skew * variance ** 1.5,
  };
}

function leadingStarted(problem: DayProblem, run: Run) {
  const first = run.stops.findIndex((stop) => {
    const fact = factOf(problem, stop.id);
    return !fact || fact.vanId !== run.vanId || !isStarted(fact);
  });
  return first < 0 ? run.stops : run.stops.slice(0, first);
}

function factOf(problem: DayProblem, stopId: string): StopFact | undefined {
  return problem.facts.find((fact) => fact.stopId === stopId);
}

function isStarted(fact: StopFact): boolean {
  return (
    fact.drivingSinceSeconds !== null ||
    fact.arrivedSeconds !== null ||
    fact.workingSinceSeconds !== null ||
    fact.leftSeconds !== null ||
    fact.failedReason !== null
  );
}

function gaveUp(fact: StopFact): boolean {
  return (
    fact.failedReason !== null &&
    fact.drivingSinceSeconds === null &&
    fact.arrivedSeconds === null &&
    fact.workingSinceSeconds === null
  );
}
