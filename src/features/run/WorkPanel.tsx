import { formatWall, formatWallRange } from '#shared/time/formatWall.ts';
import { instantToSeconds } from '#shared/time/wallSeconds.ts';
import { writeSpan } from '#src/lib/words.ts';
import { breedWords } from '#src/strips/petWords.ts';
import { Cautions } from './Cautions.tsx';
import { clockWords } from './clockWords.ts';
import { sentenceCase } from './sentenceCase.ts';
import type { PetAtWork } from './nextAction.ts';
import { StandingWords } from './StandingWords.tsx';
import { stopStanding } from './stopStanding.ts';
import { useNow } from './useNow.ts';
import type { RunStop, RunView } from './runView.ts';

/** The pet on the table: the section under way with its clock, what is behind and ahead. */
export function WorkPanel({ view, stop, work }: { view: RunView; stop: RunStop; work: PetAtWork }) {
  // A clock of its own, so that only these few numbers are drawn every second.
  const now = instantToSeconds(view.problem.dayStartUtc, useNow(1000));
  const { pet, step, done, steps } = work;
  const total = steps.reduce((sum, one) => sum + one.meanSeconds, 0);
  const open = steps.filter((one) => !done.some(({ step: over }) => over === one));
  const spent = now - (work.startedSeconds ?? now);
  const stepSpent = now - (work.stepSinceSeconds ?? now);
  const left = leftSeconds(open, stepSpent);
  return (
    <>
      <p className="text-[15px] text-slate">
        {pet.name}, {breedWords(pet.breedName)} · {Math.max(0, Math.floor(spent / 60))} of{' '}
        {writeSpan(total)}
      </p>
      <h1 className="text-[26px] leading-[1.12] tracking-tight">
        {step ? sentenceCase(step.label) : `${pet.name}: check over`}
      </h1>
      <p className="mb-3 text-slate">{writeSpan(left)} left on this pet.</p>
      <Cautions pet={pet} />
      <section aria-label="Sections" className="card my-3 overflow-hidden px-4 py-1">
        <ul className="rows">
          {done.map(({ step: over, tookSeconds }) => (
            <Row
              key={over.key}
              label={`✓ ${sentenceCase(over.label)}`}
              right={clockWords(tookSeconds)}
            />
          ))}
          {open.map((one) =>
            one === step ? (
              <li
                key={one.key}
                aria-current="step"
                className="-mx-4 flex justify-between gap-3 bg-[var(--apricot-soft)] px-4 py-3"
              >
                <b>{sentenceCase(one.label)}</b>
                <span className="whitespace-nowrap">
                  <b aria-hidden="true">{clockWords(stepSpent)}</b>{' '}
                  <span className="text-slate">of {writeSpan(one.meanSeconds)}</span>
                </span>
              </li>
            ) : (
              <Row
                key={one.key}
                label={sentenceCase(one.label)}
                right={writeSpan(one.meanSeconds)}
              />
            ),
          )}
        </ul>
      </section>
      <DoneAbout view={view} stop={stop} />
    </>
  );
}

/** When this stop is likely over, and what that does to the next promise. */
function DoneAbout({ view, stop }: { view: RunView; stop: RunStop }) {
  const next = view.later[0];
  const day = view.problem;
  const early = next ? next.times.arriveEarlySeconds - next.times.driveSeconds : null;
  const late = next ? next.times.arriveLateSeconds - next.times.driveSeconds : null;
  return (
    <section aria-label="How the day stands" className="card mb-3 px-4 py-1">
      <ul className="rows">
        <li className="flex justify-between gap-3 py-2.5">
          <span>
            Done about <b>{formatWall(day, stop.times.endSeconds)}</b>
          </span>
          {early !== null && late !== null && late > early && (
            <span className="text-slate">{formatWallRange(day, early, late)}</span>
          )}
        </li>
        {next?.promise && (
          <li className="flex justify-between gap-3 py-2.5">
            <span>
              {next.visit?.pets.map(({ name }) => name).join(' & ')}, promised{' '}
              {formatWallRange(day, next.promise.startSeconds, next.promise.endSeconds)}
            </span>
            <StandingWords standing={stopStanding(next)} />
          </li>
        )}
      </ul>
    </section>
  );
}

function Row({ label, right }: { label: string; right: string }) {
  return (
    <li className="flex justify-between gap-3 py-2.5 text-slate">
      <span>{label}</span>
      <span className="whitespace-nowrap">{right}</span>
    </li>
  );
}

/** The present section counts until its minutes are used up, the rest in full. */
function leftSeconds(open: readonly { meanSeconds: number }[], stepSpent: number): number {
  const [present, ...rest] = open;
  return (
    Math.max(0, (present?.meanSeconds ?? 0) - stepSpent) +
    rest.reduce((sum, one) => sum + one.meanSeconds, 0)
  );
}
