import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { useCan } from '#src/api/sessionStore.ts';
import { ButtonLink } from '#src/components/ButtonLink.tsx';
import { Card } from '#src/components/Card.tsx';
import { useSetupSteps, type SetupStep } from './useSetupSteps.ts';

/**
 * What is still missing before the first day can be planned, one step after the other. `instead` is
 * shown once nothing is, and to people who do not set up the business.
 */
export function SetupGuide({ instead = null }: { instead?: ReactNode }) {
  return useCan('setup.edit') ? <WholeGuide instead={instead} /> : instead;
}

/** The same in one line, for above the screens where the steps are done. `at`: that screen's address. */
export function NextSetupStep({ at }: { at: string }) {
  return useCan('setup.edit') ? <NextLine at={at} /> : null;
}

function WholeGuide({ instead }: { instead: ReactNode }) {
  const guide = openSteps(useSetupSteps());
  if (!guide) return instead;
  return (
    <Card title="Before the first day" dim={guide.countWords} className="mb-4 max-w-3xl">
      <ol className="rows">
        {guide.steps.map((step) => (
          <Step key={step.key} step={step} next={step === guide.next} />
        ))}
      </ol>
    </Card>
  );
}

function NextLine({ at }: { at: string }) {
  const guide = openSteps(useSetupSteps());
  if (!guide) return null;
  const { next } = guide;
  const self = guide.steps.find(({ key }) => key === 'self');
  return (
    <div
      role="status"
      className="mb-4 flex max-w-3xl flex-wrap items-center justify-between gap-x-4 gap-y-2 rounded-card bg-linen px-4 py-3"
    >
      <div className="min-w-0">
        <p>
          <b>Before the first day</b> <span className="text-slate">{guide.countWords}</span>
        </p>
        <p className="text-[15px]">
          {next.to === at ? 'Next, on this screen: ' : 'Next: '}
          {next.words.slice(0, 1).toLowerCase() + next.words.slice(1)}.{' '}
          <span className="text-slate">{next.why}</span>
        </p>
        {self && (
          <p className="text-[15px]">
            <span className="text-slate">{self.why} </span>
            <Link to={self.to} className="text-link">
              {self.words}
            </Link>
          </p>
        )}
      </div>
      {next.to !== at && (
        <ButtonLink kind="go" size="small" to={next.to}>
          {next.words}
        </ButtonLink>
      )}
    </div>
  );
}

function Step({ step, next }: { step: SetupStep; next: boolean }) {
  return (
    <li
      className="flex items-center justify-between gap-4 py-2.5"
      aria-current={next ? 'step' : undefined}
    >
      <div className="min-w-0">
        <p>
          <span aria-hidden="true" className="inline-block w-6 text-collar">
            {step.done ? '✓' : next ? '▸' : '○'}
          </span>
          {step.done || next ? (
            <span className={step.done ? 'text-slate' : 'font-semibold'}>{step.words}</span>
          ) : (
            <Link to={step.to} className="text-link">
              {step.words}
            </Link>
          )}
          {step.done && <span className="sr-only">, done</span>}
          {step.optional && !step.done && <span className="text-slate"> (if you like)</span>}
        </p>
        {!step.done && <p className="pl-6 text-sm text-slate">{step.why}</p>}
      </div>
      {next && (
        <ButtonLink kind="go" size="small" to={step.to} className="shrink-0">
          {step.words}
        </ButtonLink>
      )}
    </li>
  );
}

/** null while unknown, and once everything needed is there. */
function openSteps(steps: SetupStep[] | null) {
  const needed = steps?.filter(({ optional }) => !optional) ?? [];
  const next = needed.find(({ done }) => !done);
  if (!steps || !next) return null;
  const doneCount = needed.filter(({ done }) => done).length;
  return { steps, next, countWords: `· ${doneCount} of ${needed.length} done` };
}
