import { useEffect, useState } from 'react';
import { Link, useSearchParams } from 'react-router-dom';
import type { RunDetail } from '#shared/api/runs.ts';
import { formatWall } from '#shared/time/formatWall.ts';
import { Button } from '#src/components/Button.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { useTitle } from '#src/lib/useTitle.ts';
import { writeSpan } from '#src/lib/words.ts';
import { clockOffsetMs } from '#src/offline/clockOffset.ts';
import { useEventQueue } from '#src/offline/useEventQueue.ts';
import { useKeptRun } from '#src/offline/useKeptRun.ts';
import { ActionBar } from './ActionBar.tsx';
import { CannotDialog } from './CannotDialog.tsx';
import { petAtWork } from './nextAction.ts';
import { NoteForNextTime } from './NoteForNextTime.tsx';
import { PlaceSharingRow } from './PlaceSharingRow.tsx';
import { RestOfDay } from './RestOfDay.tsx';
import { runChange } from './runChange.ts';
import { RunTopBar } from './RunTopBar.tsx';
import { runView, type RunView } from './runView.ts';
import { StopPanel } from './StopPanel.tsx';
import { UnsentNotes } from './UnsentNotes.tsx';
import { useNow } from './useNow.ts';
import { usePositionFixes } from './usePositionFixes.ts';
import { useRunTaps } from './useRunTaps.ts';
import { WholeRun } from './WholeRun.tsx';
import { WorkPanel } from './WorkPanel.tsx';

/** The groomer's run on a phone. `aboveNav`: the shell has a bar at the foot of the screen. */
export function RunPage({ runId, aboveNav }: { runId: string; aboveNav: boolean }) {
  useTitle('Run');
  const { run, error, refetch } = useKeptRun(runId);
  if (run) return <LoadedRun key={runId} run={run} aboveNav={aboveNav} />;
  if (error)
    return <ErrorNote title="The run could not be loaded" error={error} onRetry={refetch} />;
  return <Loading words="Loading the run" lines={6} />;
}

function LoadedRun({ run, aboveNav }: { run: RunDetail; aboveNav: boolean }) {
  const { queue, queued, taken, waiting } = useEventQueue();
  const [search, setSearch] = useSearchParams();
  const whole = search.get('show') === 'all';
  const now = useNow(15_000);
  const mine = queued.filter((one) => one.runId === run.runId);
  const unsent = mine.filter(({ refusedWhy }) => refusedWhy === null);
  const events = [
    ...run.events,
    ...taken.filter((one) => one.runId === run.runId).map(({ event }) => event),
    ...unsent.map(({ event }) => event),
  ];
  // A tap just made may be newer than the last tick of the clock.
  const view = runView(run, events, Math.max(now, latestMs(events)));
  const { act, undo, last, resting } = useRunTaps(queue, run);
  const [asking, setAsking] = useState(false);
  const [notes, setNotes] = useState<Record<string, string>>({});
  const stop = view?.current ?? null;
  const place = usePositionFixes(run.runId, stop?.state === 'driving');
  const stopId = stop?.stopId ?? null;
  useEffect(() => {
    // In braces: newer browsers answer with a promise, which React would take for a clean-up.
    window.scrollTo(0, 0);
  }, [stopId, whole]);

  return (
    <div className="mx-auto max-w-[520px]">
      <RunTopBar {...{ run, view, whole, unsent, waiting }} nowMs={now - clockOffsetMs()} />
      <ChangedRun run={run} />
      <UnsentNotes
        refused={mine.filter(({ refusedWhy }) => refusedWhy !== null)}
        onDismiss={(id) => void queue?.dismiss(id)}
      />
      {!view ? (
        <NotSent run={run} />
      ) : whole ? (
        <WholeRun run={run} view={view} />
      ) : !stop ? (
        <RunOver view={view} unsent={unsent.length} />
      ) : (
        <>
          {stop.state === 'driving' && (
            <PlaceSharingRow sharing={place.sharing} onAllow={place.allow} />
          )}
          <AtStop view={view} />
          {stop.visit && (stop.state === 'arrived' || stop.state === 'working') && (
            <NoteForNextTime
              key={stop.stopId}
              value={notes[stop.stopId] ?? ''}
              onChange={(note) => setNotes({ ...notes, [stop.stopId]: note })}
            />
          )}
          <div className="mt-3">
            <RestOfDay view={view} />
          </div>
          {/* The bar lies over the page's foot. */}
          <div aria-hidden="true" className={aboveNav ? 'h-36' : 'h-24'} />
          <ActionBar
            {...{ stop, aboveNav, resting, last }}
            onAct={({ words, taps }) =>
              void act(
                words,
                taps.map((tap) =>
                  tap.kind === 'stopDone' ? { ...tap, note: notes[tap.stopId] ?? '' } : tap,
                ),
              )
            }
            onUndo={() => void undo()}
            onCannot={() => setAsking(true)}
          />
        </>
      )}
      {asking && stop && (
        <CannotDialog
          stop={stop}
          emergencyVets={run.emergencyVets}
          onClose={() => setAsking(false)}
          onConfirm={(reason, note) => {
            setAsking(false);
            setSearch({});
            void act("Can't do it", [{ kind: 'cannotDo', stopId: stop.stopId, reason, note }]);
          }}
        />
      )}
    </div>
  );
}

