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
  return useCan('setup.edit') ? <Guide instead={instead} /> : instead;
}

function Guide({ instead }: { instead: ReactNode }) {
  const steps = useSetupSteps();
  const needed = steps?.filter(({ optional }) => !optional) ?? [];
  const open = needed.filter(({ done }) => !done);
  if (!steps || open.length === 0) return instead;
  return (
    <Card
      title="Before the first day"
      dim={`· ${needed.length - open.length} of ${needed.length} done`}
      className="mb-4 max-w-3xl"
    >
      <ol className="rows">
        {steps.map((step) => (
          <Step key={step.key} step={step} next={step === open[0]} />
        ))}
      </ol>
    </Card>
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
          {step.optional && <span className="text-slate"> (if you like)</span>}
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
