import { Op } from 'sequelize';
import type { RunHappened } from '#shared/schedule/reduceEvents.ts';
import type { DayProblem, Plan } from '#shared/schedule/types.ts';
import { withHappened } from '#shared/schedule/withHappened.ts';
import { Business } from '#server/models/Business.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Place } from '#server/models/Place.ts';
import { Run } from '#server/models/Run.ts';
import { RunVersion } from '#server/models/RunVersion.ts';
import { Shift } from '#server/models/Shift.ts';
import { Van } from '#server/models/Van.ts';
import { Visit } from '#server/models/Visit.ts';
import { loadHappened } from '#server/services/runs/loadHappened.ts';
import { loadVisitFacts, type VisitFacts } from '#server/services/visits/visitFacts.ts';
import { buildProblem } from './buildProblem.ts';
import { localDateOf } from './today.ts';

/** One run of a loaded day beside its van, shift and what the phone has. */
export interface LoadedRun {
  run: Run;
  van: Van;
  shift: Shift;
  groomer: Groomer;
  sent: Pick<RunVersion, 'problem' | 'plan'> | null;
  happened: RunHappened;
}

/** A date of one business as data: rows, facts, problem and draft plan. */
export interface LoadedDay {
  business: Business;
  date: string;
  runs: LoadedRun[];
  visits: VisitFacts[];
  problem: DayProblem;
  plan: Plan;
}

/** Loads a date within the business; with `lock`, its runs are locked in id order (after the day). */
export async function loadDay(
  businessId: string,
  date: string,
  now: Date,
  options: { lock?: boolean } = {},
): Promise<LoadedDay> {
  const business = (await Business.findByPk(businessId))!;
  const rows = await Run.findAll({
    where: { date },
    order: [['id', 'ASC']],
    lock: options.lock ?? false,
  });
  const [shifts, vans, groomers, places, visitRows, sentVersions, happened] = await Promise.all([
    Shift.findAll({ where: { date } }),
    Van.findAll({ order: [['name', 'ASC']] }),
    Groomer.findAll(),
    Place.findAll({ order: [['id', 'ASC']] }),
    Visit.findAll({ where: { date, status: { [Op.ne]: 'cancelled' } }, order: [['id', 'ASC']] }),
    loadSentVersions(rows),
    loadHappened(rows, business.timeZone),
  ]);
  const visits = await loadVisitFacts(visitRows);
  const runs = vans.flatMap((van): LoadedRun[] => {
    const run = rows.find((one) => one.vanId === van.id);
    const shift = shifts.find((one) => one.vanId === van.id);
    const groomer = groomers.find(
      (one) => one.id === (run?.sentAt ? run.groomerId : shift?.groomerId),
    );
    if (!run || !shift || !groomer) return [];
    return [
      {
        run,
        van,
        shift,
        groomer,
        sent: sentVersions.get(run.id) ?? null,
        happened: happened.get(run.id)!,
      },
    ];
  });
  const hasBegun =
    localDateOf(now, business.timeZone) === date &&
    runs.some((one) => one.happened.facts.length > 0);
  const sentRuns = runs.flatMap((one) => one.sent?.plan.runs ?? []);
  const problem = await buildProblem({
    business,
    date,
    shifts: runs,
    places,
    visits,
    facts: [],
    now: hasBegun ? now : null,
    sent: sentRuns.length > 0 ? { runs: sentRuns, notPlaced: [] } : null,
  });
  return {
    business,
    date,
    runs,
    visits,
    ...withFacts(problem, planOf(runs, visits, problem), runs),
  };
}

/** Lays every run's facts in: started stops come first, as they were touched. */
function withFacts(
  problem: DayProblem,
  plan: Plan,
  runs: LoadedRun[],
): { problem: DayProblem; plan: Plan } {
  let state = { problem, plan };
  for (const { van, happened } of runs)
    if (happened.facts.length > 0)
      state = withHappened(state.problem, state.plan, van.id, happened, problem.nowSeconds);
  return state;
}

/** The runs' stored orders, without what the day no longer holds: visits, places or meals taken away. */
function planOf(runs: LoadedRun[], visits: VisitFacts[], { refills }: DayProblem): Plan {
  const known = new Set(visits.map(({ visit }) => visit.id));
  const placed = new Set<string>();
  const planRuns = runs.map(({ run, shift, happened }) => ({
    vanId: run.vanId,
    stops: run.stops.filter((stop) => {
      if (stop.kind === 'refill') return refills.some((place) => place.id === stop.placeId);
      if (stop.kind === 'meal') return shift.meal != null || happened.stops.has(stop.id);
      if (stop.kind !== 'visit') return true;
      if (!known.has(stop.visitId) || placed.has(stop.visitId)) return false;
      placed.add(stop.visitId);
      return true;
    }),
  }));
  return { runs: planRuns, notPlaced: [...known].filter((id) => !placed.has(id)) };
}

async function loadSentVersions(runs: Run[]): Promise<Map<string, RunVersion>> {
  const sent = runs.filter((run) => run.sentVersion != null);
  if (sent.length === 0) return new Map();
  const versions = await RunVersion.findAll({
    where: { [Op.or]: sent.map((run) => ({ runId: run.id, version: run.sentVersion! })) },
    attributes: ['id', 'runId', 'version', 'problem', 'plan'],
  });
  return new Map(versions.map((version) => [version.runId, version]));
}
