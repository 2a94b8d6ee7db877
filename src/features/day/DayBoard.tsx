import { lazy, Suspense, useCallback, useMemo, useState, type ReactNode } from 'react';
import type { Day } from '#shared/api/days.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { useCan, useSession } from '#src/api/sessionStore.ts';
import { Button } from '#src/components/Button.tsx';
import { CatchBoundary } from '#src/components/CatchBoundary.tsx';
import { Tabs } from '#src/components/Tabs.tsx';
import { writeDistance } from '#src/lib/measures.ts';
import { writeCount } from '#src/lib/words.ts';
import { DayActions } from './DayActions.tsx';
import { DayDialogs, type OpenDialog } from './DayDialogs.tsx';
import { DaySide } from './DaySide.tsx';
import { DaySummary } from './DaySummary.tsx';
import { DragGhost } from './DragGhost.tsx';
import { EmptyDay } from './EmptyDay.tsx';
import { moveWords, targetWords } from './moveWords.ts';
import type { ProposalView } from './ProposalCard.tsx';
import { StripsCard } from './StripsCard.tsx';
import { summaryWords } from './summaryWords.ts';
import { unsentWords } from './unsentWords.ts';
import { useBoardActions } from './useBoardActions.ts';
import { useBoardMoves } from './useBoardMoves.ts';
import { useDayChange, type DayChange } from './useDayChange.ts';
import { useNarrow } from './useNarrow.ts';
import { useNowSeconds } from './useNowSeconds.ts';
import { useProposal } from './useProposal.ts';
import { useShownDay } from './useShownDay.ts';

/** The map brings Leaflet: the strips do not wait for it. */
const DayMap = lazy(() => import('./DayMap.tsx').then((file) => ({ default: file.DayMap })));

