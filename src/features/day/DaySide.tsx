import { useMemo } from 'react';
import type { Day } from '#shared/api/days.ts';
import type { DayTimes, Plan } from '#shared/schedule/types.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { toast } from '#src/components/toast.ts';
import { errorWords } from '#src/lib/errorWords.ts';
import { DayLog } from './DayLog.tsx';
import { KnockOnCard } from './KnockOnCard.tsx';
import { knockOnRows } from './knockOnRows.ts';
import { moveWords } from './moveWords.ts';
import { NotPlacedCard } from './NotPlacedCard.tsx';
import { ProposalCard, type ProposalView } from './ProposalCard.tsx';
import { movedVisits, placedAndTakenOff, proposalRows } from './proposalRows.ts';
import type { useBoardMoves } from './useBoardMoves.ts';
import type { DayChange } from './useDayChange.ts';
import { useNotPlacedReasons } from './useNotPlacedReasons.ts';
import type { OpenProposal } from './useProposal.ts';

/** Beside the map: what is being weighed, what is not placed, what changed. */
export function DaySide({
  day,
  base,
  shownPlan,
  change,
  proposal,
  view,
  past,
  canMove,
  dropping,
  moves,
  onView,
  onOpenVisit,
  onFindPlaces,
}: {
  day: Day;
  base: DayTimes;
  shownPlan: Plan;
  change: DayChange;
  proposal: OpenProposal;
  view: ProposalView;
  past: boolean;
  canMove: boolean;
  dropping: boolean;
  moves: ReturnType<typeof useBoardMoves>;
  onView: (view: ProposalView) => void;
  onOpenVisit: (visitId: string) => void;
  onFindPlaces: () => void;
}) {
  const { business } = useSession();
  const { problem, plan } = day;
  const { pending, trial } = change;
  const cards = useMemo(() => new Map(day.visits.map((card) => [card.id, card])), [day.visits]);
  const reasons = useNotPlacedReasons(problem, shownPlan);
  const offered = proposal.offered;
  return (
    <div className="grid gap-4">
      {pending && trial && (
        <KnockOnCard
          title={moveWords(problem, plan, pending.move)}
          rows={knockOnRows(problem, trial.times, trial.knockOn, pending.move, business.weightUnit)}
          refusedBecause={trial.refusedBecause}
          unchanged={!trial.moved}
          notice={change.notice}
          keeping={change.keeping}
          carried={pending.carried}
          onKeep={() => void moves.keep()}
          onPutBack={moves.putBack}
        />
      )}
      {proposal.proposal && !pending && (
        <ProposalCard
          proposal={proposal.proposal}
          rows={
            offered
              ? proposalRows(problem, { plan, times: base }, offered, business.distanceUnit)
              : []
          }
          movedCount={offered ? movedVisits(plan, offered.plan).size : 0}
          {...(offered ? placedAndTakenOff(problem, plan, offered.plan) : noChange)}
          view={view}
          notice={proposal.notice}
          busy={proposal.busy}
          canKeep={canMove && offered !== null}
          onView={onView}
          onKeep={() =>
            void proposal.keep().then((kept) => {
              if (kept) toast('Kept the proposed day.');
            })
          }
          onDrop={() =>
            void proposal.drop().catch((error: unknown) => toast(errorWords(error), 'bad'))
          }
        />
      )}
      <NotPlacedCard
        problem={problem}
        visitIds={shownPlan.notPlaced}
        cards={cards}
        reasons={reasons}
        unit={business.weightUnit}
        past={past}
        canMove={canMove}
        dropping={dropping}
        onOpen={onOpenVisit}
        onTry={(visitId, vanId, index) =>
          moves.draw(visitId, { kind: 'placeVisit', visitId, vanId, index })
        }
        onPointerDown={moves.startDrag}
        onFindPlaces={canMove && !proposal.proposal ? onFindPlaces : null}
      />
      <DayLog day={day} />
    </div>
  );
}

const noChange = { takenOff: [], placed: [] };
