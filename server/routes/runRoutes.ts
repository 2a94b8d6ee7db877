import { Router } from 'express';
import * as api from '#shared/api/runs.ts';
import { ownOrigin } from '#server/http/csrf.ts';
import { handle } from '#server/http/handle.ts';
import { presentRun, presentRunList } from '#server/presenters/run.ts';
import { addRunEvents, type PhoneEvent } from '#server/services/runs/addRunEvents.ts';
import { addRunFix } from '#server/services/runs/addRunFix.ts';
import { getRun } from '#server/services/runs/getRun.ts';
import { listRuns } from '#server/services/runs/listRuns.ts';
import { needRun } from '#server/services/runs/needRun.ts';

export const runRoutes = Router();

handle(runRoutes, api.listRuns, 'runs.work', async ({ actor, query, now }) =>
  presentRunList(await listRuns(actor, query.date, now)),
);
handle(runRoutes, api.getRun, 'runs.work', async ({ actor, params, now }) =>
  presentRun(await getRun(await needRun(actor, params.runId), now)),
);
handle(runRoutes, api.addRunEvents, 'runs.work', async ({ actor, params, body, req, now }) => {
  const run = await addRunEvents(
    actor,
    params.runId,
    body.events as PhoneEvent[],
    ownOrigin(req),
    now,
  );
  return presentRun(await getRun(run, now));
});
handle(runRoutes, api.addRunFix, 'runs.work', async ({ actor, params, body, now }) => {
  await addRunFix(actor, params.runId, body, now);
  return { done: true as const };
});
