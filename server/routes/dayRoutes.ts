import { Router } from 'express';
import * as api from '#shared/api/days.ts';
import { AppError } from '#server/errors.ts';
import { handle } from '#server/http/handle.ts';
import { presentDay, presentProposal } from '#server/presenters/day.ts';
import { getDaySurroundings } from '#server/services/days/getDaySurroundings.ts';
import { type LoadedDay, loadDay } from '#server/services/days/loadDay.ts';
import { type Conflict, moveVisit } from '#server/services/days/moveVisit.ts';
import { pinVisit } from '#server/services/days/pinVisit.ts';
import { needsSending } from '#server/services/days/needsSending.ts';
import { sendRuns } from '#server/services/days/sendRuns.ts';
import { redoMove, undoMove } from '#server/services/days/undoMove.ts';
import {
  dropProposal,
  getProposal,
  keepProposal,
} from '#server/services/proposals/keepProposal.ts';
import { startProposal } from '#server/services/proposals/startProposal.ts';

export const dayRoutes = Router();

handle(dayRoutes, api.getDay, 'days.read', async ({ actor, params, now }) =>
  show(await loadDay(actor.businessId, params.date, now)),
);
handle(dayRoutes, api.moveVisit, 'visits.move', async ({ actor, params, body, now }) =>
  showOrConflict(await moveVisit(actor, params.date, body.move, body.runVersions, now)),
);
handle(dayRoutes, api.pinVisit, 'visits.move', async ({ actor, params, body, now }) =>
  show(await pinVisit(actor, params.date, params.visitId, body.vanId, now)),
);
handle(dayRoutes, api.undoMove, 'visits.move', async ({ actor, params, body, now }) =>
  showOrConflict(await undoMove(actor, params.date, body.changeId, now)),
);
handle(dayRoutes, api.redoMove, 'visits.move', async ({ actor, params, body, now }) =>
  showOrConflict(await redoMove(actor, params.date, body.changeId, now)),
);
handle(dayRoutes, api.sendRuns, 'days.send', async ({ actor, params, body, now }) =>
  showOrConflict(await sendRuns(actor, params.date, body.vanIds, body.runVersions, now)),
);

handle(dayRoutes, api.startProposal, 'visits.move', async ({ actor, params, body, now }) =>
  presentProposal(await startProposal(actor, params.date, body, now)),
);
handle(dayRoutes, api.getProposal, 'days.read', async ({ params, now }) =>
  presentProposal(await getProposal(params.proposalId, now)),
);
handle(dayRoutes, api.keepProposal, 'visits.move', async ({ actor, params, now }) =>
  showOrConflict(await keepProposal(actor, params.proposalId, now)),
);
handle(dayRoutes, api.dropProposal, 'visits.move', async ({ params }) =>
  presentProposal(await dropProposal(params.proposalId)),
);

async function show(loaded: LoadedDay) {
  return presentDay({
    ...loaded,
    runs: loaded.runs.map((one) => ({
      ...one,
      changedSinceSent: one.run.sentVersion != null && needsSending(loaded, one),
    })),
    ...(await getDaySurroundings(loaded)),
  });
}

/** A change that came too late: 409 with the day as it is now, so that the screen can show both. */
async function showOrConflict(result: LoadedDay | Conflict) {
  if (!('conflict' in result)) return show(result);
  throw new AppError(
    'versionMoved',
    'Someone else changed this run meanwhile. Here is the day as it is now.',
    {
      extra: { day: api.day.parse(await show(result.day)) },
    },
  );
}
