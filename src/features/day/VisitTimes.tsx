import type { DayProblem, StopTimes, VisitFact } from '#shared/schedule/types.ts';
import { formatWall, formatWallRange } from '#shared/time/formatWall.ts';
import { Chip } from '#src/components/Chip.tsx';
import { percentWords } from '#src/strips/stopWords.ts';
import { reasonWords, SAFE_PERMILLE } from './stripsOf.ts';

/** What was promised, when it comes or came, and on which van. */
export function VisitTimes({
  problem,
  fact,
  stop,
  vanName,
  pinned,
}: {
  problem: DayProblem;
  fact: VisitFact;
  stop: StopTimes | null;
  vanName: string | null;
  pinned: boolean;
}) {
  const promise = fact.promise;
  const over = stop && (stop.state === 'done' || stop.state === 'failed');
  const failedReason = problem.facts.find(({ stopId }) => stopId === stop?.stopId)?.failedReason;
  return (
    <dl className="rows mt-2 text-[15px]">
      <Row name="Promised">
        {promise ? (
          <>
            <b>{formatWallRange(problem, promise.startSeconds, promise.endSeconds)}</b>{' '}
            {stop && stop.onTimePermille !== null && !over && (
              <Chip tone={stop.onTimePermille >= SAFE_PERMILLE ? 'ok' : 'bad'}>
                {percentWords(stop.onTimePermille)} on time
              </Chip>
            )}
          </>
        ) : (
          'nothing yet'
        )}
      </Row>
      {failedReason && (
        <Row name="Not done">
          <span className="font-semibold text-rosette">▲ {reasonWords(failedReason)}</span>
        </Row>
      )}
      <Row name={over ? 'Came' : 'Arrives'}>
        {stop ? (
          <>
            <b>{formatWall(problem, stop.arriveSeconds)}</b>
            {!over &&
              `, likely ${formatWallRange(problem, stop.arriveEarlySeconds, stop.arriveLateSeconds)}`}
            {` · ${over ? 'left' : 'leaves'} ${formatWall(problem, stop.endSeconds)}`}
          </>
        ) : (
          'on no van yet'
        )}
      </Row>
      {vanName && (
        <Row name="Van">
          <b>{vanName}</b>
          {pinned && ', pinned: a search leaves it there'}
        </Row>
      )}
    </dl>
  );
}

function Row({ name, children }: { name: string; children: React.ReactNode }) {
  return (
    <div className="flex flex-wrap items-baseline justify-between gap-x-4 py-[7px]">
      <dt className="text-slate">{name}</dt>
      <dd className="text-right">{children}</dd>
    </div>
  );
}