/** One day of all vans: strips over map, the change being weighed, what is not placed. */
export function DayBoard({
  day,
  past,
  nav,
  onDay,
  readAgain,
  whenEmpty = (plain) => plain,
}: {
  day: Day;
  past: boolean;
  nav: ReactNode;
  onDay: (day: Day) => void;
  readAgain: () => Promise<unknown>;
  /** What stands where the strips would, on a day without vans. */
  whenEmpty?: (plain: ReactNode) => ReactNode;
}) {
  const { business } = useSession();
  const can = {
    move: useCan('visits.move') && !past,
    edit: useCan('visits.edit') && !past,
    send: useCan('days.send') && !past,
    setUp: useCan('shifts.edit'),
  };
  const narrow = useNarrow();
  const { problem, plan } = day;
  const base = useMemo(() => evaluateDay(problem, plan), [problem, plan]);
  const nowSeconds = useNowSeconds(problem.dayStartUtc, problem.dayLengthSeconds);
  const [dialog, setDialog] = useState<OpenDialog>(null);
  const [view, setView] = useState<ProposalView>('proposed');
  const [highlighted, setHighlighted] = useState<string | null>(null);
  const [tab, setTab] = useState<'strips' | 'map'>('strips');
  const [vanShown, setVanShown] = useState<string | null>(null);

  const change = useDayChange(day, base, onDay, readAgain);
  const { pending, trial, propose } = change;
  const proposal = useProposal(day, onDay);
  const offered = view === 'proposed' ? proposal.offered : null;
  const shown = useShownDay(day, base, pending, trial, offered);
  const openVisit = useCallback((visitId: string) => setDialog({ kind: 'visit', visitId }), []);
  const moves = useBoardMoves(day, base, change, {
    past,
    mayMove: can.move,
    onOpenVisit: openVisit,
  });
  const { dragging, ghost } = moves.drag;
  const actions = useBoardActions(day, can.move, proposal, onDay, () => {
    propose(null);
    setView('proposed');
  });
  const distanceWords = useCallback(
    (metres: number) => writeDistance(metres, business.distanceUnit),
    [business.distanceUnit],
  );
  const empty = problem.vans.length === 0;
  const working = proposal.proposal?.state === 'working';
  const title = pending
    ? `Drawn, not kept: ${moveWords(problem, plan, pending.move)}`
    : offered && shown.times !== base
      ? `${working ? 'Best so far' : 'The proposal'}, not kept`
      : null;

  const stripsCard = (
    <StripsCard
      ref={moves.strips}
      narrow={narrow}
      vanId={pending?.move.kind === 'placeVisit' ? pending.move.vanId : vanShown}
      onVan={setVanShown}
      title={title}
      actions={pending && <PendingButtons change={change} moves={moves} />}
      day={problem}
      strips={shown.strips}
      range={shown.range}
      marks={shown.marks}
      distanceWords={distanceWords}
      nowSeconds={nowSeconds}
      highlightedStopId={highlighted}
      movedVisitIds={shown.moved}
      carriedVisitId={pending?.carried ? pending.visitId : null}
      shifts={shown.shifts}
      ghost={shown.ghost}
      drop={
        dragging?.target && dragging.target !== 'notPlaced'
          ? { visitId: dragging.visitId, target: dragging.target }
          : null
      }
      onHighlight={setHighlighted}
      onOpenVisit={moves.openVisit}
      onPointerDownVisit={moves.startDrag}
      onKeyDownVisit={moves.onKeyDown}
    />
  );
  const map = (
    <CatchBoundary instead={<MapMissing />}>
      <Suspense fallback={<div className="card h-full animate-pulse bg-linen" />}>
        <DayMap
          day={day}
          times={shown.times}
          shapes={shown.marks}
          nowSeconds={nowSeconds}
          highlightedStopId={highlighted}
          onHighlight={setHighlighted}
          onOpenVisit={openVisit}
        />
      </Suspense>
    </CatchBoundary>
  );

  return (
    <>
      <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2">
        {nav}
        <DayActions
          undo={day.undo}
          redo={day.redo}
          busy={actions.busy || change.keeping || proposal.busy}
          canMove={can.move && !empty}
          canSend={can.send && !empty}
          canBook={can.edit}
          looking={proposal.proposal !== null}
          onUndo={actions.onUndo}
          onRedo={actions.onRedo}
          onFind={() => void actions.find('day')}
          onSend={() => setDialog({ kind: 'send' })}
          onAdd={() => setDialog({ kind: 'add' })}
        />
      </div>
      <DaySummary
        words={summaryWords(shown.plan, shown.times, business.distanceUnit, past)}
        dim={past ? 'this day is over' : unsentWords(day, shown.times, nowSeconds)}
      />
      {empty &&
        whenEmpty(<EmptyDay past={past} notPlaced={plan.notPlaced.length} canSetUp={can.setUp} />)}
      {!empty && narrow && (
        <Tabs label="Day" tabs={phoneTabs} current={tab} onChange={setTab}>
          <div className="mt-3">
            {tab === 'strips' ? stripsCard : <div className="h-[62vh]">{map}</div>}
          </div>
        </Tabs>
      )}
      {!empty && !narrow && stripsCard}
      <div className="mt-4 grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_420px]">
        {!empty && !narrow && <div className="h-[460px] lg:sticky lg:top-4">{map}</div>}
        <DaySide
          day={day}
          base={base}
          shownPlan={shown.plan}
          change={change}
          proposal={proposal}
          view={view}
          past={past}
          canMove={can.move && !empty}
          dropping={dragging?.target === 'notPlaced'}
          moves={moves}
          onView={setView}
          onOpenVisit={moves.openVisit}
          onFindPlaces={() => void actions.find('notPlaced')}
        />
      </div>
      {dragging && (
        <DragGhost problem={problem} plan={plan} times={base} dragging={dragging} ghost={ghost} />
      )}
      <p className="sr-only" role="status" aria-live="polite">
        {pending?.carried && trial
          ? `${targetWords(problem, plan, pending.move)}. ${writeCount(trial.times.promisesAtRisk, 'promise')} at risk.`
          : moves.said}
      </p>
      <DayDialogs
        day={day}
        dialog={dialog}
        base={base}
        shown={shown.times}
        can={can}
        stays={moves.stays}
        onDialog={setDialog}
        onDay={onDay}
        onDrawMove={moves.draw}
        readAgain={readAgain}
      />
    </>
  );
}

function MapMissing() {
  return (
    <div className="card grid h-full min-h-40 place-items-center p-6 text-center text-slate">
      The map could not be loaded. The strips work without it; reload the page to try again.
    </div>
  );
}

/** Keep or put back right above the strips, where the eyes are. */
function PendingButtons({
  change,
  moves,
}: {
  change: DayChange;
  moves: ReturnType<typeof useBoardMoves>;
}) {
  const keepable = change.trial?.moved && !change.trial.refusedBecause;
  return (
    <div ref={moves.keepBox} className="flex gap-2">
      {keepable && (
        <Button kind="go" size="small" busy={change.keeping} onClick={() => void moves.keep()}>
          Keep the move
        </Button>
      )}
      <Button size="small" disabled={change.keeping} onClick={moves.putBack}>
        Put it back
      </Button>
    </div>
  );
}

const phoneTabs = [
  { key: 'strips', words: 'Strips' },
  { key: 'map', words: 'Map' },
] as const;
