import { Op } from 'sequelize';
import type { RunHappened, StopHappened } from '#shared/schedule/reduceEvents.ts';
import { Business } from '#server/models/Business.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Run } from '#server/models/Run.ts';
import { RunVersion } from '#server/models/RunVersion.ts';
import { Van } from '#server/models/Van.ts';
import type { VisitForecast } from '#server/models/Visit.ts';
import { loadHappened } from '#server/services/runs/loadHappened.ts';
import { runTimes } from '#server/services/runs/runTimes.ts';
import { workSeconds } from '#server/services/runs/workSeconds.ts';
import type { Totals } from './totals.ts';

export interface ReviewedVisit {
  visitId: string;
  date: string;
  label: string;
  vanName: string;
  groomerName: string;
  coatStyle: string;
  forecastSeconds: number;
  p10Seconds: number;
  p90Seconds: number;
  clockSeconds: number;
  promiseKept: boolean | null;
}

export interface ReviewedRun {
  date: string;
  vanId: string;
  vanName: string;
  shape: string;
  totals: Totals;
  visits: ReviewedVisit[];
}

/** Runs of some dates as they went. A run nobody began is left out: it tells nothing. */
export async function reviewRuns(
  businessId: string,
  from: string,
  to: string,
): Promise<ReviewedRun[]> {
  const business = (await Business.findByPk(businessId))!;
  const runs = await Run.findAll({
    where: { date: { [Op.between]: [from, to] }, sentVersion: { [Op.ne]: null } },
    order: [
      ['date', 'ASC'],
      ['id', 'ASC'],
    ],
  });
  if (runs.length === 0) return [];
  const [versions, happened, vans, groomers] = await Promise.all([
    RunVersion.findAll({
      where: { [Op.or]: runs.map((run) => ({ runId: run.id, version: run.sentVersion! })) },
      attributes: ['id', 'businessId', 'runId', 'problem', 'plan', 'cards'],
    }),
    loadHappened(runs, business.timeZone),
    Van.findAll(),
    Groomer.findAll(),
  ]);
  return runs.flatMap((run) => {
    const what = happened.get(run.id)!;
    if (what.facts.length === 0) return [];
    const version = versions.find((one) => one.runId === run.id)!;
    const van = vans.find((one) => one.id === run.vanId)!;
    const groomerName = groomers.find((one) => one.id === run.groomerId)?.name ?? '';
    return [reviewRun(run.date, van, groomerName, version, what)];
  });
}

function reviewRun(
  date: string,
  van: Van,
  groomerName: string,
  version: RunVersion,
  happened: RunHappened,
): ReviewedRun {
  const times = runTimes(version, happened, null);
  const over = times.stops.every((stop) => stop.state === 'done' || stop.state === 'failed');
  const past = times.stops.filter((stop) => stop.state === 'done' || stop.state === 'failed');
  const forecasts = new Map(
    (version.cards as { visitId: string; forecast: VisitForecast }[]).map((card) => [
      card.visitId,
      card.forecast,
    ]),
  );
  const visits: ReviewedVisit[] = [];
  const totals: Totals = {
    groomSeconds: 0,
    scissorSeconds: 0,
    driveSeconds: past.reduce(
      (sum, stop) => sum + stop.driveSeconds,
      over ? times.homeDriveSeconds : 0,
    ),
    driveMetres: past.reduce(
      (sum, stop) => sum + stop.driveMetres,
      over ? times.homeDriveMetres : 0,
    ),
    waitSeconds: past.reduce((sum, stop) => sum + stop.waitSeconds, 0),
    visits: 0,
    promises: 0,
    promisesKept: 0,
  };
  for (const stop of past) {
    const visit = version.problem.visits.find((one) => one.id === stop.stopId);
    const what = happened.stops.get(stop.stopId);
    const forecast = forecasts.get(stop.stopId);
    const clockSeconds = what && forecast && workSeconds(what, forecast);
    // A stop given up on the way, or before, was never reached: its time says nothing.
    const reached = what?.fact.arrivedSeconds != null;
    const promiseKept = visit?.promise
      ? reached && stop.arriveSeconds <= visit.promise.endSeconds
      : null;
    if (promiseKept !== null) totals.promises += 1;
    if (promiseKept) totals.promisesKept += 1;
    if (!visit || !what || clockSeconds == null || !forecast) continue;
    totals.visits += 1;
    totals.groomSeconds += clockSeconds;
    totals.scissorSeconds += scissorSeconds(what, forecast, clockSeconds);
    visits.push({
      visitId: visit.id,
      date,
      label: visit.label,
      vanName: van.name,
      groomerName,
      coatStyle: forecast.coatStyle,
      forecastSeconds: visit.work.meanSeconds,
      p10Seconds: forecast.p10Seconds,
      p90Seconds: forecast.p90Seconds,
      clockSeconds,
      promiseKept,
    });
  }
  return { date, vanId: van.id, vanName: van.name, shape: van.shape, totals, visits };
}

/** The tapped scissor steps; where none was tapped, the forecast's share of the clock. */
function scissorSeconds(what: StopHappened, forecast: VisitForecast, clockSeconds: number): number {
  const isScissor = new Set(
    forecast.steps.filter((step) => step.family === 'scissor').map((step) => step.key),
  );
  const steps = what.pets.flatMap((pet) => pet.steps);
  if (steps.length > 0)
    return steps
      .filter((step) => isScissor.has(step.stepKey))
      .reduce((sum, step) => sum + step.tookSeconds, 0);
  const all = forecast.steps.reduce((sum, step) => sum + step.medianSeconds, 0);
  const scissors = forecast.steps
    .filter((step) => step.family === 'scissor')
    .reduce((sum, step) => sum + step.medianSeconds, 0);
  return all === 0 ? 0 : Math.round((clockSeconds * scissors) / all);
}
