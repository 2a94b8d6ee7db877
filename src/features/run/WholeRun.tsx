import { lazy, Suspense, useState } from 'react';
import { Link } from 'react-router-dom';
import { formatWall, formatWallRange } from '#shared/time/formatWall.ts';
import type { RunDetail } from '#shared/api/runs.ts';
import { Loading } from '#src/components/Loading.tsx';
import { Tabs } from '#src/components/Tabs.tsx';
import { writeDistance } from '#src/lib/measures.ts';
import { writeDate, writeSpan } from '#src/lib/words.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { cannotWords } from './cannotReasons.ts';
import { EmergencyVets } from './EmergencyVets.tsx';
import { StandingWords } from './StandingWords.tsx';
import { stopStanding } from './stopStanding.ts';
import type { RunStop, RunView } from './runView.ts';

// The map is large; most looks at a run never open it.
const RunMap = lazy(async () => ({ default: (await import('./RunMap.tsx')).RunMap }));

/** All stops of the run in order, or on the map; emergency vets below. */
export function WholeRun({ run, view }: { run: RunDetail; view: RunView }) {
  const [tab, setTab] = useState<'list' | 'map'>('list');
  const unit = useSession().business.distanceUnit;
  return (
    <>
      <h1 className="text-[26px] leading-[1.12] tracking-tight">{writeDate(run.date)}</h1>
      <p className="mt-1 mb-3 text-slate">
        {writeSpan(view.times.workSeconds)} grooming · {writeSpan(view.times.driveSeconds)} driving
        · {writeDistance(view.times.driveMetres, unit)} · finish{' '}
        {formatWall(view.problem, view.times.finishSeconds)}
      </p>
      <Tabs
        label="Whole run"
        tabs={[
          { key: 'list', words: 'Stops' },
          { key: 'map', words: 'Map' },
        ]}
        current={tab}
        onChange={setTab}
      >
        {tab === 'list' ? (
          <ol className="rows">
            {view.stops.map((stop) => (
              <StopRow key={stop.stopId} view={view} stop={stop} />
            ))}
          </ol>
        ) : (
          <Suspense fallback={<Loading words="Loading the map" />}>
            <RunMap run={run} view={view} />
          </Suspense>
        )}
      </Tabs>
      {run.emergencyVets.length > 0 && (
        <section className="card mt-4 px-4 py-3">
          <h2 className="font-semibold">Emergency vets</h2>
          <EmergencyVets vets={run.emergencyVets} />
        </section>
      )}
      <p className="mt-3">
        <Link to="/run?all=1" className="text-link inline-flex min-h-12 items-center">
          All runs of today
        </Link>
      </p>
    </>
  );
}

function StopRow({ view, stop }: { view: RunView; stop: RunStop }) {
  const over = stop.state === 'done' || stop.state === 'failed';
  const failed = stop.happened?.fact.failedReason;
  const current = view.current === stop;
  // Slate on the highlight would be 4.3 : 1, too pale in the sun.
  const dim = current ? '' : 'text-slate';
  return (
    <li
      aria-current={current ? 'step' : undefined}
      className={`flex gap-3 py-3 leading-snug ${current ? '-mx-4 bg-collar-soft px-4' : ''}`}
    >
      <span className="w-12 shrink-0 font-bold">
        {formatWall(view.problem, stop.times.arriveSeconds)}
      </span>
      <span className="min-w-0 flex-1">
        <span className={over ? 'text-slate' : 'font-semibold'}>{stop.title}</span>
        {stop.addressLabel && (
          <span className={`block text-[15px] ${dim}`}>{stop.addressLabel}</span>
        )}
        {stop.promise && (
          <span className="block text-[15px]">
            <span className={dim}>
              promised{' '}
              {formatWallRange(
                view.problem,
                stop.promise.startSeconds,
                stop.promise.endSeconds,
              )}{' '}
            </span>
            <StandingWords standing={stopStanding(stop)} />
          </span>
        )}
        {failed && (
          <span className="block text-[15px] font-semibold text-rosette">
            ▲ not done: {cannotWords(failed)}
          </span>
        )}
      </span>
      <span className={`shrink-0 text-[15px] ${dim}`}>
        {stop.state === 'done'
          ? `✓ ${formatWall(view.problem, stop.times.endSeconds)}`
          : stop.state === 'failed'
            ? ''
            : writeSpan(stop.times.endSeconds - stop.times.startSeconds)}
      </span>
    </li>
  );
}
