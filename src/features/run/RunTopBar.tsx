import { Link } from 'react-router-dom';
import type { RunDetail } from '#shared/api/runs.ts';
import type { QueuedEvent } from '#src/offline/PhoneStore.ts';
import { Chip } from '#src/components/Chip.tsx';
import { ShapeMark } from '#src/components/ShapeMark.tsx';
import { useOnline } from '#src/lib/useOnline.ts';
import type { RunView } from './runView.ts';

/** Which van, which stop, and whether the desk knows what the phone knows. */
export function RunTopBar({
  run,
  view,
  whole,
  unsent,
  waiting,
  nowMs,
}: {
  run: RunDetail;
  view: RunView | null;
  whole: boolean;
  unsent: readonly QueuedEvent[];
  waiting: boolean;
  /** By this phone's clock. */
  nowMs: number;
}) {
  const online = useOnline() && !waiting;
  const current = view?.current;
  // A tap still in its hold is not late; only what should have gone is worth a line.
  const late =
    waiting || !online || unsent.some(({ holdUntilMs }) => holdUntilMs + slackMs < nowMs);
  return (
    <div className="-mx-4 -mt-4 mb-3 border-b border-fawn px-4 md:mx-0 md:mt-0 md:px-0">
      <div className="flex min-h-14 items-center justify-between gap-3">
        <span className="flex items-center gap-2 font-semibold">
          <ShapeMark shape={run.shape} />
          {run.vanName}
          {view && (
            <span className="font-normal">
              · {current ? `stop ${current.number} of ${view.stops.length}` : 'run over'}
            </span>
          )}
        </span>
        {view && (
          <Link
            to={whole ? '?' : '?show=all'}
            className="text-link inline-flex min-h-12 items-center"
          >
            {!whole ? 'Whole run' : current ? 'Back to the stop' : 'Back'}
          </Link>
        )}
      </div>
      {(!online || (late && unsent.length > 0)) && (
        <p role="status" className="pb-2.5">
          <Chip tone={online ? 'plain' : 'heed'}>
            {[!online && 'offline', unsent.length > 0 && `${unsent.length} to send`]
              .filter(Boolean)
              .join(' · ')}
          </Chip>
        </p>
      )}
    </div>
  );
}

const slackMs = 3_000;
