import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import type { Day, Proposal } from '#shared/api/days.ts';
import { applyMove } from '#shared/schedule/applyMove.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import type { DayProblem, DayTimes, Plan } from '#shared/schedule/types.ts';
import { dayQueries, useDropProposal, useKeepProposal, useStartProposal } from '#src/api/days.ts';
import { ApiError } from '#src/api/ApiError.ts';
import { dayInAnswer } from './useDayChange.ts';

export interface OpenProposal {
  /** null while none is open. */
  proposal: Proposal | null;
  /** The offer (or the best so far) as it would be on the day now. */
  offered: { plan: Plan; times: DayTimes } | null;
  /** Why the offer cannot be drawn or kept. */
  notice: string | null;
  busy: boolean;
  start: (scope: Proposal['scope']) => Promise<void>;
  keep: () => Promise<boolean>;
  drop: () => Promise<void>;
}

/** The day's proposal: asked for here, or found open on the day after a reload. */
export function useProposal(day: Day, onDay: (day: Day) => void): OpenProposal {
  // What was closed here stays closed until the next day answer says so too.
  const [closedId, setClosedId] = useState<string | null>(null);
  const [startedId, setStartedId] = useState<string | null>(null);
  const [notice, setNotice] = useState<string | null>(null);
  const known = startedId ?? day.openProposalId;
  const id = known === closedId ? null : known;
  const query = useQuery({ ...dayQueries.proposal(id ?? ''), enabled: id !== null });
  const starting = useStartProposal();
  const keeping = useKeepProposal();
  const dropping = useDropProposal();
  const proposal =
    id !== null ? (query.data ?? (starting.data?.id === id ? starting.data : null)) : null;
  const open = proposal && proposal.state !== 'kept' && proposal.state !== 'dropped';
  const plan = open ? proposal.plan : null;
  const offered = useMemo(() => plan && offeredDay(day.problem, day.plan, plan), [day, plan]);
  const close = () => {
    setClosedId(id);
    setStartedId(null);
    setNotice(null);
  };
  return {
    proposal: open ? proposal : null,
    offered,
    notice:
      notice ??
      (query.error ? query.error.message : null) ??
      (plan && !offered ? 'The day has changed too much since. Drop this and ask again.' : null),
    busy: starting.isPending || keeping.isPending || dropping.isPending,
    start: async (scope) => {
      setNotice(null);
      const started = await starting.mutateAsync({
        params: { date: day.date },
        body: { scope, seconds: 5 },
      });
      setClosedId(null);
      setStartedId(started.id);
    },
    keep: async () => {
      if (!open) return false;
      try {
        onDay(await keeping.mutateAsync({ params: { proposalId: proposal.id } }));
        close();
        return true;
      } catch (error) {
        const now = error instanceof ApiError ? dayInAnswer(error.body) : null;
        if (now) onDay(now);
        setNotice(
          error instanceof ApiError && error.code === 'versionMoved'
            ? 'The day moved on while this was open, so it cannot be kept. The strips show the day as it is now. Drop this and ask again.'
            : error instanceof Error
              ? error.message
              : 'It could not be kept.',
        );
        return false;
      }
    },
    drop: async () => {
      if (!open) return;
      await dropping.mutateAsync({ params: { proposalId: proposal.id } });
      close();
    },
  };
}

function offeredDay(problem: DayProblem, now: Plan, offer: Plan) {
  try {
    const result = applyMove(problem, now, { kind: 'replacePlan', plan: offer });
    if (result.refusedBecause !== undefined) return null;
    return { plan: result.plan, times: evaluateDay(problem, result.plan) };
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
