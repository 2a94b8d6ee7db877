import type { quickForecast } from '#shared/api/forecasts.ts';
import type { ResponseOf } from '#shared/api/endpoint.ts';
import { summaryWords } from '#shared/grooming/explain.ts';
import type { PetForecast } from '#shared/grooming/types.ts';
import { ButtonLink } from '#src/components/ButtonLink.tsx';
import { Card } from '#src/components/Card.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { writeMoneyRange } from '#src/lib/writeMoneyRange.ts';
import { ForecastNotes, ForecastSteps } from '#src/strips/ForecastSteps.tsx';
import { OfferList } from './OfferList.tsx';
import type { QuickPet, ToldByPhone } from './quickPet.ts';

type Answer = ResponseOf<typeof quickForecast>;

/** Minutes, price, earliest windows, and where to go from here. */
export function QuickAnswer({
  pet,
  local,
  answer,
  fresh,
  error,
  onRetry,
}: {
  pet: QuickPet;
  /** Worked out here; words when something is missing. */
  local: PetForecast | string;
  /** The server's: price and offers. null while it is not there. */
  answer: Answer | null;
  /** The answer is of what is told now, not of a moment ago. */
  fresh: boolean;
  error: unknown;
  onRetry: () => void;
}) {
  if (typeof local === 'string')
    return (
      <Card title="What it takes">
        <p className="text-slate">{local}</p>
      </Card>
    );
  const shown = fresh && answer ? told(local, answer) : local;
  const [typical, ...spread] = summaryWords(shown).split(', ');
  return (
    <div id="what-it-takes" className="grid scroll-mt-4 grid-cols-[minmax(0,1fr)] gap-4">
      <Card
        title="Price and windows"
        aside={!fresh && <span className="text-sm text-slate">asking</span>}
      >
        <p className="text-[26px] leading-tight font-bold tracking-tight" role="status">
          {typical}
          {answer?.priceCents && (
            <>
              {' · '}
              {writeMoneyRange(answer.priceCents.low, answer.priceCents.high, answer.currency)}
            </>
          )}
        </p>
        <p className="text-slate">{[...spread, ...aroundWords(answer)].join(' · ')}</p>
        {error ? (
          <ErrorNote
            error={error}
            title="Price and windows did not come"
            onRetry={onRetry}
            className="mt-3"
          />
        ) : answer ? (
          <OfferList offers={answer.offers} noOfferWords={answer.noOfferWords} fresh={fresh} />
        ) : (
          <Loading lines={3} />
        )}
        <div className="mt-4">
          <ButtonLink to="/households/new" kind="go" state={toldOf(pet)}>
            Add the household and book
          </ButtonLink>
        </div>
      </Card>
      <Card title="What it takes" dim={summaryWords(shown)}>
        <ForecastSteps steps={shown.steps} petName="this pet" />
        <ForecastNotes forecast={local} />
      </Card>
    </div>
  );
}

/** The server's minutes know what the business's own visits taught; cautions and needs are the same. */
function told(
  local: PetForecast,
  answer: Answer,
): Omit<PetForecast, 'steps'> & Pick<Answer, 'steps'> {
  const { p10Seconds, p50Seconds, p90Seconds, steps } = answer;
  return { ...local, medianSeconds: p50Seconds, p10Seconds, p50Seconds, p90Seconds, steps };
}

function aroundWords(answer: Answer | null): string[] {
  if (!answer) return [];
  const around = Math.round((answer.setUpSeconds + answer.cleanDownSeconds) / 60);
  const unpriced = answer.priceCents ? [] : ['no price set yet, see Setup, Business'];
  return [`${around} min around it`, ...unpriced];
}

function toldOf({ where, ...pet }: QuickPet): ToldByPhone {
  return { where, pet };
}
