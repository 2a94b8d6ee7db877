import { Fragment } from 'react';
import { formatWall, formatWallRange } from '#shared/time/formatWall.ts';
import { writeSpan } from '#src/lib/words.ts';
import { KerbCard } from './KerbCard.tsx';
import { mayText } from './nextAction.ts';
import { PetCard } from './PetCard.tsx';
import { StandingWords } from './StandingWords.tsx';
import { stopStanding } from './stopStanding.ts';
import { VisitMinutes } from './VisitMinutes.tsx';
import type { RunStop, RunView } from './runView.ts';

/** A stop before its work: where, what to mind, who and how long. */
export function StopPanel({ view, stop }: { view: RunView; stop: RunStop }) {
  const { visit } = stop;
  return (
    <>
      <p className="text-[15px] leading-snug text-slate">
        {headWords(view, stop).map((words, index) => (
          <Fragment key={words}>
            {index > 0 && ' · '}
            <span className="whitespace-nowrap">{words}</span>
          </Fragment>
        ))}
      </p>
      <h1 className="mb-1.5 text-[26px] leading-[1.12] tracking-tight">{stop.title}</h1>
      {stop.promise && (stop.state === 'ahead' || stop.state === 'driving') && (
        <p className="mb-2">
          <StandingWords standing={stopStanding(stop)} />
          {stop.times.onTimePermille !== null && (
            <span className="text-slate">
              {' '}
              · arriving{' '}
              {formatWallRange(
                view.problem,
                stop.times.arriveEarlySeconds,
                stop.times.arriveLateSeconds,
              )}
            </span>
          )}
        </p>
      )}
      {visit && isEarly(stop.times) && (stop.state === 'ahead' || stop.state === 'driving') && (
        <p className="mb-2 text-[15px]">
          <span aria-hidden="true">◆ </span>
          {writeSpan(stop.times.waitSeconds)} early: the door opens at{' '}
          {formatWall(view.problem, stop.times.startSeconds)}. Wait, or call them.
        </p>
      )}
      <div className="mt-3 grid grid-cols-1 gap-3">
        <KerbCard stop={stop} />
        {visit?.pets.map((pet) => (
          <PetCard
            key={pet.id}
            pet={pet}
            minutesWords={writeSpan(
              visit.steps
                .filter(({ petId }) => petId === pet.id)
                .reduce((sum, step) => sum + step.meanSeconds, 0),
            )}
          />
        ))}
        {visit && <VisitMinutes visit={visit} />}
        {visit && stop.state === 'ahead' && !mayText(visit) && (
          <p className="text-[15px] text-slate">
            {visit.phone
              ? 'No text goes out: they have not agreed to texts. Call before you set out.'
              : 'No text goes out: no phone number is kept.'}
          </p>
        )}
      </div>
    </>
  );
}

/** The van would stand and wait: the door opens when it was promised, not before. */
function isEarly(times: RunStop['times']): boolean {
  return times.waitSeconds >= 180;
}

/** What matters before the name, in pieces that never break inside. */
function headWords(view: RunView, stop: RunStop): string[] {
  const day = view.problem;
  const { times, state } = stop;
  const promised = stop.promise
    ? [`promised ${formatWallRange(day, stop.promise.startSeconds, stop.promise.endSeconds)}`]
    : [];
  const arrive = formatWall(day, times.arriveSeconds);
  if (state === 'driving') return [`On the way, there about ${arrive}`, ...promised];
  if (state === 'arrived') return [`Here since ${arrive}`, ...promised];
  if (state === 'working')
    return [`Here since ${arrive}`, `done about ${formatWall(day, times.endSeconds)}`];
  const drive =
    times.driveSeconds >= 30
      ? `${writeSpan(times.driveSeconds)} drive${times.rough ? ', rough' : ''}`
      : 'no driving';
  return [`Next, ${arrive}`, drive, ...promised];
}
