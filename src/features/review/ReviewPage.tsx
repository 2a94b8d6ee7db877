import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import type { Review } from '#shared/api/review.ts';
import { addDays, isLocalDate } from '#shared/time/localDate.ts';
import { reviewCsvAddress, reviewQueries } from '#src/api/review.ts';
import { useToday } from '#src/api/session.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { ButtonLink } from '#src/components/ButtonLink.tsx';
import { Card } from '#src/components/Card.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { buttonLook } from '#src/components/buttonLook.ts';
import { writeDistance } from '#src/lib/measures.ts';
import { writeCount, writeDelta } from '#src/lib/words.ts';
import { DayBars } from './DayBars.tsx';
import { ForecastScatter } from './ForecastScatter.tsx';
import { LeanTable } from './LeanTable.tsx';
import { LearnedCard } from './LearnedCard.tsx';
import { groomPerDrive, hoursWords, keptWords, reviewHeadline, weekWords } from './reviewWords.ts';
import { VanTable } from './VanTable.tsx';

/** Where the hours of a week went, and how honest the forecasts were. */
export function ReviewPage() {
  const [search] = useSearchParams();
  const asked = search.get('date');
  const date = asked && isLocalDate(asked) ? asked : undefined;
  const { data, error, refetch } = useQuery(reviewQueries.week(date));
  if (error)
    return (
      <ErrorNote
        title="The week could not be loaded"
        error={error}
        onRetry={() => void refetch()}
      />
    );
  if (!data) return <Loading words="Loading the week" lines={8} />;
  return <Week review={data} />;
}

function Week({ review }: { review: Review }) {
  const today = useToday();
  const { week, weekBefore } = review;
  const before = groomPerDrive(weekBefore);
  const empty = week.visits === 0 && week.driveSeconds === 0;
  return (
    <>
      <PageHeader
        title={reviewHeadline(week)}
        dim={[
          weekWords(review.from, review.to, Number(today.slice(0, 4))),
          writeCount(review.vans.length, 'van'),
          before !== null && !empty && `was ${before} the week before`,
        ]
          .filter(Boolean)
          .join(' · ')}
        actions={<WeekLinks review={review} today={today} empty={empty} />}
      />
      {empty ? (
        <>
          <EmptyState
            title="No finished visit in this week"
            action={
              <ButtonLink to={`?date=${addDays(review.from, -7)}`}>
                Look at the week before
              </ButtonLink>
            }
          >
            Numbers appear as phones report stops done.
          </EmptyState>
          <div className="mt-4.5">
            <LearnedCard />
          </div>
        </>
      ) : (
        <Numbers review={review} />
      )}
    </>
  );
}

function WeekLinks({ review, today, empty }: { review: Review; today: string; empty: boolean }) {
  return (
    <>
      <ButtonLink to={`?date=${addDays(review.from, -7)}`} aria-label="Week before">
        ‹
      </ButtonLink>
      {review.to < today && (
        <>
          <ButtonLink to={`?date=${addDays(review.from, 7)}`} aria-label="Week after">
            ›
          </ButtonLink>
          <ButtonLink to="?">This week</ButtonLink>
        </>
      )}
      {!empty && (
        <a href={reviewCsvAddress(review.from)} download className={`${buttonLook()} no-underline`}>
          Save as CSV
        </a>
      )}
    </>
  );
}

function Numbers({ review }: { review: Review }) {
  return (
    <>
      <Figures review={review} />
      {/* Two stacks, not rows: a long table must not leave a hole beside it. */}
      <div className="mt-5 grid items-start gap-4.5 lg:grid-cols-[1.25fr_1fr]">
        <div className="grid min-w-0 grid-cols-[minmax(0,1fr)] gap-4.5">
          <Card title="Where each day went" dim="hours, all vans">
            <DayBars days={review.days} />
          </Card>
          <Card title="Van by van">
            <VanTable vans={review.vans} />
          </Card>
        </div>
        <div className="grid min-w-0 grid-cols-[minmax(0,1fr)] gap-4.5">
          <Card title="Forecast against the clock">
            {review.visits.length > 0 ? (
              <ForecastScatter visits={review.visits} />
            ) : (
              <p className="text-slate">No finished visit to compare yet.</p>
            )}
          </Card>
          <Card title="Where forecasts lean" dim="minutes a visit">
            <LeanTable leans={review.leans} />
          </Card>
          <LearnedCard />
        </div>
      </div>
    </>
  );
}

function deltaWords(seconds: number): string {
  return Math.abs(seconds) < 30 ? '0 min' : `${writeDelta(seconds)} min`;
}

function Figures({ review }: { review: Review }) {
  const unit = useSession().business.distanceUnit;
  const { week, visits } = review;
  const over = visits.reduce((sum, one) => sum + one.clockSeconds - one.forecastSeconds, 0);
  const figures: [string, string][] = [
    [hoursWords(week.groomSeconds), 'grooming'],
    [hoursWords(week.driveSeconds), 'driving'],
    [writeDistance(week.driveMetres, unit), 'driven'],
    [hoursWords(week.waitSeconds), 'waiting and gaps'],
    [keptWords(week) ?? '–', 'arrived as promised'],
    ...(visits.length > 0
      ? ([[deltaWords(over / visits.length), 'a visit against its forecast']] as [string, string][])
      : []),
    [String(week.visits), week.visits === 1 ? 'visit' : 'visits'],
  ];
  return (
    <dl className="grid grid-cols-2 gap-x-6 gap-y-3 sm:grid-cols-3 lg:flex lg:flex-wrap lg:gap-x-9">
      {figures.map(([value, words]) => (
        <div key={words} className="flex flex-col-reverse justify-end">
          <dt className="text-slate">{words}</dt>
          <dd className="text-2xl font-bold tracking-tight whitespace-nowrap">{value}</dd>
        </div>
      ))}
    </dl>
  );
}
