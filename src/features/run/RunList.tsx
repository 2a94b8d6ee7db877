import { useQuery } from '@tanstack/react-query';
import { Link, Navigate, useSearchParams } from 'react-router-dom';
import { runQueries } from '#src/api/runs.ts';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { ShapeMark } from '#src/components/ShapeMark.tsx';
import { writeCount, writeDate } from '#src/lib/words.ts';

/** Today's runs; opens mine at once when there is just one. */
export function RunList() {
  const { data, error, refetch } = useQuery(runQueries.list());
  const [search] = useSearchParams();
  if (error)
    return (
      <ErrorNote
        title="The runs could not be loaded"
        error={error}
        onRetry={() => void refetch()}
      />
    );
  if (!data) return <Loading words="Loading today's runs" />;
  const mine = data.runs.filter((run) => run.mine);
  if (mine.length === 1 && !search.has('all'))
    return <Navigate to={`/run/${mine[0]!.runId}`} replace />;
  return (
    <div className="mx-auto max-w-[520px]">
      <PageHeader title="Runs today" dim={writeDate(data.date)} />
      {data.runs.length === 0 ? (
        <EmptyState title="No van works today">
          A run appears here once a shift is planned for today.
        </EmptyState>
      ) : (
        <ul className="grid gap-3">
          {data.runs.map((run) => (
            <li key={run.runId}>
              <Link
                to={`/run/${run.runId}`}
                className="card flex min-h-16 items-center justify-between gap-3 px-4 py-3 text-ink no-underline hover:bg-linen"
              >
                <span>
                  <b className="flex items-center gap-2">
                    <ShapeMark shape={run.shape} /> {run.vanName}
                  </b>
                  <span className="text-slate">
                    {run.groomerName}
                    {run.mine && ' · yours'}
                  </span>
                </span>
                <span className="text-right">
                  {writeCount(run.stopCount, 'stop')}
                  <span className="block text-[15px] text-slate">
                    {run.sentAt ? 'sent' : 'not sent yet'}
                  </span>
                </span>
              </Link>
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}
