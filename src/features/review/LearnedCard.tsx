import { useQuery } from '@tanstack/react-query';
import type { GroomFit } from '#shared/api/learning.ts';
import { learningQueries, useLearnMinutes } from '#src/api/learning.ts';
import { useToday } from '#src/api/session.ts';
import { useCan, useSession } from '#src/api/sessionStore.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { dayWords } from '#src/lib/dayWords.ts';
import { fitWords, recordsWords } from './fitWords.ts';

/** The last learning and what came of it, what bookings use, and learning on demand. */
export function LearnedCard() {
  const { data, error, refetch } = useQuery(learningQueries.fits());
  const start = useLearnMinutes();
  const mayLearn = useCan('setup.edit');
  const last = data?.fits[0];
  const busy = start.isPending || last?.state === 'working';
  return (
    <Card title="What Furlong has learned">
      {/* Always there, so that the result is read out when it comes. */}
      <div role="status">
        {data && (busy ? <p>Learning from finished visits…</p> : <LastFit last={last} />)}
      </div>
      {error && <ErrorNote error={error} onRetry={() => void refetch()} />}
      {!data && !error && <Loading lines={2} />}
      {data && <InForce fit={data.inForce} last={last} />}
      {start.isError && <ErrorNote error={start.error} className="mt-2" />}
      {mayLearn && data && (
        <Button
          size="small"
          className="mt-3"
          busy={busy}
          busyWords="Learning…"
          onClick={() => start.mutate({})}
        >
          Learn from finished visits now
        </Button>
      )}
    </Card>
  );
}

function LastFit({ last }: { last: GroomFit | undefined }) {
  const when = useDayWords();
  if (!last) return <p className="text-slate">Nothing yet. Furlong learns every night.</p>;
  return (
    <>
      <p>{fitWords(last)}</p>
      <p className="text-slate">
        {when(last.fittedAt)}
        {last.state === 'failed' ? '.' : ` · ${recordsWords(last)}`}
      </p>
    </>
  );
}

/** Said only when it is not the last one itself. */
function InForce({ fit, last }: { fit: GroomFit | null; last: GroomFit | undefined }) {
  const when = useDayWords();
  if (fit && fit.id === last?.id) return null;
  return (
    <p className="mt-1 text-slate">
      {fit
        ? `Bookings use what was learned on ${when(fit.fittedAt)}. ${recordsWords(fit)}`
        : 'Bookings use the plain forecast.'}
    </p>
  );
}

function useDayWords(): (instant: string) => string {
  const { business } = useSession();
  const today = useToday();
  return (instant) => dayWords(instant, business.timeZone, today);
}
