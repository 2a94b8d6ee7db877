import { Button } from '#src/components/Button.tsx';
import { buttonLook } from '#src/components/buttonLook.ts';
import { doneTap, mayFinish, nextAction, type NextAction } from './nextAction.ts';
import type { RunStop } from './runView.ts';
import type { LastTap } from './useRunTaps.ts';

/** At the foot of the phone, for one thumb: the next thing to do, and the two ways around it. */
export function ActionBar({
  stop,
  aboveNav,
  resting,
  last,
  onAct,
  onUndo,
  onCannot,
}: {
  stop: RunStop;
  aboveNav: boolean;
  resting: boolean;
  last: LastTap | null;
  onAct: (action: NextAction) => void;
  onUndo: () => void;
  onCannot: () => void;
}) {
  const action = nextAction(stop);
  const finish = mayFinish(stop);
  return (
    <div
      className={`fixed inset-x-0 z-20 border-t border-fawn bg-cream px-4 pt-3 ${
        aboveNav
          ? 'bottom-[calc(56px+env(safe-area-inset-bottom))] pb-3 md:bottom-0'
          : 'bottom-0 pb-[calc(12px+env(safe-area-inset-bottom))]'
      }`}
    >
      <div className="mx-auto grid max-w-[520px] gap-2.5">
        <UndoRow last={last} onUndo={onUndo} />
        {action && (
          <button
            type="button"
            className={buttonLook('go', 'big')}
            // Not `disabled`: the button keeps its focus while a second touch is waited out.
            aria-disabled={resting || undefined}
            onClick={resting ? undefined : () => onAct(action)}
          >
            {action.words}
          </button>
        )}
        <div className="grid grid-cols-2 gap-2.5">
          {finish ? (
            <button
              type="button"
              className={`${buttonLook()} min-h-12`}
              aria-disabled={resting || undefined}
              onClick={
                resting
                  ? undefined
                  : () => onAct({ words: 'Done here', taps: [doneTap(stop.stopId)] })
              }
            >
              Done here
            </button>
          ) : (
            <MapsLink stop={stop} />
          )}
          <Button className="min-h-12" onClick={onCannot}>
            Can't do it
          </Button>
        </div>
      </div>
    </div>
  );
}

/** A geo: address (RFC 5870) opens whatever map app the phone has. */
function MapsLink({ stop }: { stop: RunStop }) {
  const place = `${stop.lat},${stop.lon}`;
  const name = encodeURIComponent(stop.addressLabel || stop.title);
  return (
    <a
      className={`${buttonLook()} min-h-12 no-underline`}
      href={`geo:${place}?q=${place}(${name})`}
    >
      Open in maps
    </a>
  );
}

function UndoRow({ last, onUndo }: { last: LastTap | null; onUndo: () => void }) {
  return (
    <div role="status" className="min-w-0 empty:hidden">
      {last && (
        <div className="flex items-center justify-between gap-3 rounded-[10px] bg-ink pl-4 text-white">
          <span className="min-w-0 truncate">
            <span aria-hidden="true">✓ </span>
            {last.words.split(' · ')[0]}
          </span>
          <button
            type="button"
            className="min-h-12 px-4 font-semibold underline underline-offset-3"
            onClick={onUndo}
          >
            Undo
          </button>
        </div>
      )}
    </div>
  );
}
