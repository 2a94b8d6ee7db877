import type { Day } from '#shared/api/days.ts';
import { formatWall } from '#shared/time/formatWall.ts';
import { instantToSeconds } from '#shared/time/wallSeconds.ts';
import { Card } from '#src/components/Card.tsx';

/** Who changed what, latest first. */
export function DayLog({ day }: { day: Day }) {
  if (day.log.length === 0) return null;
  return (
    <Card title="Changes of this day">
      <ol className="rows max-h-64 overflow-y-auto text-[15px]">
        {day.log
          .toSorted((a, b) => b.at.localeCompare(a.at))
          .map((entry) => (
            <li key={entry.id} className="flex gap-3 py-[7px]">
              <span className="w-11 shrink-0 text-slate">
                {formatWall(day.problem, instantToSeconds(day.problem.dayStartUtc, entry.at))}
              </span>
              <span>
                {entry.words} <span className="text-slate">· {entry.who}</span>
              </span>
            </li>
          ))}
      </ol>
    </Card>
  );
}
