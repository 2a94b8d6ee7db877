import { summaryWords } from '#shared/grooming/explain.ts';
import type { PetFacts, Style } from '#shared/grooming/types.ts';
import { Card } from '#src/components/Card.tsx';
import { ForecastNotes, ForecastSteps } from '#src/strips/ForecastSteps.tsx';
import { tryForecast } from './tryForecast.ts';

/** Each step's minutes and why, worked out anew with every change of the form. */
export function ForecastPanel({
  facts,
  style,
  petName,
}: {
  /** Words instead when something is still missing. */
  facts: PetFacts | string;
  style: Style | null;
  petName: string;
}) {
  const forecast = tryForecast(facts, style);
  if (typeof forecast === 'string')
    return (
      <Card title="What it takes">
        <p className="text-slate">{forecast}</p>
      </Card>
    );
  return (
    <Card title="What it takes" dim={summaryWords(forecast)}>
      <ForecastSteps steps={forecast.steps} petName={petName} />
      <ForecastNotes forecast={forecast} />
    </Card>
  );
}
