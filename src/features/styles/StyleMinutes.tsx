import { durationWords } from '#shared/grooming/durationWords.ts';
import { summaryWords } from '#shared/grooming/explain.ts';
import { forecastPet } from '#shared/grooming/forecastPet.ts';
import type { PetFacts, PetForecast, Style } from '#shared/grooming/types.ts';
import { Card } from '#src/components/Card.tsx';
import { ForecastNotes, ForecastSteps } from '#src/strips/ForecastSteps.tsx';
import { stepLines } from './stepLines.ts';

/** What a style takes on a pet, worked out anew with every change. */
export function StyleMinutes({
  facts,
  style,
  petName,
  children,
}: {
  /** Words instead when something of the pet is still missing. */
  facts: PetFacts | string;
  style: Style;
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
  return (
    <Card title="What it takes" dim={summaryWords(forecast)}>
      <ForecastSteps steps={stepLines(forecast, style.cuts)} petName={petName} />
      <ForecastNotes forecast={forecast} />
      {children}
    </Card>
  );
}

/** The sum in one line, and what an edit did to it; it stays in sight while the plan is edited. */
export function MinutesLine({
  facts,
  style,
  before,
}: {
  facts: PetFacts | string;
  style: Style;
  before: Style;
}) {
  const [forecast, old] = [tryStyle(facts, style), tryStyle(facts, before)];
  if (typeof forecast === 'string') return <p className="text-slate">{forecast}</p>;
  const more = typeof old === 'string' ? 0 : forecast.medianSeconds - old.medianSeconds;
  return (
    <p role="status">
      <b className="font-semibold">
        {durationWords(forecast.medianSeconds)}
        <span className="max-sm:hidden">
          {summaryWords(forecast).slice(durationWords(forecast.medianSeconds).length)}
        </span>
      </b>
      <span className="block text-sm text-slate">
        {Math.abs(more) < 30
          ? 'as long as the saved style'
          : `${durationWords(Math.abs(more))} ${more > 0 ? 'more' : 'less'} than the saved style`}
      </span>
    </p>
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
