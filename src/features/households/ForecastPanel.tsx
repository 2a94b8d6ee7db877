import { reasonWords, summaryWords } from '#shared/grooming/explain.ts';
import type { PetFacts, PetForecast } from '#shared/grooming/types.ts';
import { Card } from '#src/components/Card.tsx';
import { Chip } from '#src/components/Chip.tsx';
import { PetStrip } from '#src/strips/PetStrip.tsx';
import { tryForecast } from './tryForecast.ts';

/** Each step's minutes and why, worked out anew with every change of the form. */
export function ForecastPanel({
  facts,
  styleId,
  petName,
}: {
  /** Words instead when something is still missing. */
  facts: PetFacts | string;
  styleId: string;
  petName: string;
}) {
  const forecast = tryForecast(facts, styleId);
  if (typeof forecast === 'string')
    return (
      <Card title="What it takes">
        <p className="text-slate">{forecast}</p>
      </Card>
    );
  return (
    <Card title="What it takes" dim={summaryWords(forecast)}>
      <PetStrip
        steps={forecast.steps.map((step) => ({ ...step, petId: 'pet' }))}
        widthPx={520}
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
          {forecast.steps.map((step) => (
            <tr key={step.key} className="border-t border-linen">
              <td className={`py-1.5 pr-3 ${step.family === 'scissor' ? 'font-semibold' : ''}`}>
                <span className="inline-block first-letter:uppercase">{step.label}</span>
                {tellable(step.reasons).length > 0 && (
                  <span className="block text-sm font-normal text-slate">
                    {tellable(step.reasons).map(reasonWords).join(' · ')}
                  </span>
                )}
              </td>
              <td
                className={`py-1.5 text-right align-top ${
                  step.family === 'scissor' ? 'font-semibold' : ''
                }`}
              >
                {Math.round(step.medianSeconds / 60)}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      <ForecastNotes forecast={forecast} />
    </Card>
  );
}

function ForecastNotes({ forecast }: { forecast: PetForecast }) {
  const needs = [
    ...forecast.needs.map((skill) => `needs a groomer with “${skill}”`),
    forecast.waterMl > 0 ? `about ${Math.round(forecast.waterMl / 1000)} L of fresh water` : null,
    forecast.extraCleanSeconds > 0
      ? `${Math.round(forecast.extraCleanSeconds / 60)} min disinfecting after`
      : null,
  ].filter((words) => words !== null);
  return (
    <div className="mt-3 grid gap-3">
      {forecast.planChange && (
        <p className="rounded-[10px] bg-[var(--honey-soft)] px-3 py-2">
          <span aria-hidden="true">◆ </span>
          {forecast.planChange.words}
        </p>
      )}
      {needs.length > 0 && (
        <div className="flex flex-wrap gap-1.5">
          {needs.map((words) => (
            <Chip key={words}>{words}</Chip>
          ))}
        </div>
      )}
      {forecast.cautions.length > 0 && (
        <ul className="grid gap-1.5">
          {forecast.cautions.map((caution) => (
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
    </div>
  );
}

/** Reasons under half a minute say nothing. */
function tellable(reasons: PetForecast['steps'][number]['reasons']) {
  return reasons
    .filter(({ deltaSeconds }) => Math.abs(deltaSeconds) >= 30)
    .toSorted((a, b) => Math.abs(b.deltaSeconds) - Math.abs(a.deltaSeconds));
}
