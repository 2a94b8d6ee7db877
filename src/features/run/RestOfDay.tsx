import { writeSpan } from '#src/lib/words.ts';
import { formatWall, formatWallRange } from '#shared/time/formatWall.ts';
import { StandingWords } from './StandingWords.tsx';
import { stopStanding } from './stopStanding.ts';
import type { RunStop, RunView } from './runView.ts';

/** The stops after this one as they look now, re-forecast from what happened. */
export function RestOfDay({ view }: { view: RunView }) {
  if (view.later.length === 0 && !view.current) return null;
  return (
    <section aria-label="After this" className="card px-4 py-2">
      <h2 className="py-1.5 text-[15px] font-semibold">After this</h2>
      <ul className="rows">
        {view.later.map((stop) => (
          <LaterStop key={stop.stopId} view={view} stop={stop} />
        ))}
        <li className="flex gap-3 py-2.5">
          <b className="w-12 shrink-0">{formatWall(view.problem, view.times.finishSeconds)}</b>
          <span>
            Finish
            {view.times.overtimeSeconds > 0 && (
              <span className="text-slate">
                {' '}
                · {writeSpan(view.times.overtimeSeconds)} past the shift
              </span>
            )}
          </span>
        </li>
      </ul>
    </section>
  );
}

function LaterStop({ view, stop }: { view: RunView; stop: RunStop }) {
  const standing = stopStanding(stop);
  return (
    <li className="flex gap-3 py-2.5 leading-snug">
      <b className="w-12 shrink-0">{formatWall(view.problem, stop.times.arriveSeconds)}</b>
      <span className="min-w-0">
        <span className="block">{stop.title}</span>
        {stop.promise && (
          <span className="block text-[15px]">
            <span className="text-slate">
              promised{' '}
              {formatWallRange(
                view.problem,
                stop.promise.startSeconds,
                stop.promise.endSeconds,
              )}{' '}
            </span>
            <StandingWords standing={standing} />
          </span>
        )}
      </span>
    </li>
  );
}
