import { formatWall, formatWallRange, type DayClock } from '#shared/time/formatWall.ts';
import { writeSpan } from '#src/lib/words.ts';
import { percentWords, stopWords } from './stopWords.ts';
import type { StripStop, Tower } from './types.ts';

export interface TipPlace {
  stop: StripStop;
  /** The step pointed at; null: the whole stop. */
  tower: Tower | null;
  /** The middle of the thing's top and bottom edge, pixels of the window. */
  x: number;
  top: number;
  bottom: number;
}

/** What a pointer or the focus rests on, in words: the step with its reasons, or the stop. */
export function StripTip({ day, tip }: { day: DayClock; tip: TipPlace | null }) {
  if (!tip) return null;
  const above = tip.top > 230;
  const x = Math.min(Math.max(tip.x, 150), window.innerWidth - 150);
  return (
    <div
      role="tooltip"
      className="card pointer-events-none fixed z-40 w-[280px] p-3 text-[13px] leading-snug"
      style={{
        left: x,
        top: above ? tip.top - 8 : tip.bottom + 8,
        transform: `translate(-50%, ${above ? '-100%' : '0'})`,
      }}
    >
      {tip.tower ? (
        <TowerWords stop={tip.stop} tower={tip.tower} />
      ) : (
        <StopTip day={day} stop={tip.stop} />
      )}
    </div>
  );
}

function TowerWords({ stop, tower }: { stop: StripStop; tower: Tower }) {
  return (
    <>
      <p className="font-semibold">
        {tower.petName || stop.label}{' '}
        <span className="float-right">{writeSpan(tower.toSeconds - tower.fromSeconds)}</span>
      </p>
      {tower.steps.map((step, index) => (
        <div key={index} className="mt-1">
          <p className="flex justify-between gap-3">
            <span className="first-letter:uppercase">{step.label}</span>
            {tower.steps.length > 1 && (
              <span className="shrink-0 text-slate">{writeSpan(step.seconds)}</span>
            )}
          </p>
          {step.reasons.filter(isWeighty).map((reason) => (
            <p key={reason.text} className="flex justify-between gap-3 text-slate">
              <span>{reason.text}</span>
              <span className="shrink-0">{signedMinutes(reason.deltaSeconds)}</span>
            </p>
          ))}
        </div>
      ))}
    </>
  );
}

function StopTip({ day, stop }: { day: DayClock; stop: StripStop }) {
  const words = stopWords(day, stop);
  return (
    <>
      <p className="font-semibold">
        {stop.label}{' '}
        <span className="float-right">
          {formatWallRange(day, stop.fromSeconds, stop.toSeconds)}
        </span>
      </p>
      {stop.words && <p className="text-slate">{stop.words}</p>}
      {words !== stop.words && words !== '' && (
        <p className={stop.atRisk ? 'font-semibold text-rosette' : 'text-slate'}>{words}</p>
      )}
      {stop.promise && (
        <p className="mt-1">
          Promised {formatWallRange(day, stop.promise.startSeconds, stop.promise.endSeconds)}
          {stop.onTimePermille !== null && stop.state === 'ahead' && (
            <> · {percentWords(stop.onTimePermille)} on time</>
          )}
        </p>
      )}
      {stop.arrival && stop.state === 'ahead' && (
        <p className="text-slate">
          Arrives {formatWall(day, stop.arrival.meanSeconds)}, between{' '}
          {formatWallRange(day, stop.arrival.earlySeconds, stop.arrival.lateSeconds)}
        </p>
      )}
      {stop.drive && (
        <p className="text-slate">
          {writeSpan(stop.drive.toSeconds - stop.drive.fromSeconds)} drive
          {stop.drive.rough && ', rough: no road answer'}
        </p>
      )}
      {stop.kind === 'visit' && (
        <p className="mt-1 text-slate">Keys: D opens it, Enter picks it up.</p>
      )}
      {stop.wait && (
        <p className="text-slate">waits {writeSpan(stop.wait.toSeconds - stop.wait.fromSeconds)}</p>
      )}
    </>
  );
}

/** Less than half a minute would read "+0 min". */
function isWeighty({ deltaSeconds }: { deltaSeconds: number }): boolean {
  return Math.abs(deltaSeconds) >= 30;
}

function signedMinutes(seconds: number): string {
  return `${seconds < 0 ? '−' : '+'}${writeSpan(Math.abs(seconds))}`;
}
