import { reasonWords } from '#shared/grooming/explain.ts';
import type { PetForecast, Reason, StepForecast } from '#shared/grooming/types.ts';
import { Chip } from '#src/components/Chip.tsx';
import { PetStrip } from './PetStrip.tsx';
import type { TowerStep } from './towersOf.ts';

/** A step as a table needs it; `about` says what is known beside its reasons. */
export type StepLine = Pick<
  StepForecast,
  'family' | 'label' | 'medianSeconds' | 'attentionPermille'
> & { key: string; reasons: readonly Reason[]; about?: string | undefined };

/** One pet's steps: the strip, then each step's minutes and what made them. */
export function ForecastSteps({
  steps,
  petName,
  widthPx = 520,
}: {
  steps: readonly StepLine[];
  petName: string;
  widthPx?: number;
}) {
  return (
    <>
      <PetStrip
        steps={steps.map(towerStep)}
        widthPx={widthPx}
        label={`Steps for ${petName || 'this pet'}`}
      />
      <table className="mt-2 w-full border-collapse">
        <caption className="sr-only">Minutes of each step and what made them</caption>
        <thead className="sr-only">
          <tr>
            <th>Step</th>
            <th>Minutes</th>
          </tr>
        </thead>
        <tbody>
          {steps.map((step) => (
            <StepRow key={step.key} step={step} />
          ))}
        </tbody>
      </table>
    </>
  );
}

/** What goes with a forecast: changes of plan, plan B, needs, cautions. */
export function ForecastNotes({ forecast }: { forecast: PetForecast }) {
  const needs = [
    ...forecast.needs.map((skill) => `needs a groomer with “${skill}”`),
    forecast.waterMl > 0 ? `about ${Math.round(forecast.waterMl / 1000)} L of fresh water` : null,
    forecast.extraCleanSeconds > 0
      ? `${Math.round(forecast.extraCleanSeconds / 60)} min disinfecting after`
      : null,
  ].filter((words) => words !== null);
  const changes = [forecast.planChange?.words, forecast.overTable?.words].filter(
    (words) => words !== undefined,
  );
  return (
    <div className="mt-3 grid gap-3">
      {changes.map((words) => (
        <p key={words} className="rounded-[10px] bg-[var(--honey-soft)] px-3 py-2">
          <span aria-hidden="true">◆ </span>
          {words}
        </p>
      ))}
      {needs.length > 0 && (
        <div className="flex flex-wrap gap-1.5">
          {needs.map((words) => (
            <Chip key={words}>{words}</Chip>
          ))}
        </div>
      )}
      <CautionChips cautions={forecast.cautions} />
    </div>
  );
}

/** Cautions wherever the pet is handled, and whose word counts. */
export function CautionChips({
  cautions,
}: {
  cautions: readonly { key: string; words: string; stop: boolean }[];
}) {
  return (
    <>
      {cautions.length > 0 && (
        <ul className="grid gap-1.5" aria-label="Cautions">
          {cautions.map((caution) => (
            <li key={caution.key}>
              <Chip tone={caution.stop ? 'bad' : 'heed'}>
                {caution.stop ? `Stop: ${caution.words}` : caution.words}
              </Chip>
            </li>
          ))}
        </ul>
      )}
      <p className="text-sm text-slate">
        A forecast, not advice on health. In doubt ask the pet&apos;s vet.
      </p>
    </>
  );
}

function StepRow({ step }: { step: StepLine }) {
  const weight = step.family === 'scissor' ? 'font-semibold' : '';
  const why = [step.about, ...tellable(step.reasons).map(reasonWords)].filter(Boolean);
  return (
    <tr className="border-t border-linen">
      <td className={`py-1.5 pr-3 ${weight}`}>
        <span className="inline-block first-letter:uppercase">{step.label}</span>
        {why.length > 0 && (
          <span className="block text-sm font-normal text-slate">{why.join(' · ')}</span>
        )}
      </td>
      <td className={`py-1.5 text-right align-top ${weight}`}>
        {Math.round(step.medianSeconds / 60)}
      </td>
    </tr>
  );
}

/** Towers show the middle minutes, as the table beside them does. */
function towerStep(step: StepLine): TowerStep {
  return { ...step, reasons: [...step.reasons], petId: 'pet', meanSeconds: step.medianSeconds };
}

/** Reasons under half a minute say nothing. */
function tellable(reasons: readonly Reason[]) {
  return reasons
    .filter(({ deltaSeconds }) => Math.abs(deltaSeconds) >= 30)
    .toSorted((a, b) => Math.abs(b.deltaSeconds) - Math.abs(a.deltaSeconds));
}
