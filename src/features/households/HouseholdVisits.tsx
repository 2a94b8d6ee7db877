import { Link } from 'react-router-dom';
import type { z } from 'zod';
import type { householdVisit } from '#shared/api/households.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { Chip } from '#src/components/Chip.tsx';
import { writeDate, writeList } from '#src/lib/words.ts';

type Visit = z.output<typeof householdVisit>;

/** What is booked, then what was. */
export function HouseholdVisits({
  visits,
  today,
  onCancel,
}: {
  visits: readonly Visit[];
  today: string;
  /** null: look only. */
  onCancel: ((visit: { id: string; date: string }) => void) | null;
}) {
  const coming = visits
    .filter((visit) => visit.status === 'booked' && visit.date >= today)
    .toSorted((a, b) => a.date.localeCompare(b.date));
  const past = visits
    .filter((visit) => !coming.includes(visit))
    .toSorted((a, b) => b.date.localeCompare(a.date));
  const year = Number(today.slice(0, 4));
  return (
    <Card title="Visits">
      {visits.length === 0 && <p className="text-slate">None yet.</p>}
      <ul className="rows">
        {coming.map((visit) => (
          <li
            key={visit.id}
            className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 py-2.5"
          >
            <div>
              <Link to={`/day/${visit.date}`} className="text-link text-ink">
                {writeDate(visit.date, 'long', year)}
              </Link>
              <span className="block text-slate">
                {writeList(visit.petNames)}
                {visit.promiseWords && ` · promised ${visit.promiseWords}`} ·{' '}
                {visit.vanName ?? 'not placed'}
              </span>
            </div>
            {onCancel && (
              <Button size="small" kind="quiet" onClick={() => onCancel(visit)}>
                Cancel this visit
              </Button>
            )}
          </li>
        ))}
        {past.map((visit) => (
          <li key={visit.id} className="flex flex-wrap justify-between gap-x-4 py-2 text-slate">
            <span>
              {writeDate(visit.date, 'short', year)} · {writeList(visit.petNames)}
              {visit.vanName && ` · ${visit.vanName}`}
            </span>
            {visit.status !== 'done' && <Chip>{statusWords(visit.status)}</Chip>}
          </li>
        ))}
      </ul>
    </Card>
  );
}

function statusWords(status: string): string {
  if (status === 'cancelled') return 'cancelled';
  if (status === 'failed') return 'could not be done';
  return status === 'booked' ? 'booked, not worked' : status;
}
