import { useMemo } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import { isLocalDate } from '#shared/time/localDate.ts';
import { useToday } from '#src/api/session.ts';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { ButtonLink } from '#src/components/ButtonLink.tsx';
import { DayBoard } from '#src/features/day/DayBoard.tsx';
import { DayNav } from '#src/features/day/DayNav.tsx';
import { useDay } from '#src/features/day/useDay.ts';
import { SetupGuide } from '#src/features/setup/SetupGuide.tsx';

/** `/day/:date`: the board of a date, today when none is named. */
export function DayScreen() {
  const today = useToday();
  const { date = today } = useParams();
  if (!isLocalDate(date))
    return (
      <EmptyState
        title="That is no date"
        action={
          <ButtonLink kind="go" to="/day">
            Show today
          </ButtonLink>
        }
      >
        A day’s address ends like 2026-04-14.
      </EmptyState>
    );
  return <OneDay key={date} date={date} today={today} />;
}

function OneDay({ date, today }: { date: string; today: string }) {
  const navigate = useNavigate();
  const { query, onDay } = useDay(date);
  const { refetch } = query;
  const past = date < today;
  // What was not done by the end of a past day must not be drawn as still to come from now on.
  const day = useMemo(
    () =>
      query.data && past && query.data.problem.nowSeconds !== null
        ? { ...query.data, problem: { ...query.data.problem, nowSeconds: null } }
        : query.data,
    [query.data, past],
  );
  const nav = <DayNav date={date} today={today} onDate={(next) => void navigate(`/day/${next}`)} />;
  const trouble = query.error && (
    <ErrorNote
      className="mb-3"
      error={query.error}
      {...(day ? { title: 'Not up to date' } : {})}
      onRetry={() => void refetch()}
    />
  );
  if (day)
    return (
      <>
        {trouble}
        <DayBoard
          day={day}
          past={past}
          nav={nav}
          onDay={onDay}
          readAgain={refetch}
          whenEmpty={(plain) => (past ? plain : <SetupGuide instead={plain} />)}
        />
      </>
    );
  return (
    <>
      <div className="mb-4">{nav}</div>
      {trouble ?? <DaySkeleton />}
    </>
  );
}

function DaySkeleton() {
  return (
    <div className="mt-4">
      <Loading lines={1} words="Loading the day" />
      <div className="card mt-3 space-y-10 p-6" aria-hidden="true">
        {[0, 1, 2].map((row) => (
          <div key={row} className="flex animate-pulse items-end gap-4">
            <div className="h-10 w-28 rounded-md bg-linen" />
            {[24, 40, 32, 44].map((height, index) => (
              <div key={index} className="flex-1 rounded-md bg-linen" style={{ height }} />
            ))}
          </div>
        ))}
      </div>
    </div>
  );
}
