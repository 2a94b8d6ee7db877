import { useState } from 'react';
import type { Day } from '#shared/api/days.ts';
import { ApiError } from '#src/api/ApiError.ts';
import { useSendRuns } from '#src/api/days.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { ShapeMark } from '#src/components/ShapeMark.tsx';
import { writeCount } from '#src/lib/words.ts';
import { sentWords } from './sentWords.ts';
import { versionsOf } from './runVersionsOf.ts';
import { dayInAnswer } from './useDayChange.ts';

/** What goes to which phone, before it goes. */
export function SendDialog({
  day,
  onSent,
  onDay,
  onClose,
}: {
  day: Day;
  onSent: (day: Day, count: number) => void;
  onDay: (day: Day) => void;
  onClose: () => void;
}) {
  const news = day.runs.filter((run) => run.sentAt === null || run.changedSinceSent);
  const [left, setLeft] = useState<ReadonlySet<string>>(new Set());
  const chosen = news.filter((run) => !left.has(run.vanId));
  const send = useSendRuns();
  const visitsOf = (vanId: string) =>
    day.plan.runs.find((run) => run.vanId === vanId)?.stops.filter((stop) => stop.kind === 'visit')
      .length ?? 0;
  const go = () =>
    send.mutate(
      {
        params: { date: day.date },
        body: {
          vanIds: chosen.map((run) => run.vanId),
          runVersions: versionsOf(day, new Set(chosen.map((run) => run.vanId))),
        },
      },
      {
        onSuccess: (sent) => onSent(sent, chosen.length),
        onError: (error) => {
          const now = error instanceof ApiError ? dayInAnswer(error.body) : null;
          if (now) onDay(now);
        },
      },
    );
  return (
    <Dialog
      title="Send to vans"
      onClose={onClose}
      actions={
        <>
          {news.length > 0 && (
            <Button
              kind="go"
              busy={send.isPending}
              busyWords="Sending"
              disabled={chosen.length === 0}
              onClick={go}
            >
              Send to {writeCount(chosen.length, 'van')}
            </Button>
          )}
          <Button onClick={onClose}>{news.length > 0 ? 'Not yet' : 'Close'}</Button>
        </>
      }
    >
      <p className="text-slate">
        {news.length > 0
          ? 'The phone then has this order. Later changes are told to the groomer, never silent.'
          : 'Every phone has the day as it stands.'}
      </p>
      <ul className="rows mt-2">
        {day.runs.map((run) => {
          const isNews = news.includes(run);
          return (
            <li key={run.runId}>
              <label className="flex min-h-12 items-center gap-3 py-2">
                <input
                  type="checkbox"
                  className="size-5 accent-[var(--collar)]"
                  checked={isNews && !left.has(run.vanId)}
                  disabled={!isNews}
                  onChange={(event) => {
                    const next = new Set(left);
                    if (event.target.checked) next.delete(run.vanId);
                    else next.add(run.vanId);
                    setLeft(next);
                  }}
                />
                <span className="flex-1">
                  <b className="inline-flex items-center gap-1.5">
                    <ShapeMark shape={run.shape} /> {run.vanName}
                  </b>{' '}
                  <span className="text-slate">
                    {run.groomerName} · {writeCount(visitsOf(run.vanId), 'visit')}
                  </span>
                </span>
                <span className={isNews ? 'font-semibold' : 'text-slate'}>
                  {run.sentAt === null
                    ? 'not sent yet'
                    : run.changedSinceSent
                      ? 'changed since sent'
                      : `${sentWords(day.problem, run)}, unchanged`}
                </span>
              </label>
            </li>
          );
        })}
      </ul>
      {day.plan.notPlaced.length > 0 && (
        <p className="mt-2 text-slate">
          {writeCount(day.plan.notPlaced.length, 'visit')} on no van: not sent to anybody.
        </p>
      )}
      {send.error && (
        <ErrorNote
          className="mt-3"
          error={
            send.error instanceof ApiError && send.error.code === 'versionMoved'
              ? 'Someone changed the day a moment ago. Look at it again, then send. Nothing was sent.'
              : send.error
          }
        />
      )}
    </Dialog>
  );
}
