import type { z } from 'zod';
import type { day, proposal } from '#shared/api/days.ts';
import type { DayProblem, Plan } from '#shared/schedule/types.ts';
import type { DayChange } from '#server/models/DayChange.ts';
import type { Proposal } from '#server/models/Proposal.ts';
import type { Groomer } from '#server/models/Groomer.ts';
import type { Run } from '#server/models/Run.ts';
import type { Van } from '#server/models/Van.ts';
import { presentVisit } from './visit.ts';

interface DayFacts {
  date: string;
  problem: DayProblem;
  plan: Plan;
  runs: { run: Run; van: Van; groomer: Groomer; changedSinceSent: boolean }[];
  visits: Parameters<typeof presentVisit>[0][];
  undo: DayChange | null;
  redo: DayChange | null;
  log: DayChange[];
  openProposal: Proposal | null;
}

export function presentDay(facts: DayFacts): z.input<typeof day> {
  return {
    date: facts.date,
    problem: facts.problem,
    plan: facts.plan,
    runs: facts.runs.map(({ run, van, groomer, changedSinceSent }) => ({
      runId: run.id,
      vanId: van.id,
      vanName: van.name,
      shape: van.shape,
      groomerId: groomer.id,
      groomerName: groomer.name,
      version: run.version,
      sentVersion: run.sentVersion ?? null,
      sentAt: run.sentAt?.toISOString() ?? null,
      changedSinceSent,
    })),
    visits: facts.visits.map(presentVisit),
    undo: facts.undo && { changeId: facts.undo.id, words: facts.undo.words },
    redo: facts.redo && { changeId: facts.redo.id, words: facts.redo.words },
    openProposalId: facts.openProposal?.id ?? null,
    log: facts.log.map(({ id, at, who, words }) => ({ id, at: at.toISOString(), who, words })),
  };
}

export function presentProposal(facts: {
  proposal: Proposal;
  date: string;
}): z.input<typeof proposal> {
  const { proposal: row, date } = facts;
  return {
    id: row.id,
    date,
    state: row.state,
    scope: row.scope,
    progressPermille: row.progressPermille,
    plan: row.plan ?? null,
    message: row.message ?? null,
  };
}
