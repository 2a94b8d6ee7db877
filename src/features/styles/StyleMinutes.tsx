import { durationWords } from '#shared/grooming/durationWords.ts';
import { summaryWords } from '#shared/grooming/explain.ts';
import { forecastPet } from '#shared/grooming/forecastPet.ts';
import type { PetFacts, PetForecast, Style } from '#shared/grooming/types.ts';
import { Card } from '#src/components/Card.tsx';
import { ForecastNotes, ForecastSteps } from '#src/strips/ForecastSteps.tsx';
import { stepLines } from './stepLines.ts';

/** What a style takes on a pet, worked out anew with every change. `before`: the style it came from. */
export function StyleMinutes({
  facts,
  style,
  before,
  petName,
  children,
}: {
  /** Words instead when something of the pet is still missing. */
  facts: PetFacts | string;
  style: Style;
  before?: Style;
  petName: string;
  children?: React.ReactNode;
}) {
  const forecast = tryStyle(facts, style);
  if (typeof forecast === 'string')
    return (
      <Card title="What it takes">
        <p className="text-slate">{forecast}</p>
      </Card>
    );
  const old = before && tryStyle(facts, before);
  const more = old && typeof old !== 'string' ? forecast.medianSeconds - old.medianSeconds : 0;
  return (
    <Card title="What it takes" dim={<span role="status">{summaryWords(forecast)}</span>}>
      {before && (
        <p className="mb-1 text-sm text-slate" aria-live="polite">
          {Math.abs(more) < 30
            ? 'As long as the saved style.'
            : `${durationWords(Math.abs(more))} ${more > 0 ? 'more' : 'less'} than the saved style.`}
        </p>
      )}
      <ForecastSteps steps={stepLines(forecast, style.cuts)} petName={petName} />
      <ForecastNotes forecast={forecast} />
      {children}
    </Card>
  );
}

/** The forecast, or the words of what is missing or does not fit. */
export function tryStyle(facts: PetFacts | string, style: Style): PetForecast | string {
  if (typeof facts === 'string') return facts;
  try {
    return forecastPet(facts, style);
  } catch (error) {
    if (error instanceof RangeError) return `No forecast yet: ${error.message}`;
    throw error;
  }
}
