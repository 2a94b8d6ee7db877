import type { Day } from '#shared/api/days.ts';
import { Card } from '#src/components/Card.tsx';
import { momentWords } from './sentWords.ts';

/** Who changed what, latest first. */
export function DayLog({ day }: { day: Day }) {
  if (day.log.length === 0) return null;
  return (
    <Card title="Changes of this day">
      <ol
        className="rows max-h-64 overflow-y-auto text-[15px]"
        tabIndex={0}
        aria-label="Changes, latest first"
      >
        {day.log
          .toSorted((a, b) => b.at.localeCompare(a.at))
          .map((entry) => (
            <li key={entry.id} className="flex justify-between gap-4 py-[7px]">
              <span>{entry.words}</span>
              <span className="shrink-0 text-sm text-slate">
                {entry.who} · {momentWords(day.problem, entry.at)}
              </span>
            </li>
          ))}
      </ol>
    </Card>
  );
}