function AtStop({ view }: { view: RunView }) {
  const stop = view.current!;
  const work = petAtWork(stop);
  if (stop.state === 'working' && work && work.startedSeconds !== null)
    return <WorkPanel view={view} stop={stop} work={work} />;
  return <StopPanel view={view} stop={stop} />;
}

/** A later version is told, never silent. */
function ChangedRun({ run }: { run: RunDetail }) {
  const [seen, setSeen] = useState(run);
  const change = runChange(seen, run);
  if (change === null) return null;
  const at = run.sentAt && run.problem ? formatWallOf(run) : null;
  return (
    <div role="alert" className="mb-3 rounded-card bg-[var(--honey-soft)] px-4 py-3">
      <p>
        <b>◆ The desk changed your run{at && ` at ${at}`}</b>: {change}.
      </p>
      <Button className="mt-2 min-h-12" onClick={() => setSeen(run)}>
        I have seen it
      </Button>
    </div>
  );
}

function NotSent({ run }: { run: RunDetail }) {
  return (
    <>
      <h1 className="text-[26px] leading-[1.12] tracking-tight">
        {run.vanName}’s run is not sent yet
      </h1>
      <p className="mt-2 text-slate">It appears here by itself once the desk sends it.</p>
      <Link to="/run" className="text-link mt-4 inline-flex min-h-12 items-center">
        All runs of today
      </Link>
    </>
  );
}

function RunOver({ view, unsent }: { view: RunView; unsent: number }) {
  const visits = view.stops.filter(({ kind }) => kind === 'visit');
  const done = visits.filter(({ state }) => state === 'done').length;
  const failed = visits.filter(({ state }) => state === 'failed').length;
  return (
    <>
      <p className="text-[15px] text-slate">
        {view.times.homeDriveSeconds > 0 &&
          `${writeSpan(view.times.homeDriveSeconds)} drive home · `}
        finish about {formatWall(view.problem, view.times.finishSeconds)}
      </p>
      <h1 className="text-[26px] leading-[1.12] tracking-tight">
        All stops are over, {done} {done === 1 ? 'visit' : 'visits'} done
        {failed > 0 && `, ${failed} not done`}
      </h1>
      {unsent > 0 && (
        <p className="mt-2">
          {unsent} {unsent === 1 ? 'tap is' : 'taps are'} still to be sent: keep this page open
          until the network is back.
        </p>
      )}
    </>
  );
}

function formatWallOf(run: RunDetail): string {
  const seconds = (Date.parse(run.sentAt!) - Date.parse(run.problem!.dayStartUtc)) / 1000;
  return formatWall(run.problem!, seconds);
}

function latestMs(events: readonly { deviceAt: string; offsetMs: number }[]): number {
  return Math.max(
    Number.NEGATIVE_INFINITY,
    ...events.map(({ deviceAt, offsetMs }) => Date.parse(deviceAt) + offsetMs),
  );
}
