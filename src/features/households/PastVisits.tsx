import { daysBetween } from '#shared/time/localDate.ts';
import { Card } from '#src/components/Card.tsx';
import { writeDate, writeDelta, writeSpan } from '#src/lib/words.ts';
import { leanWords } from './leanWords.ts';

export interface PastVisit {
  visitId: string;
  date: string;
  groomerName: string;
  forecastSeconds: number;
  clockSeconds: number;
}

/** How long the coat had between visits, and what was forecast and what the clock said, newest first. */
export function PastVisits({
  past,
  year,
  petName,
}: {
  past: readonly PastVisit[];
  year: number;
  petName: string;
}) {
  if (past.length === 0)
    return (
      <Card title="Coat history">
        <p className="text-slate">
          No finished visit yet. The first one is forecast with more room; each later one knows{' '}
          {petName} better.
        </p>
      </Card>
    );
  return (
    <Card title="Coat history" dim="minutes are the whole visit’s">
      <p className="text-slate">{leanWords(past)}</p>
      <div className="mt-1 overflow-x-auto" role="region" aria-label="Past visits" tabIndex={0}>
        <table className="plain">
          <thead>
            <tr>
              <th className="!pl-0">Visit</th>
              <th className="num whitespace-nowrap">coat of</th>
              <th className="num">forecast</th>
              <th className="num">clock</th>
              <th className="num !pr-0">min</th>
            </tr>
          </thead>
          <tbody>
            {past.map((visit, index) => (
              <tr key={visit.visitId}>
                <td className="!pl-0">
                  <span className="whitespace-nowrap">{writeDate(visit.date, 'short', year)}</span>
                  <span className="block text-sm text-slate">{visit.groomerName}</span>
                </td>
                <td className="num">{weeksWords(past[index + 1]?.date, visit.date)}</td>
                <td className="num">{writeSpan(visit.forecastSeconds)}</td>
                <td className="num">{writeSpan(visit.clockSeconds)}</td>
                <td className="num !pr-0">
                  {writeDelta(visit.clockSeconds - visit.forecastSeconds)}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </Card>
  );
}

/** "6 weeks" since the visit before; a dash for the oldest one kept. */
function weeksWords(before: string | undefined, date: string): string {
  if (before === undefined) return '–';
  const weeks = Math.round(daysBetween(before, date) / 7);
  return weeks === 1 ? '1 week' : `${weeks} weeks`;
}
