import { z } from 'zod';
import { dayProblem, move, plan } from './dayProblem.ts';
import { endpoint } from './endpoint.ts';
import { vanShape } from './vans.ts';
import { id, localDate } from './values.ts';
import { visitCard } from './visits.ts';

export const logEntry = z.object({
  id,
  at: z.string(),
  who: z.string(),
  /** "Juniper to Plover, after Sorrel" */
  words: z.string(),
});

export const dayRun = z.object({
  runId: id,
  vanId: id,
  vanName: z.string(),
  shape: vanShape,
  groomerId: id,
  groomerName: z.string(),
  version: z.int(),
  sentVersion: z.int().nullable(),
  sentAt: z.string().nullable(),
  /** The draft differs from what the phone has. */
  changedSinceSent: z.boolean(),
});

/** Times are not in here: the board derives them from problem and plan. */
export const day = z.object({
  date: z.string(),
  problem: dayProblem,
  plan,
  runs: z.array(dayRun),
  visits: z.array(visitCard),
  undo: z.object({ changeId: id, words: z.string() }).nullable(),
  redo: z.object({ changeId: id, words: z.string() }).nullable(),
  openProposalId: id.nullable(),
  log: z.array(logEntry),
});
export type Day = z.infer<typeof day>;
export type DayRun = z.infer<typeof dayRun>;

const onDate = z.object({ date: localDate });
/** By van id: the versions of the runs a change touches, as the screen saw them. */
const runVersions = z.record(z.uuid(), z.int());

export const getDay = endpoint({
  method: 'GET',
  path: '/api/days/:date',
  summary: 'A day: facts, draft plan, visits, log',
  params: onDate,
  response: day,
});

export const moveVisit = endpoint({
  method: 'POST',
  path: '/api/days/:date/moves',
  summary: 'Make one move; 409 versionMoved when a touched run moved on, with the day as it is now',
  params: onDate,
  body: z.object({ move, runVersions }),
  response: day,
});
export const pinVisit = endpoint({
  method: 'PUT',
  path: '/api/days/:date/pins/:visitId',
  summary: 'Pin a visit to its van or free it',
  params: z.object({ date: localDate, visitId: id }),
  body: z.object({ vanId: id.nullable() }),
  response: day,
});
/** The change the screen offered; absent, whichever is last. A colleague's newer move is never taken back unseen. */
const offered = z.object({ changeId: id.optional() });

export const undoMove = endpoint({
  method: 'POST',
  path: '/api/days/:date/undo',
  summary:
    'Take back the last move, as an inverse move on the day as it is now; 409 versionMoved when another came after it',
  params: onDate,
  body: offered,
  response: day,
});
export const redoMove = endpoint({
  method: 'POST',
  path: '/api/days/:date/redo',
  summary:
    'Make the move again that was taken back last; 409 versionMoved when it is another by now',
  params: onDate,
  body: offered,
  response: day,
});
export const sendRuns = endpoint({
  method: 'POST',
  path: '/api/days/:date/send',
  summary: 'Fix a version of every run (or of some) for the phones',
  params: onDate,
  body: z.object({ vanIds: z.array(id).min(1).optional(), runVersions }),
  response: day,
});

export const proposal = z.object({
  id,
  date: z.string(),
  state: z.enum(['working', 'ready', 'failed', 'kept', 'dropped']),
  scope: z.enum(['day', 'notPlaced']),
  progressPermille: z.int(),
  /** Best so far while working, the offer when ready. */
  plan: plan.nullable(),
  message: z.string().nullable(),
});
export type Proposal = z.infer<typeof proposal>;

export const startProposal = endpoint({
  method: 'POST',
  path: '/api/days/:date/proposals',
  summary: 'Ask the optimiser for a better day; nothing changes until a person keeps it',
  params: onDate,
  body: z.object({
    scope: z.enum(['day', 'notPlaced']).default('day'),
    seconds: z.int().min(1).max(60).default(5),
  }),
  response: proposal,
});
const oneProposal = z.object({ proposalId: id });
export const getProposal = endpoint({
  method: 'GET',
  path: '/api/proposals/:proposalId',
  summary: 'How far a proposal is, and what it offers',
  params: oneProposal,
  response: proposal,
});
export const keepProposal = endpoint({
  method: 'POST',
  path: '/api/proposals/:proposalId/keep',
  summary: 'Make the proposed day the draft; 409 versionMoved when the day moved on meanwhile',
  params: oneProposal,
  response: day,
});
/** While it is working this cancels the search. */
export const dropProposal = endpoint({
  method: 'POST',
  path: '/api/proposals/:proposalId/drop',
  summary: 'Drop a proposal',
  params: oneProposal,
  response: proposal,
});
